import { InvalidInput, positive } from '../invalid-input';
import { log } from '../numeric/exp-log';
import { MU_0, type Henry, type Metre } from '../units';
import { elliptic, type Elliptic } from './nagaoka';

function mutual(r1: Metre, r2: Metre, z: Metre, e: Elliptic): Henry {
  const sum = r1 + r2;
  const difference = r1 - r2;
  const far = sum * sum + z * z;
  const square = (4 * r1 * r2) / far;
  elliptic(square, Math.sqrt((difference * difference + z * z) / far), e);
  const k = Math.sqrt(square);
  return MU_0 * Math.sqrt(r1 * r2) * ((2 / k - k) * e.first - (2 / k) * e.second);
}

/**
 * Mutual inductance of two coaxial circular filaments at an axial distance (Maxwell's form with elliptic integrals).
 * Range: radii 1:10, distances of 1e-3 to 10 radii. Error: 1e-11 against Carlson's forms of the integrals.
 * @see coils-and-capacitors.md A2; test/reference/loops.test.ts
 */
export function loopMutual(r1: Metre, r2: Metre, z: Metre): Henry {
  positive('r1', r1);
  positive('r2', r2);
  if (r1 === r2 && z === 0) {
    throw new InvalidInput([{ path: 'z', message: 'Two equal loops need a distance above zero.' }]);
  }
  return mutual(r1, r2, z, { first: 0, second: 0 });
}

/**
 * Inductance of one circular loop of round wire, current on its surface or spread evenly. Leaves out the square of wire
 * over radius: about 1 % at the thickest wire of the form (a fifth of the diameter), 1e-4 at a fiftieth.
 * @see coils-and-capacitors.md A2
 */
export function loopSelf(radius: Metre, wireBare: Metre, highFrequency = true): Henry {
  return MU_0 * radius * (log((16 * radius) / wireBare) - 2 + (highFrequency ? 0 : 0.25));
}

/** A pile of coaxial turns: radius and height of each, in the order they are wound. */
export interface Loops {
  radius: Float64Array;
  height: Float64Array;
  wireBare: Metre;
  highFrequency: boolean;
}

/** Inductance of the turns from index `from` to before `to`, each pair counted once; smallest index first. */
export function loopsInductance(loops: Loops, from: number, to: number): Henry {
  const { radius, height, wireBare, highFrequency } = loops;
  const e: Elliptic = { first: 0, second: 0 };
  let own = 0;
  let pairs = 0;
  for (let i = from; i < to; i += 1) {
    const r = radius[i] ?? NaN;
    const z = height[i] ?? NaN;
    own += loopSelf(r, wireBare, highFrequency);
    for (let j = i + 1; j < to; j += 1) pairs += mutual(r, radius[j] ?? NaN, (height[j] ?? NaN) - z, e);
  }
  return own + 2 * pairs;
}

export interface CoaxialPair {
  turns1: number;
  diameter1: Metre;
  pitch1: Metre;
  start1: Metre;
  turns2: number;
  diameter2: Metre;
  pitch2: Metre;
  start2: Metre;
}

/**
 * Mutual inductance of two coaxial single-layer windings, turn m of each at start + pitch (m + 1/2): every pair of turns.
 * Error: 1e-10 against the same sum with Carlson's integrals; a helix differs from rings by under 1e-3 for p/D below 0.03.
 * @see coils-and-capacitors.md A4
 */
export function coaxialMutual(pair: CoaxialPair): Henry {
  const r1 = positive('diameter1', pair.diameter1) / 2;
  const r2 = positive('diameter2', pair.diameter2) / 2;
  const e: Elliptic = { first: 0, second: 0 };
  let sum = 0;
  for (let i = 0; i < pair.turns1; i += 1) {
    const z1 = pair.start1 + pair.pitch1 * (i + 0.5);
    for (let j = 0; j < pair.turns2; j += 1) {
      sum += mutual(r1, r2, pair.start2 + pair.pitch2 * (j + 0.5) - z1, e);
    }
  }
  return sum;
}
