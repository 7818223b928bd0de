import { beforeAll, describe, expect, test } from 'vitest';
import { evaluate } from '@/services/receiver';
import { chanceFrom } from './outside/chance';
import { netlistOf } from './outside/netlist';
import { COUPLINGS, PLACES, randomCircuit, TUNINGS } from './outside/random-circuits';
import { spiceAnswers, type SpiceAnswer } from './outside/spice-runs';

/**
 * Source: ngspice (Debian), `.ac` on the same receivers as netlists written from the description of the network, each
 * section an inductor with its resistor, a wire as an open lossless line. Asked: 1e-4; met: 2e-7 of the voltage, 1e-9
 * of the frequency.
 */
const ASKED = 1e-4;
const EACH = 4;

const cases = COUPLINGS.flatMap((coupling) =>
  PLACES.flatMap((detectorAt) =>
    TUNINGS.flatMap((tuning) =>
      Array.from({ length: EACH }, (_, number) => ({ coupling, detectorAt, tuning, number: number + 1 })),
    ),
  ),
).map((form, index) => {
  const design = randomCircuit(chanceFrom(20261201 + index), form);
  const verdict = evaluate(design, { boxes: 0 });
  return { ...form, index, verdict, netlist: netlistOf(design, verdict) };
});
type Case = (typeof cases)[number];

let answers: SpiceAnswer[] = [];
beforeAll(() => {
  answers = spiceAnswers(cases);
});

function answerOf({ index }: Case): SpiceAnswer {
  const answer = answers[index];
  if (answer === undefined) throw new RangeError(`ngspice gave no answer for receiver ${index}.`);
  return answer;
}

function near(got: number, wanted: number, relative: number): void {
  expect(Math.abs(got / wanted - 1)).toBeLessThanOrEqual(relative);
}

type Row = SpiceAnswer['sweep'][number];
/** Where an end of the reach lies by the simulated sweep alone: on a crossing, or held between two frequencies. */
type Place = { crossing: true; from: number; to: number } | { crossing: false; from: number; to: number };

function lowPlace(sweep: readonly Row[], most: number): Place {
  const at = sweep.findIndex((row) => row.needed <= most);
  const [before, row, end] = [sweep[at - 1], sweep[at], sweep.at(-1)];
  if (before !== undefined && row !== undefined) return { crossing: true, from: before.f, to: row.f };
  const held = row?.f ?? end?.f ?? NaN;
  return { crossing: false, from: held, to: held };
}

function highPlace(sweep: readonly Row[], lo: number, least: number): Place {
  const rising = sweep.filter((row) => row.f > lo);
  for (const [i, row] of rising.entries()) {
    const before = rising[i - 1];
    if (row.needed <= least) return { crossing: true, from: before?.f ?? lo, to: row.f };
    if (before !== undefined && row.needed > before.needed)
      return { crossing: false, from: rising[i - 2]?.f ?? lo, to: row.f };
  }
  const held = sweep.at(-1)?.f ?? NaN;
  return { crossing: false, from: held, to: held };
}

/** Step of the sweep, relative: what an end may lie beside the place the sweep shows. */
const SWEEP_STEP = 6e-3;

describe.each(cases)('$coupling, detector at the $detectorAt, tuned by $tuning, receiver $number', (one) => {
  const { verdict, netlist } = one;

  test('gives the simulated voltage at the detector, and one channel beside it', () => {
    answerOf(one).points.forEach(({ own, below, above }, i) => {
      const point = verdict.points[i];
      near(point?.gain ?? NaN, own, ASKED);
      const sides = 20 * Math.log10(Math.max(below, above) / own);
      expect(Math.abs((point?.adjacent ?? NaN) - sides)).toBeLessThanOrEqual(20 * Math.log10(1 + ASKED));
    });
  });

  test('needs the simulated capacitance where it is tuned to', () => {
    // The sweep holds resistors of the middle of the band, so only that point is looked at; 6e-3 between its rows.
    const { f, c } = verdict.points[1] ?? { f: NaN, c: NaN };
    const { sweep } = answerOf(one);
    const at = sweep.findIndex((row) => row.f >= f);
    const [a, b] = [sweep[at - 1], sweep[at]];
    const around = [a?.needed ?? NaN, b?.needed ?? NaN];
    expect(c).toBeGreaterThanOrEqual(Math.min(...around) - 1e-16);
    expect(c).toBeLessThanOrEqual(Math.max(...around) + 1e-16);
  });

  test('is tuned at each end of its reach where the simulation is', () => {
    const { sweep, lo, hi } = answerOf(one);
    const { nominal } = verdict.reach;
    const places = {
      lo: lowPlace(sweep, netlist.across.max),
      hi: highPlace(sweep, nominal.lo, netlist.across.min),
    };
    for (const [end, crossing] of Object.entries({ lo, hi })) {
      const f = end === 'lo' ? nominal.lo : nominal.hi;
      const place = end === 'lo' ? places.lo : places.hi;
      expect(f).toBeGreaterThan(place.from * (1 - SWEEP_STEP));
      expect(f).toBeLessThan(place.to * (1 + SWEEP_STEP));
      if (place.crossing) near(f, crossing, ASKED);
    }
  });
});

test('nearly all of the ends lie on a simulated crossing, so the comparison is not empty', () => {
  const crossings = cases.flatMap((one) => {
    const { sweep } = answerOf(one);
    const { across } = one.netlist;
    return [lowPlace(sweep, across.max), highPlace(sweep, one.verdict.reach.nominal.lo, across.min)];
  });
  expect(crossings.filter((place) => place.crossing).length).toBeGreaterThan(0.75 * crossings.length);
});
