import { inputResistance, rectifyBehind, type Diode } from './detector/diode';
import type { Sounding } from './figures';
import { sourceResistance } from './network/solve';
import type { Plan } from './network/plan';
import { adjacentAt, bandwidthAt, qAt, responseAt, tuneTo } from './network/point';
import type { Hertz, Ohm, Volt } from './units';

/** Open voltage at which the detector's load on the circuit is taken, peak. */
export const REFERENCE_LEVEL: Volt = 0.1;

export interface Load {
  sourceR: Ohm;
  inputR: Ohm;
  cOpen: number;
  openGain: number;
  qUnloaded: number;
}

/**
 * The detector's load at one frequency: source resistance with its conductance absent and its capacitance present,
 * resonant in that state. Leaves the circuit with that load.
 * @see evaluate.md rule 2
 */
export function loadAt(plan: Plan, diode: Diode, dcLoad: Ohm, f: Hertz): Load {
  const { circuit } = plan;
  circuit.loadG = 0;
  const { c } = tuneTo(plan, f);
  const sourceR = sourceResistance(circuit, f, c);
  const openGain = responseAt(plan, c)(f);
  const qUnloaded = qAt(plan, f, c);
  const inputR = inputResistance(diode, rectifyBehind(diode, REFERENCE_LEVEL, sourceR, dcLoad));
  circuit.loadG = 1 / inputR;
  return { sourceR, inputR, cOpen: c, openGain, qUnloaded };
}

/** The circuit at one frequency with its own load. Leaves the circuit tuned and loaded there. */
export function soundingAt(plan: Plan, diode: Diode, dcLoad: Ohm, f: Hertz, want: { bandwidth: boolean }): Sounding {
  const load = loadAt(plan, diode, dcLoad, f);
  const { position, c } = tuneTo(plan, f);
  const response = responseAt(plan, c);
  return {
    ...load,
    f,
    c,
    position,
    gain: response(f),
    q: qAt(plan, f, c),
    bandwidth: want.bandwidth ? bandwidthAt(f, response) : null,
    adjacent: adjacentAt(f, plan.design.band.step, response),
  };
}
