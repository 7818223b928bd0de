import { boxesOf } from '@/services/receiver/coverage/boxes';
import { parseDesign } from '@/services/receiver/parse';
import { prepared } from '@/services/receiver/survey';
import { aSet, aSolenoid } from '../unit/receiver/builders';
import { coveredByHand, type BareSet } from './boxes-by-hand';
import { heading, heapGrowth, line, rates, thousands } from './measure';

const BOXES = 200000;
const MEGA = 1e6;

function bare(cTol: number): BareSet {
  return {
    lo: 526500,
    hi: 1606500,
    aerial: { r: 41, l: 2e-5, c: 2e-10, cTol },
    coupling: 1.2e-11,
    coil: { l: 2.05e-4, tol: 0.06, q: 140, cSelf: 6e-12 },
    min: { c: 3e-11, tol: 0.25 },
    max: { c: 4.5e-10, tol: 0.1 },
    stray: 4e-12,
    cj: 8e-13,
  };
}

function planOfBare({ aerial, coil, min, max }: BareSet, dist: 'normal' | 'uniform' = 'normal') {
  const set = aSet({
    aerial: {
      kind: 'circuit',
      r: 1,
      l: aerial.l,
      c: aerial.cTol === 0 ? aerial.c : { nominal: aerial.c, tol: aerial.cTol },
      effectiveHeight: 6,
    },
    coil: { kind: 'measured', l: { nominal: coil.l, tol: coil.tol, dist }, q: coil.q, cSelf: coil.cSelf },
    tuning: {
      kind: 'capacitor',
      min: { nominal: min.c, tol: min.tol },
      max: { nominal: max.c, tol: max.tol },
      law: 'capacitance',
    },
  });
  return prepared(parseDesign(set)).plan;
}

/** Monte Carlo: the engine against a loop written for one circuit, and the engine on what has no closed form. */
export async function boxBenchmarks(): Promise<void> {
  heading('Monte Carlo, ends a second (two a box)');
  for (const [what, cTol] of [
    ['coil and capacitor drawn', 0],
    ['aerial drawn as well', 0.3],
  ] as const) {
    const set = bare(cTol);
    const plan = planOfBare(set);
    let own = 0;
    let hand = 0;
    const [ours = NaN, theirs = NaN] = rates(
      2 * BOXES,
      () => (own = boxesOf(plan, { seed: 1, boxes: BOXES, confidence: 0.95 }).covered),
      () => (hand = coveredByHand(set, 1, BOXES)),
    );
    const same = own === hand ? 'the same boxes cover' : `covered ${own} and ${hand}`;
    line(
      `one node, ${what}`,
      thousands(ours),
      `by hand ${thousands(theirs)}, ratio ${(ours / theirs).toFixed(2)}, ${same}`,
    );
  }
  const general = [
    ['solenoid whose former is drawn', aSet({ coil: { ...aSolenoid, formerDiameter: { nominal: 0.05, tol: 0.02 } } })],
    [
      'two taps, stray drawn',
      aSet({
        coil: { ...aSolenoid, taps: { aerial: 12, detector: 30 } },
        coupling: { kind: 'aerial-tap' },
        detectorAt: 'tap',
        stray: { nominal: 8e-12, tol: 0.5 },
      }),
    ],
  ] as const;
  for (const [what, design] of general) {
    const { plan } = prepared(parseDesign(design));
    const [rate = NaN] = rates(2 * 20000, () => boxesOf(plan, { seed: 1, boxes: 20000, confidence: 0.95 }));
    line(what, thousands(rate));
  }
  heading('Heap growth of warm loops, bytes a box, and collections of short-lived numbers meanwhile');
  const [, tapped] = general;
  const loops = [
    ['one node, all drawn uniformly', planOfBare(bare(0.3), 'uniform')],
    ['one node, the coil drawn normally', planOfBare(bare(0.3))],
    ['two taps, through the solver', prepared(parseDesign(tapped[1])).plan],
  ] as const;
  for (const [what, plan] of loops) {
    const { bytes, collections } = await heapGrowth(MEGA, () =>
      boxesOf(plan, { seed: 1, boxes: MEGA, confidence: 0.95 }),
    );
    line(`${what}, a million boxes`, bytes.toFixed(3), `${collections} collections`);
  }
}
