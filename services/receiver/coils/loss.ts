import { positive } from '../invalid-input';
import { PI } from '../numeric/trig';
import { MU_0, TWO_PI, type Hertz, type Kelvin, type Metre, type Ohm } from '../units';
import { copper, windingLength, wireResistance } from './wire';

/** Skin depth, resistance ratio F and transverse response X of a round copper wire. */
export interface Skin {
  delta: Metre;
  f: number;
  x: number;
}

/**
 * Skin effect of one wire by the continued fraction of J0/J1: + - * / alone, 1e-15 against library Bessel functions.
 * @see coils-and-capacitors.md E1, E2
 */
export function skin(bare: Metre, frequency: Hertz, temperature: Kelvin): Skin {
  const into: Skin = { delta: 0, f: 0, x: 0 };
  skinInto(positive('bare', bare), positive('frequency', frequency), copper(temperature), into);
  return into;
}

function skinInto(bare: Metre, frequency: Hertz, resistivity: number, into: Skin): void {
  const delta = Math.sqrt(resistivity / (PI * frequency * MU_0));
  const ratio = bare / (2 * delta);
  // z squared is -2j (d / 2 delta)^2: purely imaginary.
  const zi = -2 * ratio * ratio;
  const n = 20 + Math.floor(bare / delta);
  let tr = 2 * n + 4;
  let ti = 0;
  for (let k = 2 * n + 2; k >= 4; k -= 2) {
    const size = tr * tr + ti * ti;
    const qr = (zi * ti) / size;
    const qi = (zi * tr) / size;
    tr = k - qr;
    ti = -qi;
  }
  const size = tr * tr + ti * ti;
  const qr = (zi * ti) / size;
  const qi = (zi * tr) / size;
  into.delta = delta;
  into.f = 1 - qr / 2;
  // The real part of j / (2 - q) is Im(2 - q) / |2 - q|^2.
  const dr = 2 - qr;
  const di = -qi;
  into.x = di / (dr * dr + di * di);
}

const LENGTHS = [0, 0.2, 0.4, 0.6, 0.8, 1, 2, 4, 6, 8, 10, Infinity] as const;
const PITCHES = [1, 1.111, 1.25, 1.429, 1.667, 2, 2.5, 3.333, 5, 10] as const;
/**
 * Medhurst's table of R of the coil over R of the straight wire (1947), rows by length/diameter, columns by
 * pitch/wire.
 */
const PHI: readonly (readonly number[])[] = [
  [5.31, 3.73, 2.74, 2.12, 1.74, 1.44, 1.2, 1.16, 1.07, 1.02],
  [5.45, 3.84, 2.83, 2.2, 1.77, 1.48, 1.29, 1.19, 1.08, 1.02],
  [5.65, 3.99, 2.97, 2.28, 1.83, 1.54, 1.33, 1.21, 1.08, 1.03],
  [5.8, 4.11, 3.1, 2.38, 1.89, 1.6, 1.38, 1.22, 1.1, 1.03],
  [5.8, 4.17, 3.2, 2.44, 1.92, 1.64, 1.42, 1.23, 1.1, 1.03],
  [5.55, 4.1, 3.17, 2.47, 1.94, 1.67, 1.45, 1.24, 1.1, 1.03],
  [4.1, 3.36, 2.74, 2.32, 1.98, 1.74, 1.5, 1.28, 1.13, 1.04],
  [3.54, 3.05, 2.6, 2.27, 2.01, 1.78, 1.54, 1.32, 1.15, 1.04],
  [3.31, 2.92, 2.6, 2.29, 2.03, 1.8, 1.56, 1.34, 1.16, 1.04],
  [3.2, 2.9, 2.62, 2.34, 2.08, 1.81, 1.57, 1.34, 1.165, 1.04],
  [3.23, 2.93, 2.65, 2.37, 2.1, 1.83, 1.58, 1.35, 1.17, 1.04],
  [3.41, 3.11, 2.815, 2.51, 2.22, 1.93, 1.65, 1.395, 1.19, 1.05],
];

/**
 * Medhurst's ratio of 1947, bilinear; above length/diameter 10 linear in its inverse, beyond pitch/wire 10 with its square.
 * Range: coils of 30 to 50 turns or more. Within 5 % of a perfect-conductor solution for pitch/wire from 1.25 and
 * length/diameter 1 to 4; too low for short close windings, where no real wire at medium wave comes.
 * @see coils-and-capacitors.md E3
 */
