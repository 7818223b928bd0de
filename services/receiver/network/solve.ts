import { effectiveHeight, radiationResistance } from '../aerial/wire';
import { windingResistance } from '../coils/loss';
import { at } from '../numeric/cells';
import { invertSymmetric } from '../numeric/complex';
import { tan } from '../numeric/trig';
import { LIGHT_SPEED, TWO_PI, type Farad, type Hertz, type Metre, type Ohm } from '../units';
import type { Circuit } from './circuit';

/** Litz coils reach no more than this unless measured (ours). */
const LITZ_Q_CAP = 500;

/** EMF of the aerial for a field of 1 V/m. */
export function aerialHeight(circuit: Circuit, f: Hertz): Metre {
  return circuit.wire ? effectiveHeight(circuit.vertical, circuit.horizontal, f) : circuit.height;
}

/** Admittance of aerial, earth and coupling capacitor in series. */
function aerialAdmittance(circuit: Circuit, f: Hertz): void {
  const w = TWO_PI * f;
  let r = circuit.aerialR + circuit.earthR;
  let x: number;
  const c = circuit.aerialC * circuit.aerialScale;
  if (circuit.wire) {
    const length = circuit.vertical + circuit.horizontal;
    x = -length / (LIGHT_SPEED * c * tan((w * length) / LIGHT_SPEED));
    r += radiationResistance(aerialHeight(circuit, f), f);
  } else {
    x = w * circuit.aerialL - 1 / (w * c);
  }
  if (circuit.earthC > 0) x -= 1 / (w * circuit.earthC);
  if (circuit.couplingC > 0) x -= 1 / (w * circuit.couplingC);
  // An aerial without any resistance at its exact resonance would divide by zero; a nano-ohm is below any earth.
  const size = r * r + x * x + 1e-18;
  circuit.aerialYr = r / size;
  circuit.aerialYi = -x / size;
}

/** Series resistance of the whole coil. */
export function coilResistanceAt(circuit: Circuit, f: Hertz): Ohm {
  const reactance = TWO_PI * f * circuit.l;
  if (circuit.loss === 'q') return reactance / circuit.q;
  return circuit.loss === 'r' ? circuit.r : modelledResistance(circuit, f, reactance);
}

function modelledResistance(circuit: Circuit, f: Hertz, reactance: Ohm): Ohm {
  const copper = windingResistance(circuit.winding, f, circuit.skin) + reactance * circuit.coreTan;
  return circuit.winding.strands > 1 ? Math.max(copper, reactance / LITZ_Q_CAP) : copper;
}

/**
 * Admittance between top and earth with the sources short-circuited, into `topRe` and `topIm`: everything but the
 * tuning capacitor. Range: the circuit forms of the design file, values of the trade. Error against ngspice over 96 random
 * receivers: tuned frequency 1e-9.
 * @see receiver.md C1, C2; test/reference/ngspice.test.ts
 */
export function topAdmittance(circuit: Circuit, f: Hertz): void {
  aerialAdmittance(circuit, f);
  if (circuit.sections === 1 && !circuit.primary) {
    const w = TWO_PI * f;
    const r = coilResistanceAt(circuit, f);
    const x = w * circuit.l;
    const size = r * r + x * x;
    circuit.topRe = circuit.aerialYr + r / size + circuit.loadG;
    circuit.topIm = circuit.aerialYi - x / size + w * (circuit.cSelf + circuit.stray + circuit.cj);
    return;
  }
  const n = nodalInverse(circuit, f, 0, true);
  const top = circuit.sections - 1;
  const r = at(circuit.yr, top * n + top);
  const i = at(circuit.yi, top * n + top);
  const size = r * r + i * i;
  circuit.topRe = r / size;
  circuit.topIm = -i / size;
}

/** Tuning capacitance at which the set is tuned to f; negative where no capacitor does it. */
export function capacitanceNeeded(circuit: Circuit, f: Hertz): Farad {
  topAdmittance(circuit, f);
  return -circuit.topIm / (TWO_PI * f);
}

/**
 * Impedance matrix of the nodes, into yr and yi; returns the number of nodes. The aerial's admittance must be up to
 * date.
 */
