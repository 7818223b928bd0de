import { positive, within } from '../invalid-input';
import { log } from '../numeric/exp-log';
import { PI } from '../numeric/trig';
import { MU_0, type Henry, type Metre } from '../units';
import { sheetWithEnds } from './nagaoka';

export interface SolenoidShape {
  /** May be fractional, at least 1. */
  turns: number;
  /** Mean diameter, wire centre to wire centre. */
  diameter: Metre;
  pitch: Metre;
  wireBare: Metre;
  /** Current on the wire's surface (radio frequency, the default) or spread evenly. */
  highFrequency?: boolean | undefined;
}

const LN_TWO_PI = 1.8378770664093453;

/** Self term of Rosa's round-wire correction. */
export function rosaSelf(pitch: Metre, wireBare: Metre, highFrequency = true): number {
  return (highFrequency ? 1.5 : 1.25) - log((2 * positive('pitch', pitch)) / positive('wireBare', wireBare));
}

/** Mutual term of Rosa's correction, within 1.3e-8 of the exact sum for 1 to 200 turns. */
export function rosaMutual(turns: number): number {
  within('turns', turns, 1, 1e6);
  if (turns === 1) return 0;
  const i = 1 / turns;
  const i2 = i * i;
  const i3 = i2 * i;
  const i5 = i3 * i2;
  const i7 = i5 * i2;
  return (
    LN_TWO_PI - 1.5 - (log(turns) * i) / 6 - 0.33084236 * i - i3 / 120 + i5 / 504 - 0.0011925 * i7 + 0.000507 * i7 * i2
  );
}

/** Sums left over by the next order of the pitch: 25/384 - ln(2 pi)/32 a turn, and once for the two ends. */
const WIDE_A_TURN = 7.670508e-3;
const WIDE_ENDS = 1.03388e-2;

/**
 * What Rosa's correction leaves out at wide pitches, over mu0 times the radius. Derived for this engine: rings and sheet
 * differ by the means of the circles' mutual inductance over a pitch, whose part beyond ln(8/z) - 2 sums to a sixth of
 * that part at the coil's own length, and to terms of (p/a) squared by Euler and Maclaurin.
 */
function widePitch(turns: number, pitchOverRadius: number, ends: number): number {
  const beyond = ends - log(8 / (turns * pitchOverRadius)) + 2;
  return pitchOverRadius * pitchOverRadius * (WIDE_A_TURN * turns + WIDE_ENDS) + beyond / 6;
}

/**
 * Inductance of a single-layer coil: current sheet with Rosa's round-wire correction and its next order.
 * Range: every winding the design file lets through (l/D 0.02 to 20, pitch to D/3), also of fractional turns from 1.
 * Error against the sum over coaxial rings: below 1e-5 for pitches to D/20, 7e-4 at D/3 (Rosa alone: 5e-4 and 1.9e-2).
 * A helix differs from rings by under 1e-3 for p/D below 0.03; close-wound solid wire is 0.3 to 1.1 % lower at radio
 * frequency, and a carefully wound coil of measured dimensions lies within 1.5 %.
 * @see coils-and-capacitors.md A2; test/reference/loops.test.ts
 */
export function solenoid({ turns, diameter, pitch, wireBare, highFrequency = true }: SolenoidShape): Henry {
  const { sheet, ends } = sheetWithEnds(diameter, turns * pitch);
  const whole = (PI * turns * diameter * sheet) / (2 * pitch);
  const round = turns * (rosaSelf(pitch, wireBare, highFrequency) + rosaMutual(turns));
  return (MU_0 * diameter * (whole - round - widePitch(turns, (2 * pitch) / diameter, ends))) / 2;
}

export interface Sections {
  l1: Henry;
  l2: Henry;
  m: Henry;
  k: number;
}

/** The two sections of a tapped single-layer coil and their coupling; k of an air coil is about 0.3, not 1. */
export function sections(shape: SolenoidShape & { tapTurns: number }): Sections {
  const { tapTurns, turns } = shape;
  within('tapTurns', tapTurns, 1, turns - 1);
  const l1 = solenoid({ ...shape, turns: tapTurns });
  const l2 = solenoid({ ...shape, turns: turns - tapTurns });
  const m = (solenoid(shape) - l1 - l2) / 2;
  return { l1, l2, m, k: m / Math.sqrt(l1 * l2) };
}

/** Relative change of inductance for a relative change of one dimension, by central difference. */
export function solenoidSensitivity(shape: SolenoidShape, of: 'diameter' | 'pitch' | 'turns', step = 1e-4): number {
  const up = solenoid({ ...shape, [of]: shape[of] * (1 + step) });
  const down = solenoid({ ...shape, [of]: shape[of] * (1 - step) });
  return (log(up) - log(down)) / (log(1 + step) - log(1 - step));
}
