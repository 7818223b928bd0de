import { spawnSync } from 'node:child_process';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';

const ROOT = new URL('../../../', import.meta.url).pathname;
const REFERENCE = join(ROOT, 'test/reference');
const folder = mkdtempSync(join(tmpdir(), 'coilyard-cases-'));

function run(args: string[], input?: string) {
  const done = spawnSync(process.execPath, args, {
    cwd: ROOT,
    encoding: 'utf8',
    ...(input !== undefined && { input }),
  });
  return { exit: done.status, out: done.stdout, err: done.stderr };
}

const started = (words: string[], input?: string) => run(['services/commands/start.mjs', ...words], input);

function casesFile(name: string, content: unknown): string {
  const file = join(folder, name);
  writeFileSync(file, typeof content === 'string' ? content : JSON.stringify(content));
  return file;
}

const stray = {
  id: 'stray',
  quantity: 'largest_stray',
  inputs: { min: 15e-12, max: 365e-12, lo: 531e3, hi: 1602e3 },
  expected: 28.2e-12,
  tolerance_rel: 1e-3,
};

describe('the bundled start of a command', () => {
  test.each(['yield', 'solenoid-two-taps'])('gives the bytes and the exit of the sources for %s', (design) => {
    const words = [join(REFERENCE, `designs/${design}.json`), '--boxes', '400'];
    const bundled = started(['evaluate', ...words]);
    const plain = run(['--import', 'tsx', 'services/commands/evaluate.ts', ...words]);
    expect(bundled).toEqual(plain);
  });

  test('reads standard input and hands on what cannot be evaluated', () => {
    const { exit, out, err } = started(['evaluate', '-'], '{}');
    expect([exit, out]).toEqual([2, '']);
    expect(JSON.parse(err).error).toBe('The design cannot be evaluated.');
  });

  test('knows no other command', () => {
    const { exit, out, err } = started(['migrate']);
    expect([exit, out, err]).toEqual([2, '', 'Name one of the commands: evaluate, cases.\n']);
  });
});

describe('check cases on the command line', () => {
  test('exit 0 where every line is ok', () => {
    const { exit, out, err } = started(['cases', join(REFERENCE, 'receiver.checks.json')]);
    expect([exit, err]).toEqual([0, '']);
    expect(
      out
        .trim()
        .split('\n')
        .every((line) => line.startsWith('ok ')),
    ).toBe(true);
  });

  test('exit 1 where one is off, with the value got and the value expected', () => {
    const file = casesFile('off.json', [stray, { ...stray, id: 'wrong', expected: 30e-12 }]);
    const { exit, out } = started(['cases', file]);
    expect(exit).toBe(1);
    const [first, second] = out.trim().split('\n');
    expect(first).toMatch(/^ok stray 2\.81\d+e-11 2\.82e-11$/);
    expect(second).toMatch(/^off wrong 2\.81\d+e-11 3e-11$/);
  });

  test('exit 1 where a quantity is unknown', () => {
    const { exit, out } = started(['cases', casesFile('unknown.json', [{ ...stray, quantity: 'colour' }])]);
    expect(exit).toBe(1);
    expect(out).toMatch(/^unknown stray null 2\.82e-11\n$/);
  });

  test.each([
    ['no file', []],
    ['a missing file', [join(folder, 'missing.json')]],
    ['a file that is no JSON', [casesFile('bad.json', '[{')]],
    ['a file without a list of cases', [casesFile('empty.json', {})]],
  ])('exit 2 with %s, and nothing on standard output', (_what, files) => {
    const { exit, out, err } = started(['cases', ...files]);
    expect([exit, out]).toEqual([2, '']);
    expect(err).not.toBe('');
  });
});
