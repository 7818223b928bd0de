import { spawnSync } from 'node:child_process';
import { describe, expect, test } from 'vitest';
import { evaluateContent } from '@/services/kits/evaluation';
import { designFile } from '@/services/kits/rules';
import { aVersion } from '../../builders/versions';

const ROOT = new URL('../../../', import.meta.url).pathname;

describe('the design file of a version', () => {
  test.each([40, 72, 95])('with %i turns is judged on the command line to the byte as in the product', (turns) => {
    const content = aVersion().withTurns(turns).plain();
    const { verdict } = evaluateContent(content, { boxes: 2000, seed: 1 });
    const { stdout, status } = spawnSync(process.execPath, ['services/commands/start.mjs', 'evaluate', '-'], {
      cwd: ROOT,
      input: designFile(content)?.text ?? '',
      encoding: 'utf8',
    });
    expect(stdout).toBe(`${JSON.stringify(verdict)}\n`);
    expect(status).toBe(verdict.outcome === 'clears' ? 0 : 1);
  });

  test('is named after the kit and its letter, and is not there while a part lacks', () => {
    const content = aVersion().plain();
    expect(designFile(content)?.name).toBe(`${content.kit.number}-${content.letter}.design.json`);
    expect(designFile(aVersion().without('C1').plain())).toBeNull();
  });
});
