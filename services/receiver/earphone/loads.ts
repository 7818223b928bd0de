import { log10, powerRatio } from '../numeric/exp-log';
import { TWO_PI, type Farad, type Henry, type Hertz, type Ohm, type Volt, type Watt } from '../units';

export const AUDIO_FREQUENCY: Hertz = 1000;
/** Stands for a missing direct-current path. */
export const OPEN: Ohm = 1e12;

export type EarphoneKind = 'ceramic' | 'magnetic' | 'armature' | 'dynamic';

/** Tone threshold power where none is known, watt: one listener, one method, +-6 dB. @see receiver.md F */
export const THRESHOLD: Record<EarphoneKind, Watt> = {
  ceramic: 0.13e-12,
  magnetic: 0.1e-12,
  armature: 0.1e-12,
  dynamic: 10e-12,
};

export interface EarphoneCircuit {
  kind: EarphoneKind;
  /** Ceramic only. */
  c: Farad;
  rDc: Ohm;
  r: Ohm;
  x: Ohm;
  transformer: { ratio: number; primaryR: Ohm; primaryL: Henry; lossDb: number } | null;
  returnResistor: Ohm | null;
  bypass: Farad | null;
}

export interface Impedance {
  r: Ohm;
  x: Ohm;
}

function beside(a: Impedance, b: Impedance): Impedance {
  const dr = a.r + b.r;
  const dx = a.x + b.x;
  const nr = a.r * b.r - a.x * b.x;
  const nx = a.r * b.x + a.x * b.r;
  const size = dr * dr + dx * dx;
  return { r: (nr * dr + nx * dx) / size, x: (nx * dr - nr * dx) / size };
}

/** Load of the detector at 1 kHz. @see evaluate.md rule 3 */
export function audioLoad(phone: EarphoneCircuit): Impedance {
  const w = TWO_PI * AUDIO_FREQUENCY;
  let z: Impedance = { r: phone.r, x: phone.x };
  if (phone.kind === 'ceramic') z = beside({ r: phone.rDc, x: 0 }, { r: 0, x: -1 / (w * phone.c) });
  if (phone.transformer !== null) {
    const square = phone.transformer.ratio * phone.transformer.ratio;
    z = { r: z.r * square, x: z.x * square };
    if (phone.transformer.primaryL < Infinity) z = beside(z, { r: 0, x: w * phone.transformer.primaryL });
  }
  if (phone.returnResistor !== null) z = beside(z, { r: phone.returnResistor, x: 0 });
  if (phone.bypass !== null) z = beside(z, { r: 0, x: -1 / (w * phone.bypass) });
  return z;
}

/** Direct-current load of the detector, or null where a ceramic phone has no path at all. */
export function directLoad(phone: EarphoneCircuit): Ohm | null {
  const back = phone.returnResistor;
  if (phone.kind === 'ceramic' && phone.transformer === null) return back;
  const own = phone.transformer === null ? phone.rDc : phone.transformer.primaryR;
  return back === null ? own : (own * back) / (own + back);
}

/** Share of the available audio power that the load takes. */
export function powerShare(source: Ohm, z: Impedance): number {
  const sum = source + z.r;
  return (4 * source * z.r) / (sum * sum + z.x * z.x);
}

/** Share of the open audio voltage at the load. */
export function voltageShare(source: Ohm, z: Impedance): number {
  const sum = source + z.r;
  return Math.sqrt((z.r * z.r + z.x * z.x) / (sum * sum + z.x * z.x));
}

/** Corner above which a capacitive phone takes the treble away. */
export function audioCorner(source: Ohm, back: Ohm, c: Farad): Hertz {
  return 1 / (((TWO_PI * source * back) / (source + back)) * c);
}

/** Magnitude of a capacitor's impedance. */
export function capacitorImpedance(c: Farad, f: Hertz): Ohm {
  return 1 / (TWO_PI * f * c);
}

/** Power in the earphone from the open audio voltage; apparent power in a ceramic one. */
export function audioPower(phone: EarphoneCircuit, audio: Volt, z: Impedance): Watt {
  const loss = phone.transformer === null ? 1 : powerRatio(-phone.transformer.lossDb);
  if (phone.kind === 'ceramic') return ((audio * audio) / (2 * capacitorImpedance(phone.c, AUDIO_FREQUENCY))) * loss;
  return ((audio * audio * z.r) / (2 * (z.r * z.r + z.x * z.x))) * loss;
}

/**
 * Sensation level: decibel above the threshold. 50 dB is useful to an ordinary listener; thresholds are of one
 * listener and one method, +-6 dB.
 */
export function sensationLevel(power: Watt, threshold: Watt): number {
  return 10 * log10(power / threshold);
}
