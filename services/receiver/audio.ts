import { audioVoltage } from './detector/audio';
import { outputResistance, rectifyBehind } from './detector/diode';
import { germanium, type DetectorFacts } from './detector/facts';
import type { Design } from './design';
import {
  audioCorner,
  audioPower,
  powerShare,
  sensationLevel,
  THRESHOLD,
  voltageShare,
  type EarphoneCircuit,
  type Impedance,
} from './earphone/loads';
import type { AudioFigures, Sounding } from './figures';
import { centre } from './schema/value';
import { REFERENCE_LEVEL } from './soundings';
import type { Ohm } from './units';

const ROOT_2 = 1.4142135623730951;
/** Field at the buyer's place where none is stated, rms V/m (ours). */
const DEFAULT_FIELD = 0.01;

export interface AudioChain {
  design: Design;
  detector: DetectorFacts;
  phone: EarphoneCircuit;
  /** Null where a ceramic phone has no path for direct current: then there is no sound to speak of. */
  dcLoad: Ohm | null;
  load: Impedance;
}

export function fieldAt({ place }: Design): number {
  return centre(place?.field ?? DEFAULT_FIELD);
}

/** Shares, corner and level at the middle of the band. @see evaluate.md rules 4 and 5 */
export function audioAt({ design, detector, phone, dcLoad, load }: AudioChain, sounding: Sounding): AudioFigures {
  const silent = { powerShare: null, voltageShare: null, corner: null, level: null, relative: null };
  const { diode } = detector;
  if (dcLoad === null) return { outputR: null, ...silent };
  const source = sounding.sourceR;
  const size = Math.sqrt(load.r * load.r + load.x * load.x);
  const outputR = outputResistance(diode, rectifyBehind(diode, REFERENCE_LEVEL, source, dcLoad).idc);
  const reference = audioVoltage(germanium(design), REFERENCE_LEVEL, source, dcLoad, size);
  const own = audioVoltage(diode, REFERENCE_LEVEL, source, dcLoad, size);
  const open = ROOT_2 * fieldAt(design) * sounding.openGain;
  const power = audioPower(phone, audioVoltage(diode, open, source, dcLoad, size), load);
  const threshold = design.earphone.threshold === undefined ? THRESHOLD[phone.kind] : centre(design.earphone.threshold);
  const level = sensationLevel(power, threshold);
  return {
    outputR,
    powerShare: powerShare(outputR, load),
    voltageShare: voltageShare(outputR, load),
    corner: phone.kind === 'ceramic' ? audioCorner(outputR, dcLoad, phone.c + (phone.bypass ?? 0)) : null,
    level: level > -Infinity ? level : null,
    relative: own / reference,
  };
}
