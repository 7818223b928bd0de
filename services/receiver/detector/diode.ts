import { positive } from '../invalid-input';
import { exp, expm1, log, log1p } from '../numeric/exp-log';
import { besselI1Scaled, lnBesselI0 } from '../numeric/bessel';
import { brent } from '../numeric/roots';
import { THERMAL_VOLT, type Ampere, type Farad, type Kelvin, type Ohm, type Volt } from '../units';

/** The diode law's two numbers, the second as n Vt in volt. */
export interface Diode {
  is: Ampere;
  nVt: Volt;
}

export const DETECTOR_CLASSES = [
  'germanium',
  'zero-bias-schottky',
  'schottky',
  'silicon',
  'mineral',
  'oxide-contact',
] as const;
export type DetectorClass = (typeof DETECTOR_CLASSES)[number];

interface ClassValues {
  is: Ampere;
  n: number;
  rs: Ohm;
  cj: Farad;
  /** A natural or improvised contact needs a measured curve; a tester's reading says nothing about it. */
  contact: boolean;
}

/** Values of the detector classes. @see receiver.md E1 for range and origin of each */
export const CLASS_VALUES: Record<DetectorClass, ClassValues> = {
  germanium: { is: 2e-7, n: 1.3, rs: 7, cj: 0.8e-12, contact: false },
  'zero-bias-schottky': { is: 3e-6, n: 1.06, rs: 25, cj: 0.18e-12, contact: false },
  schottky: { is: 2.2e-8, n: 1.08, rs: 6, cj: 0.7e-12, contact: false },
  silicon: { is: 2.52e-9, n: 1.752, rs: 0.57, cj: 4e-12, contact: false },
  mineral: { is: 5e-7, n: 1.8, rs: 200, cj: 3e-12, contact: true },
  'oxide-contact': { is: 5e-6, n: 3, rs: 1000, cj: 15e-12, contact: true },
};

export function diode(is: Ampere, n: number, temperature: Kelvin): Diode {
  return { is: positive('is', is), nVt: positive('n', n) * THERMAL_VOLT * positive('temperature', temperature) };
}

/** Resistance at no voltage. */
export function zeroBiasResistance({ is, nVt }: Diode): Ohm {
  return nVt / is;
}

/** Voltage at a forward current, bulk resistance included. */
export function forwardVoltage({ is, nVt }: Diode, i: Ampere, rs: Ohm): Volt {
  return nVt * log1p(i / is) + i * rs;
}

/** Saturation current from one forward reading; n cannot be had from it (a factor of 27 between n 1.1 and 1.5). */
export function saturationCurrent(vf: Volt, i: Ampere, nVt: Volt, rs: Ohm): Ampere {
  return i / expm1((vf - i * rs) / nVt);
}

/** Logarithm of 1 + u of a current ratio; a current at or below -Is has none. */
function lnOnePlus(u: number): number {
  return u <= -1 ? -Infinity : log1p(u);
}

/**
 * Rectified voltage over n Vt (y) at a radio voltage over n Vt (x), into a resistance of rho zero-bias resistances.
 * `ln I0(x) = y + ln(1 + y/rho)`: the right side rises in y, the root lies in [0, ln I0(x)].
 */
function rectified(x: number, rho: number): number {
  const target = lnBesselI0(x);
  if (target === 0) return 0;
  return brent((y) => y + log1p(y / rho) - target, 0, target);
}

/** Rectified voltage at a load line `idc0 + (vdc - vdc0)/slope` in place of vdc/R; its root may be of either sign. */
function rectifiedOnLine({ is, nVt }: Diode, x: number, line: LoadLine): number {
  const target = lnBesselI0(x);
  const residual = (y: number): number => {
    const idc = line.idc + (nVt * y - line.vdc) / line.slope;
    return target - y - lnOnePlus(idc / is);
  };
  const start = line.vdc / nVt;
  let step = 0.125;
  let low = start;
  let high = start;
  for (let i = 0; i < 80 && residual(low) < 0; i += 1) {
    low -= step;
    step *= 2;
  }
  step = 0.125;
  for (let i = 0; i < 80 && residual(high) > 0; i += 1) {
    high += step;
    step *= 2;
  }
  return brent((y) => clipped(residual(y)), low, high);
}

/** An infinite residual stands for "far too low" and must stay a number for the root finder. */
function clipped(value: number): number {
  return value > 1e6 ? 1e6 : value;
}

export interface LoadLine {
  idc: Ampere;
  vdc: Volt;
  /** Volt an ampere: the magnitude of the audio load. */
  slope: Ohm;
}

export interface Rectified {
  /** Radio voltage at the detector, peak. */
  v: Volt;
  vdc: Volt;
  idc: Ampere;
  /** Fundamental of the current, peak. */
  i1: Ampere;
}

function solved({ is, nVt }: Diode, v: Volt, y: number): Rectified {
  const x = v / nVt;
  return {
    v,
    vdc: y * nVt,
    idc: is * expm1(lnBesselI0(x) - y),
    i1: 2 * is * besselI1Scaled(x) * exp(x - y),
  };
}

/**
 * Steady state at a radio voltage, behind an ideal source, the capacitor large. Range: 0.03 to 1 V, Is 3e-9 to 8e-6 A, loads
 * of 5 k to 1 M; bulk resistance left out, good while Idc Rs is below a tenth of n Vt. Error against ngspice transients:
 * 3e-4 of the direct voltage, 3e-3 of the input resistance (ripple and step of the simulation).
 * @see receiver.md E2, E4; test/reference/detector-transients.test.ts
 */
export function rectify(d: Diode, v: Volt, load: Ohm): Rectified {
  return solved(d, v, rectified(v / d.nVt, (load * d.is) / d.nVt));
}

/**
 * Steady state behind a source resistance that shorts harmonics: solves V + R_s I1(V) = Voc. Range: sources of 20 k to 200 k
 * at 0.03 to 1 V. Error against ngspice transients behind a tuned circuit: 3e-3.
 * @see receiver.md E3; test/reference/detector-transients.test.ts
 */
export function rectifyBehind(d: Diode, open: Volt, source: Ohm, load: Ohm | LoadLine): Rectified {
  const at = (v: Volt): Rectified =>
    typeof load === 'number' ? rectify(d, v, load) : solved(d, v, rectifiedOnLine(d, v / d.nVt, load));
  if (open <= 0) return at(0);
  return at(brent((v) => v + source * at(v).i1 - open, 0, open, 1e-13));
}

/** Resistance the detector shows the circuit. */
export function inputResistance(d: Diode, { v, i1 }: Rectified): Ohm {
  return v > 0 && i1 > 0 ? v / i1 : zeroBiasResistance(d);
}

/** Share of the radio power that comes out as direct current. */
export function efficiency({ v, vdc, i1 }: Rectified, load: Ohm): number {
  return (2 * vdc * vdc) / (load * v * i1);
}

/**
 * Resistance of the detector as an audio source: the derivative of Idc at a fixed radio voltage. @see receiver.md E2
 */
export function outputResistance({ is, nVt }: Diode, idc: Ampere): Ohm {
  return nVt / (is + idc);
}

/** n from two readings a factor of ten or more apart. */
export function idealityFrom(
  lower: { v: Volt; i: Ampere },
  upper: { v: Volt; i: Ampere },
  rs: Ohm,
  temperature: Kelvin,
): number {
  return (upper.v - lower.v - (upper.i - lower.i) * rs) / (THERMAL_VOLT * temperature * log(upper.i / lower.i));
}
