import { audioVoltage } from '../detector/audio';
import { outputResistance, rectifyBehind } from '../detector/diode';
import { detectorFacts, germanium, type DetectorFacts } from '../detector/facts';
import type { Design } from '../design';
import { earphoneCircuit } from '../earphone/facts';
import {
  audioCorner,
  audioLoad,
  directLoad,
  OPEN,
  powerShare,
  voltageShare,
  type EarphoneCircuit,
  type Impedance,
} from '../earphone/loads';
import { exp, log } from '../numeric/exp-log';
import type { Rules } from '../rules';
import { REFERENCE_LEVEL } from '../soundings';
import type { Ohm, Volt } from '../units';

/** What detector and phone do behind one source resistance. */
interface Edge {
  outputR: Ohm;
  own: Volt;
  germanium: Volt;
}

/** Ratio of two neighbouring source resistances of the grid. */
const RATIO = 1.12;
const STEP = log(RATIO);

/**
 * Whether a detector with a phone may clear its rules behind a source resistance. Audio voltage falls and the detector's
 * output resistance rises with the source resistance, so the two neighbours on a grid bound what lies between: the grid
 * is worked out once for all coils.
 */
export interface SoundBound {
  /** False: no design with this pair and source resistance clears. */
  mayClear(sourceR: Ohm): boolean;
  /** Least and greatest conductance that the detector can show the circuit. */
  conductance: { least: number; most: number };
}

/** A rule of detector or phone that stops whatever the circuit. */
function alwaysStops(detector: DetectorFacts, phone: EarphoneCircuit, rules: Rules): boolean {
  const { contact, measured, reading } = detector;
  if (contact && !measured) return true;
  if (!contact && !measured && reading !== null && reading > rules.forwardStop) return true;
  if (phone.kind !== 'ceramic' || phone.transformer !== null) return false;
  const back = phone.returnResistor;
  return back === null || back < rules.returnMin || back > rules.returnMax;
}

export function soundBoundOf(design: Design, rules: Rules): SoundBound {
  const detector = detectorFacts(design);
  const phone = earphoneCircuit(design);
  const dcLoad = directLoad(phone) ?? OPEN;
  const load = audioLoad(phone);
  const size = Math.sqrt(load.r * load.r + load.x * load.x);
  const reference = germanium(design);
  const stops = alwaysStops(detector, phone, rules);
  const edges = new Map<number, Edge>();
  const edgeAt = (place: number): Edge => {
    const known = edges.get(place);
    if (known !== undefined) return known;
    const source = exp(place * STEP);
    const made: Edge = {
      outputR: outputResistance(detector.diode, rectifyBehind(detector.diode, REFERENCE_LEVEL, source, dcLoad).idc),
      own: audioVoltage(detector.diode, REFERENCE_LEVEL, source, dcLoad, size),
      germanium: audioVoltage(reference, REFERENCE_LEVEL, source, dcLoad, size),
    };
    edges.set(place, made);
    return made;
  };
  const between = new Map<number, boolean>();
  // R_in = V/I1 with I1 = (V/Rj0)(1 + y/rho) 2 I1(x)/(x I0(x)); the last factor lies between 2/(2 + x) and 1, y below x.
  const x = REFERENCE_LEVEL / detector.diode.nVt;
  return {
    conductance: {
      least: (2 / ((2 + x) * detector.zeroBiasR)) * (1 - 1e-9),
      most: (1 / detector.zeroBiasR + x / dcLoad) * (1 + 1e-9),
    },
    mayClear(sourceR) {
      if (stops) return false;
      if (!(sourceR > 0)) return true;
      const place = Math.floor(log(sourceR) / STEP);
      let may = between.get(place);
      if (may === undefined) {
        may = soundBetween(edgeAt(place), edgeAt(place + 1), { phone, load, size, dcLoad, rules });
        between.set(place, may);
      }
      return may;
    },
  };
}

interface Chain {
  phone: EarphoneCircuit;
  load: Impedance;
  size: Ohm;
  dcLoad: Ohm;
  rules: Rules;
}

/** Room for rounding at a threshold. */
const ROOM = 1 - 1e-6;

function soundBetween(low: Edge, high: Edge, { phone, load, size, dcLoad, rules }: Chain): boolean {
  if (low.own / high.germanium < rules.detectorStop * ROOM) return false;
  if (phone.kind !== 'ceramic') {
    // The share is greatest where the output resistance equals the load's magnitude.
    const best = Math.min(high.outputR, Math.max(low.outputR, size));
    return powerShare(best, load) >= rules.powerStop * ROOM;
  }
  if (voltageShare(low.outputR, load) < rules.voltageStop * ROOM) return false;
  return audioCorner(low.outputR, dcLoad, phone.c + (phone.bypass ?? 0)) >= rules.lowpassStop * ROOM;
}
