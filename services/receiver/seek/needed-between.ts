import type { Circuit } from '../network/circuit';
import { capacitanceNeeded, topAdmittance } from '../network/solve';
import { at } from '../numeric/cells';
import { TWO_PI, type Farad, type Hertz } from '../units';

/** Least and greatest capacitance needed. */
export interface Between {
  least: Farad;
  most: Farad;
}

/** Rounding of the solver, far below any capacitor's graduation. */
const SLACK = 1e-9;

/**
 * Capacitance needed at f for every detector conductance between two, into a record. The admittance at the top is a
 * fraction of two linear functions of the conductance, `Y(g) = (1 + g Zdd)/(Ztt + g D)` with `D = Ztt Zdd - Ztd^2`; its
 * slope is `(Ztd/(Ztt + g D))^2`, so the imaginary part turns only where that quotient is real or imaginary: at most
 * twice. The ends and the turns bound it exactly, whatever the circuit.
 */
export function neededBetween(circuit: Circuit, f: Hertz, least: number, most: number, into: Between): void {
  const kept = circuit.loadG;
  circuit.loadG = least;
  const first = capacitanceNeeded(circuit, f);
  into.least = first;
  into.most = first;
  const { sections, primary, detectorNode } = circuit;
  if ((sections > 1 || primary) && detectorNode !== sections - 1) {
    const n = primary ? sections + 1 : sections;
    const top = sections - 1;
    const { yr, yi } = circuit;
    const [tr, ti] = [at(yr, top * n + top), at(yi, top * n + top)];
    const [mr, mi] = [at(yr, top * n + detectorNode), at(yi, top * n + detectorNode)];
    const [dr, di] = [at(yr, detectorNode * n + detectorNode), at(yi, detectorNode * n + detectorNode)];
    // D, then conj(Ztd) Ztt and conj(Ztd) D.
    const er = tr * dr - ti * di - (mr * mr - mi * mi);
    const ei = tr * di + ti * dr - 2 * mr * mi;
    const turns = [-(mr * ti - mi * tr) / (mr * ei - mi * er), -(mr * tr + mi * ti) / (mr * er + mi * ei)];
    widen(circuit, f, most, into);
    for (const g of turns) if (g > 0 && least + g < most) widen(circuit, f, least + g, into);
  }
  const slack = SLACK * Math.max(Math.abs(into.least), Math.abs(into.most), 1e-12);
  into.least -= slack;
  into.most += slack;
  circuit.loadG = kept;
}

function widen(circuit: Circuit, f: Hertz, loadG: number, into: Between): void {
  circuit.loadG = loadG;
  topAdmittance(circuit, f);
  const needed = -circuit.topIm / (TWO_PI * f);
  into.least = Math.min(into.least, needed);
  into.most = Math.max(into.most, needed);
}