export function phi(lengthOverDiameter: number, pitchOverWire: number): number {
  const ratio = Math.max(0, lengthOverDiameter);
  if (pitchOverWire > 10) return 1 + (phi(ratio, 10) - 1) * (10 / pitchOverWire) * (10 / pitchOverWire);
  const pitch = Math.max(1, pitchOverWire);
  let column = 0;
  while (column < PITCHES.length - 2 && pitch > (PITCHES[column + 1] ?? NaN)) column += 1;
  const p0 = PITCHES[column] ?? NaN;
  const p1 = PITCHES[column + 1] ?? NaN;
  const across = (pitch - p0) / (p1 - p0);
  if (ratio >= 10) {
    const longest = inRow(11, column, across);
    return longest + ((inRow(10, column, across) - longest) * 10) / ratio;
  }
  let row = 0;
  while (row < LENGTHS.length - 3 && ratio > (LENGTHS[row + 1] ?? NaN)) row += 1;
  const l0 = LENGTHS[row] ?? NaN;
  const l1 = LENGTHS[row + 1] ?? NaN;
  const low = inRow(row, column, across);
  return low + ((inRow(row + 1, column, across) - low) * (ratio - l0)) / (l1 - l0);
}

/** A row of the table, between two of its columns. */
function inRow(row: number, column: number, across: number): number {
  const cells = PHI[row];
  const a = cells?.[column] ?? NaN;
  return a + ((cells?.[column + 1] ?? NaN) - a) * across;
}

/** What the loss model needs of a winding, worked out once a geometry. */
export interface Winding {
  /** Length of wire, metre. */
  wire: Metre;
  bare: Metre;
  /** 1 for solid wire. */
  strands: number;
  /** Overall diameter of a litz bundle. */
  bundle: Metre;
  phi: number;
  resistivity: number;
  /** Longer way of a twisted strand (1.05); 1 for solid wire. */
  lay: number;
}

/**
 * Resistance of a winding at a frequency: skin effect and the field of the neighbours.
 * Range: round wire of 0.1 to 1 mm at 0.5 to 5 MHz. Error against a full field solution: -7 to +20 % for solenoids, -23 to
 * +4 % for flat spirals; real coils another 10 to 20 %, so Q +-25 %. Litz is first order and optimistic by about two.
 * @see coils-and-capacitors.md E4, E5
 */
export function windingResistance(winding: Winding, frequency: Hertz, scratch: Skin): Ohm {
  const { wire, bare, strands, bundle, resistivity } = winding;
  skinInto(bare, frequency, resistivity, scratch);
  const direct = (4 * resistivity) / (PI * bare * bare);
  const rate = frequency * MU_0;
  if (strands <= 1) return wire * (scratch.f * direct + rate * scratch.x * (winding.phi - 1));
  const own = (scratch.f * direct * winding.lay) / strands;
  const near =
    (strands * TWO_PI * frequency * MU_0 * (bare / 2) * (bare / 2) * scratch.x * winding.phi) /
    (TWO_PI * (bundle / 2) * (bundle / 2));
  return wire * (own + near);
}

export interface SolidCoil {
  turns: number;
  diameter: Metre;
  pitch: Metre;
  wireBare: Metre;
  frequency: Hertz;
  temperature: Kelvin;
}

/** Resistance of a single-layer coil of solid wire. */
export function coilResistance({ turns, diameter, pitch, wireBare, frequency, temperature }: SolidCoil): Ohm {
  const winding: Winding = {
    wire: windingLength(turns, diameter, pitch),
    bare: wireBare,
    strands: 1,
    bundle: wireBare,
    phi: phi((turns * pitch) / diameter, pitch / wireBare),
    resistivity: copper(temperature),
    lay: 1,
  };
  return windingResistance(winding, frequency, { delta: 0, f: 0, x: 0 });
}

export interface LitzCoil {
  turns: number;
  diameter: Metre;
  pitch: Metre;
  strandBare: Metre;
  strands: number;
  bundleDiameter: Metre;
  layFactor?: number | undefined;
  frequency: Hertz;
  temperature: Kelvin;
}

/**
 * Resistance of a single-layer coil of litz; first order, optimistic: real coils reach about half the Q. @see
 * coils-and-capacitors.md E5
 */
export function litzResistance(coil: LitzCoil): Ohm {
  const { turns, diameter, pitch, strandBare, strands, bundleDiameter, layFactor = 1.05 } = coil;
  const winding: Winding = {
    wire: windingLength(turns, diameter, pitch),
    bare: strandBare,
    strands,
    bundle: bundleDiameter,
    phi: phi((turns * pitch) / diameter, pitch / bundleDiameter),
    resistivity: copper(coil.temperature),
    lay: layFactor,
  };
  return windingResistance(winding, coil.frequency, { delta: 0, f: 0, x: 0 });
}

/** Q of losses that add up. */
export function totalQ(...q: number[]): number {
  let sum = 0;
  for (const each of q) sum += 1 / each;
  return 1 / sum;
}

/** Direct-current resistance of a length of wire. */
export function directResistance(wire: Metre, bare: Metre, strands: number, temperature: Kelvin): Ohm {
  const each = wire * wireResistance(bare, temperature);
  return strands > 1 ? (each * 1.05) / strands : each;
}
