import type { Design } from '../design';
import { CLASS_VALUES } from '../detector/diode';
import { at } from '../numeric/cells';
import { LIMITS } from '../schema/limits';
import { emptyCircuit, type Circuit } from './circuit';
import type { CoilFiller } from './filler';
import { aerialFiller } from './fill-aerial';
import { couplingFiller } from './fill-coupling';
import { measuredFiller } from './fill-measured';
import { tuningFiller } from './fill-tuning';
import { woundFiller } from './fill-wound';
import type { Wound } from './wound-geometry';
import { Values } from './values';

/** How the set is tuned: what moves, and whether a capacitor helps a slider. */
export type TuningMode = 'capacitor' | 'inductance' | 'slider-fixed' | 'slider-capacitor';

/** A design made ready for numbers: its values in a row, and the way from such a row to a circuit. */
export interface Plan {
  design: Design;
  mode: TuningMode;
  values: Values;
  nominal: Float64Array;
  circuit: Circuit;
  /** The wound coil's geometry as last filled; null for a measured coil. */
  wound: Wound | null;
  /** Fills the circuit from a row of values, coil at its largest inductance. */
  fill(x: Float64Array): void;
  /** Moves the coil of a slider or variable inductance; the rest as last filled. */
  moveTo(x: Float64Array, position: number): void;
}

function modeOf({ tuning }: Design): TuningMode {
  if (tuning.kind === 'inductance') return 'inductance';
  if (tuning.kind !== 'slider') return 'capacitor';
  return typeof tuning.c === 'object' && 'kind' in tuning.c ? 'slider-capacitor' : 'slider-fixed';
}

export function planOf(design: Design): Plan {
  const values = new Values();
  const circuit = emptyCircuit();
  const temperature = values.add('temperature', design.temperature, LIMITS.temperature);
  const aerial = aerialFiller(design, values);
  let coil: CoilFiller;
  let wound: Wound | null = null;
  if (design.coil.kind === 'measured') coil = measuredFiller(design, values);
  else {
    const filler = woundFiller(design, values, temperature);
    coil = filler.fill;
    wound = filler.wound;
  }
  const coupling = couplingFiller(design, values, temperature);
  const tuning = tuningFiller(design, values);
  const stray = values.add('stray', design.stray, LIMITS.stray);
  const cj = values.add('detector.cj', design.detector.cj ?? classCapacitance(design), LIMITS.cj);
  const moveTo = (x: Float64Array, position: number): void => {
    coil(x, circuit, position);
    coupling(x, circuit, position);
  };
  return {
    design,
    mode: modeOf(design),
    values,
    nominal: values.nominal(),
    circuit,
    wound,
    fill(x) {
      circuit.sound = true;
      aerial(x, circuit);
      tuning(x, circuit);
      circuit.stray = at(x, stray);
      circuit.cj = at(x, cj);
      moveTo(x, circuit.positionMax);
    },
    moveTo,
  };
}

function classCapacitance({ detector }: Design): number {
  return detector.class === undefined ? 0 : CLASS_VALUES[detector.class].cj;
}
