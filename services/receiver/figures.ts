import type { Design } from './design';
import type { DetectorFacts } from './detector/facts';
import type { Ends } from './coverage/reach';
import type { Share } from './coverage/boxes';
import type { LimitShare } from './coverage/limits';
import type { EarphoneCircuit, Impedance } from './earphone/loads';
import type { Plan } from './network/plan';
import type { Rules } from './rules';
import type { Hertz, Ohm } from './units';
import type { Verdict } from './verdict';

/** Middle of the band, everywhere the geometric mean of its edges. */
export function middleOf({ band }: Design): Hertz {
  return Math.sqrt(band.lo * band.hi);
}

/** What the circuit does at one frequency, loaded and unloaded. */
export interface Sounding {
  f: Hertz;
  c: number;
  position: number | null;
  /** Capacitance of the state without the detector's conductance. */
  cOpen: number;
  sourceR: Ohm;
  inputR: Ohm;
  /** Detector volts per V/m without the detector's conductance. */
  openGain: number;
  gain: number;
  q: number;
  qUnloaded: number;
  bandwidth: Hertz | null;
  adjacent: number;
}

export interface AudioFigures {
  outputR: Ohm | null;
  powerShare: number | null;
  voltageShare: number | null;
  corner: Hertz | null;
  level: number | null;
  relative: number | null;
}

/** Everything known about a design when the findings are made. */
export interface Figures {
  design: Design;
  rules: Rules;
  plan: Plan;
  points: Float64Array;
  phone: EarphoneCircuit;
  detector: DetectorFacts;
  dcLoad: Ohm;
  audio: Impedance;
  soundings: [first: Sounding, middle: Sounding, last: Sounding];
  audioFigures: AudioFigures;
  reach: Verdict['reach'];
  margins: Ends;
  cornerMargins: Ends;
  share: Share | null;
  limits: LimitShare[];
  coil: Verdict['coil'];
}