function nodalInverse(circuit: Circuit, f: Hertz, tuning: Farad, loaded: boolean): number {
  const w = TWO_PI * f;
  const { sections, zr, zi, yr, yi, m, share } = circuit;
  const branches = circuit.primary ? sections + 1 : sections;
  const resistance = coilResistanceAt(circuit, f);
  const factor = circuit.primary ? (circuit.primaryK * Math.sqrt(circuit.primaryL * circuit.l)) / circuit.l : 0;
  for (let i = 0; i < sections; i += 1) {
    let linked = 0;
    for (let j = 0; j < sections; j += 1) {
      const l = at(m, i * 3 + j);
      linked += l;
      zr[i * branches + j] = i === j ? resistance * at(share, i) : 0;
      zi[i * branches + j] = w * l;
    }
    if (!circuit.primary) continue;
    zr[i * branches + sections] = 0;
    zr[sections * branches + i] = 0;
    zi[i * branches + sections] = w * factor * linked;
    zi[sections * branches + i] = w * factor * linked;
  }
  if (circuit.primary) {
    const own = sections * branches + sections;
    zr[own] =
      circuit.primaryR +
      (circuit.primaryWinding === null ? 0 : windingResistance(circuit.primaryWinding, f, circuit.skin));
    zi[own] = w * circuit.primaryL;
  }
  invertSymmetric(branches, zr, zi, circuit.order);
  incidence(branches, sections, zr, yr);
  incidence(branches, sections, zi, yi);
  const top = (sections - 1) * branches + sections - 1;
  const tap = circuit.detectorNode * branches + circuit.detectorNode;
  const aerial = circuit.aerialNode * branches + circuit.aerialNode;
  const foil = circuit.foilTan > 0 && tuning > 0 ? w * tuning * circuit.foilTan : 0;
  yr[top] = at(yr, top) + foil;
  yi[top] = at(yi, top) + w * (circuit.cSelf + circuit.stray + tuning);
  if (loaded) yr[tap] = at(yr, tap) + circuit.loadG;
  yi[tap] = at(yi, tap) + w * circuit.cj;
  yr[aerial] = at(yr, aerial) + circuit.aerialYr;
  yi[aerial] = at(yi, aerial) + circuit.aerialYi;
  invertSymmetric(branches, yr, yi, circuit.order);
  return branches;
}

/** A Gamma A^T for a chain of sections from earth to the top, and a primary with its other end at earth. */
function incidence(n: number, sections: number, gamma: Float64Array, y: Float64Array): void {
  for (let p = 0; p < n; p += 1) {
    const nextP = p + 1 < sections ? p + 1 : -1;
    for (let q = 0; q < n; q += 1) {
      const nextQ = q + 1 < sections ? q + 1 : -1;
      let sum = at(gamma, p * n + q);
      if (nextQ >= 0) sum -= at(gamma, p * n + nextQ);
      if (nextP >= 0) sum -= at(gamma, nextP * n + q);
      if (nextP >= 0 && nextQ >= 0) sum += at(gamma, nextP * n + nextQ);
      y[p * n + q] = sum;
    }
  }
}

/**
 * Magnitude of the detector's voltage for an EMF of 1 V, tuned with a capacitance. Against ngspice over 96 random
 * receivers 2e-7, also one channel beside the tuned one.
 * @see receiver.md C1; test/reference/ngspice.test.ts
 */
export function voltagePerEmf(circuit: Circuit, f: Hertz, tuning: Farad): number {
  aerialAdmittance(circuit, f);
  const { aerialYr, aerialYi } = circuit;
  const driven = Math.sqrt(aerialYr * aerialYr + aerialYi * aerialYi);
  if (circuit.sections === 1 && !circuit.primary) {
    topAdmittance(circuit, f);
    const w = TWO_PI * f;
    const re = circuit.topRe + (tuning > 0 ? w * tuning * circuit.foilTan : 0);
    const im = circuit.topIm + w * tuning;
    return driven / Math.sqrt(re * re + im * im);
  }
  const n = nodalInverse(circuit, f, tuning, true);
  const cell = circuit.detectorNode * n + circuit.aerialNode;
  const re = at(circuit.yr, cell);
  const im = at(circuit.yi, cell);
  return driven * Math.sqrt(re * re + im * im);
}

/** Detector volts for a field of 1 V/m. */
export function voltagePerField(circuit: Circuit, f: Hertz, tuning: Farad): number {
  return voltagePerEmf(circuit, f, tuning) * Math.abs(aerialHeight(circuit, f));
}

/** Resistance the circuit presents to the detector: 1/Re Y at its node, its own conductance left out. */
export function sourceResistance(circuit: Circuit, f: Hertz, tuning: Farad): Ohm {
  aerialAdmittance(circuit, f);
  if (circuit.sections === 1 && !circuit.primary) {
    topAdmittance(circuit, f);
    return 1 / (circuit.topRe - circuit.loadG + (tuning > 0 ? TWO_PI * f * tuning * circuit.foilTan : 0));
  }
  const n = nodalInverse(circuit, f, tuning, false);
  const cell = circuit.detectorNode * n + circuit.detectorNode;
  const re = at(circuit.yr, cell);
  const im = at(circuit.yi, cell);
  return (re * re + im * im) / re;
}
