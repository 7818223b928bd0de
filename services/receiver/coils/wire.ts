import { positive, within } from '../invalid-input';
import { exp } from '../numeric/exp-log';
import { PI } from '../numeric/trig';
import type { Kelvin, Metre } from '../units';

/** Relative change of copper's resistivity a kelvin, from 20 degrees Celsius (IACS). */
export const COPPER_TEMPERATURE_COEFFICIENT = 0.00393;
const COPPER_DENSITY = 8890;
const ENAMEL_DENSITY = 1350;

/** Resistivity of copper, ohm metre: 100 % IACS, linear in temperature, 233 to 373 K. @see coils-and-capacitors.md D */
export function copper(temperature: Kelvin): number {
  return 1.7241e-8 * (1 + COPPER_TEMPERATURE_COEFFICIENT * (positive('temperature', temperature) - 293.15));
}

/** Ohm a metre at direct current; wire within its diameter's tolerance differs by 2 to 3 % (6 % at 0.1 mm). */
export function wireResistance(bare: Metre, temperature: Kelvin): number {
  return (4 * copper(temperature)) / (PI * positive('bare', bare) * bare);
}

/** Kilogram a metre of enamelled wire. */
export function wireMass(bare: Metre, overall: Metre): number {
  return (PI / 4) * (COPPER_DENSITY * bare * bare + ENAMEL_DENSITY * (overall * overall - bare * bare));
}

const LN_92 = 4.5217885770490405;

/** Diameter of a bare American wire gauge, metre; 00 is -1. */
export function awgDiameter(gauge: number): Metre {
  return 0.127e-3 * exp((LN_92 * (36 - within('gauge', gauge, -3, 56))) / 39);
}

interface EnamelRow {
  bare: number;
  tolerance: number;
  grade1: readonly [increase: number, overall: number];
  grade2: readonly [increase: number, overall: number];
}

/**
 * Metric sizes, millimetre: bare, tolerance, least increase and greatest overall diameter of grades 1 and 2. The least
 * increases of 0.112, 0.132 and 0.14 are interpolated; their overall diameters were read.
 */
const ENAMEL: readonly EnamelRow[] = [
  { bare: 0.1, tolerance: 0.003, grade1: [0.008, 0.117], grade2: [0.016, 0.125] },
  { bare: 0.112, tolerance: 0.003, grade1: [0.00896, 0.13], grade2: [0.01744, 0.139] },
  { bare: 0.125, tolerance: 0.003, grade1: [0.01, 0.144], grade2: [0.019, 0.154] },
  { bare: 0.132, tolerance: 0.003, grade1: [0.0104, 0.152], grade2: [0.0198, 0.162] },
  { bare: 0.14, tolerance: 0.003, grade1: [0.01086, 0.16], grade2: [0.02071, 0.171] },
  { bare: 0.16, tolerance: 0.003, grade1: [0.012, 0.182], grade2: [0.023, 0.194] },
  { bare: 0.2, tolerance: 0.003, grade1: [0.014, 0.226], grade2: [0.027, 0.239] },
  { bare: 0.25, tolerance: 0.004, grade1: [0.017, 0.281], grade2: [0.032, 0.297] },
  { bare: 0.315, tolerance: 0.004, grade1: [0.019, 0.349], grade2: [0.035, 0.367] },
  { bare: 0.4, tolerance: 0.005, grade1: [0.021, 0.439], grade2: [0.04, 0.459] },
  { bare: 0.5, tolerance: 0.005, grade1: [0.024, 0.544], grade2: [0.045, 0.566] },
  { bare: 0.56, tolerance: 0.006, grade1: [0.025, 0.606], grade2: [0.047, 0.63] },
  { bare: 0.63, tolerance: 0.006, grade1: [0.027, 0.679], grade2: [0.05, 0.704] },
  { bare: 0.71, tolerance: 0.007, grade1: [0.028, 0.762], grade2: [0.053, 0.789] },
  { bare: 0.8, tolerance: 0.008, grade1: [0.03, 0.855], grade2: [0.056, 0.884] },
  { bare: 1, tolerance: 0.01, grade1: [0.034, 1.062], grade2: [0.063, 1.094] },
];

export interface Enamel {
  minIncrease: Metre;
  maxOverall: Metre;
  nominal: Metre;
  tolerance: Metre;
}

/**
 * Diameters of enamelled wire; between the listed sizes the increases are interpolated, beyond them the end row's
 * hold.
 */
export function enamel(bare: Metre, grade: 1 | 2): Enamel {
  const size = positive('bare', bare) * 1000;
  const key = grade === 1 ? 'grade1' : 'grade2';
  let low = ENAMEL[0];
  let high = ENAMEL[ENAMEL.length - 1];
  for (const row of ENAMEL) {
    if (row.bare <= size + 1e-9) low = row;
    if (row.bare >= size - 1e-9) {
      high = row;
      break;
    }
  }
  if (low === undefined || high === undefined) throw new RangeError('The wire table is empty.');
  const span = high.bare - low.bare;
  const part = span === 0 ? 0 : Math.min(1, Math.max(0, (size - low.bare) / span));
  const mixed = (a: number, b: number): number => a + (b - a) * part;
  const increase = mixed(low[key][0], high[key][0]);
  const overall = size + mixed(low[key][1] - low.bare, high[key][1] - high.bare);
  return {
    minIncrease: increase / 1000,
    maxOverall: overall / 1000,
    nominal: (size + increase + overall) / 2000,
    tolerance: mixed(low.tolerance, high.tolerance) / 1000,
  };
}

/** Length of wire on a winding without leads. */
export function windingLength(turns: number, diameter: Metre, pitch: Metre): Metre {
  return turns * Math.sqrt(PI * PI * diameter * diameter + pitch * pitch);
}

export interface WireNeed {
  turns: number;
  diameter: Metre;
  pitch: Metre;
  /** Both leads together; twice 150 mm is common practice. */
  leads?: Metre | undefined;
  taps?: number | undefined;
  /** Wire in the twisted loop of a tap. */
  tapLoop?: Metre | undefined;
}

/** Length of wire a winder needs: winding, leads and tap loops. */
export function wireLength({ turns, diameter, pitch, leads = 0.3, taps = 0, tapLoop = 0.08 }: WireNeed): Metre {
  return windingLength(turns, diameter, pitch) + leads + taps * tapLoop;
}

/** Whole turns that lie close on a length of former. */
export function closeTurns(length: Metre, overall: Metre, lay: number): number {
  return Math.floor(length / (overall * lay) + 1e-9);
}
