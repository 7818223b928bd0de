import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { evaluate, type Verdict } from '@/services/receiver';
import { worked, type WorkedRow } from './worked';

function judged(row: WorkedRow): Verdict {
  const file = new URL(`./designs/${row.file}.json`, import.meta.url);
  return evaluate(JSON.parse(readFileSync(file, 'utf8')));
}

/** Within a relative tolerance, or half a unit of the last digit that was printed. */
function near(got: number | null, printed: string, relative: number): void {
  const wanted = Number(printed);
  const decimals = printed.split('.')[1]?.length ?? 0;
  const half = 0.5000001 / Number(`1e${decimals}`);
  expect(got).not.toBeNull();
  expect(Math.abs((got ?? NaN) - wanted)).toBeLessThanOrEqual(Math.max(half, relative * Math.abs(wanted)));
}

const QUIET = ['DATA-NONE', 'LOT-SMALL', 'UNIT-ODD'];

describe.each(worked)('$file', (row) => {
  const verdict = judged(row);
  const middle = verdict.points[1];
  const frequency = row.wound ? 5e-4 : 2e-5;
  const rest = row.wound ? 5e-3 : 2e-3;

  test('reaches what an independent computation reaches', () => {
    near(verdict.reach.nominal.lo / 1000, row.lo, frequency);
    near(verdict.reach.nominal.hi / 1000, row.hi, frequency);
  });

  test('stands at the middle of the band as an independent computation has it', () => {
    near((middle?.c ?? NaN) * 1e12, row.c, frequency);
    near(middle?.q ?? null, row.q, rest);
    near((middle?.sourceR ?? NaN) / 1000, row.sourceR, rest);
    near((middle?.inputR ?? NaN) / 1000, row.inputR, rest);
    near(middle?.adjacent ?? null, row.adjacent, rest);
    if (row.turns !== undefined) near(middle?.turns ?? null, row.turns, frequency);
  });

  test('sounds as an independent computation has it', () => {
    const { powerShare, voltageShare, level } = verdict.earphone;
    const { relative } = verdict.detector;
    if (row.powerShare === '-') {
      expect([powerShare, voltageShare, relative, level, verdict.earphone.corner]).toEqual([
        null,
        null,
        null,
        null,
        null,
      ]);
      return;
    }
    near(powerShare, row.powerShare, rest);
    near(voltageShare, row.voltageShare, rest);
    near(relative, row.relative, rest);
    expect(Math.abs((level ?? NaN) - Number(row.level))).toBeLessThanOrEqual(0.1);
  });

  test('stops and notes exactly what was published', () => {
    const stops = verdict.findings.filter((finding) => finding.severity === 'stop').map((finding) => finding.code);
    const notes = verdict.findings.filter((finding) => finding.severity === 'note' && !QUIET.includes(finding.code));
    expect(stops.sort()).toEqual([...row.stops].sort());
    expect(notes.map((finding) => finding.code).sort()).toEqual([...row.notes].sort());
    expect(verdict.outcome).toBe(row.stops.length > 0 ? 'stops' : 'clears');
  });

  if (row.corners !== undefined) {
    const { lo, hi, covered } = row.corners;
    test('has the published corners and, within the noise of drawing, the published share of boxes', () => {
      near(verdict.reach.corners.lo / 1000, lo, frequency);
      near(verdict.reach.corners.hi / 1000, hi, frequency);
      const p = covered / 20000;
      const share = verdict.share ?? { covered: NaN, boxes: 2000 };
      const noise = 4 * Math.sqrt(p * (1 - p) * (1 / 20000 + 1 / share.boxes));
      expect(Math.abs(share.covered / share.boxes - p)).toBeLessThanOrEqual(noise);
    });
  }
});

test('a coil with two taps has the published sections', () => {
  const row = worked.find(({ file }) => file === 'solenoid-two-taps');
  const sections = row === undefined ? [] : judged(row).coil.sections;
  const published = [
    ['25.474', '14.103', '7.860'],
    ['14.103', '35.217', '20.568'],
    ['7.860', '20.568', '72.689'],
  ];
  published.forEach((wanted, i) => wanted.forEach((value, j) => near((sections[i]?.[j] ?? NaN) * 1e6, value, 5e-4)));
});
