import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { defaultRules, Verdict } from '@/services/receiver';

const DESIGNS = new URL('../../reference/designs/', import.meta.url).pathname;
const ROOT = new URL('../../../', import.meta.url).pathname;
const folder = mkdtempSync(join(tmpdir(), 'coilyard-evaluate-'));

function run(words: string[], input?: string) {
  const done = spawnSync(process.execPath, ['--import', 'tsx', 'services/commands/evaluate.ts', ...words], {
    cwd: ROOT,
    encoding: 'utf8',
    ...(input === undefined ? {} : { input }),
  });
  return { exit: done.status, out: done.stdout, err: done.stderr };
}

function saved(name: string, content: unknown): string {
  const file = join(folder, name);
  writeFileSync(file, typeof content === 'string' ? content : JSON.stringify(content));
  return file;
}

describe('a design file on the command line', () => {
  test('that clears exits 0 with the verdict, one line feed and no word beside it', () => {
    const { exit, out, err } = run([`${DESIGNS}clears-series.json`]);
    expect([exit, err]).toEqual([0, '']);
    expect(out.endsWith('}\n')).toBe(true);
    expect(Verdict.parse(JSON.parse(out))).toMatchObject({ outcome: 'clears', seed: 1, boxes: 2000 });
  });

  test('that is stopped exits 1, and the same file, seed and boxes give the same bytes, also from standard input', () => {
    const words = ['--seed', '4294967295', '--boxes', '400'];
    const first = run([`${DESIGNS}yield.json`, ...words]);
    const file = execFileSync('cat', [`${DESIGNS}yield.json`], { encoding: 'utf8' });
    const second = run([...words, '-'], file);
    expect(first.exit).toBe(1);
    expect(JSON.parse(first.out)).toMatchObject({ outcome: 'stops', seed: 4294967295, boxes: 400 });
    expect(second.out).toBe(first.out);
  });

  test('is judged by another set of thresholds where one is named', () => {
    const strict = saved('strict.json', { ...defaultRules, version: 'strict', guardNominal: 0.2 });
    const { exit, out } = run([`${DESIGNS}clears-series.json`, '--rules', strict, '--boxes', '400']);
    expect(exit).toBe(1);
    expect(JSON.parse(out).rules.version).toBe('strict');
  });

  test('is told in words with --text', () => {
    const { exit, out } = run([`${DESIGNS}silicon.json`, '--text']);
    expect(exit).toBe(1);
    expect(out).toContain('stops DET-UNSUIT: This detector gives next to nothing without a battery');
  });

  test.each([
    ['no file', []],
    ['two files', ['a.json', 'b.json']],
    ['a missing file', ['missing.json']],
    ['bad JSON', [saved('bad.json', '{ "format": ')]],
    ['an unknown flag', [`${DESIGNS}silicon.json`, '--fast']],
    ['too few boxes', [`${DESIGNS}silicon.json`, '--boxes', '399']],
    ['a seed past the end', [`${DESIGNS}silicon.json`, '--seed', '4294967296']],
  ])('with %s exits 2 with a sentence, no issue and nothing on standard output', (_what, words) => {
    const { exit, out, err } = run(words);
    expect([exit, out]).toEqual([2, '']);
    expect(JSON.parse(err)).toEqual({ error: expect.stringMatching(/^[A-Z].*\.$/), issues: [] });
  });

  test('with faults exits 2 and lists them all by their paths', () => {
    const broken = saved('broken.json', {
      format: 'coilyard-design/1',
      band: { lo: 526500, hi: 100000, firstCarrier: 531000, lastCarrier: 1602000, step: 0 },
      aerial: { kind: 'circuit', r: -1, l: 2e-5, c: 2e-10, effectiveHeight: 6, colour: 'red' },
      coupling: { kind: 'aerial-tap' },
      coil: { kind: 'measured', l: 'long', q: 140 },
      tuning: { kind: 'capacitor', min: 5e-10, max: { nominal: 1e-10, tol: 0.1, bin: 0.05 }, law: 'capacitance' },
      detector: {},
      earphone: { kind: 'magnetic', rDc: 4000, r: 18000 },
    });
    const { exit, out, err } = run([broken]);
    expect([exit, out]).toEqual([2, '']);
    const paths = JSON.parse(err).issues.map((issue: { path: string }) => issue.path);
    expect(paths).toEqual(
      expect.arrayContaining([
        'band.hi',
        'band.step',
        'aerial.r',
        'aerial.colour',
        'coil.l',
        'coil.taps.aerial',
        'tuning.max.bin',
        'tuning.max',
        'detector.n',
        'detector.is',
      ]),
    );
  });
});
