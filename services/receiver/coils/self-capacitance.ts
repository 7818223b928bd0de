import { PI } from '../numeric/trig';
import { EPSILON_0, TWO_PI, type Farad, type Henry, type Hertz, type Metre } from '../units';

/** Relative permittivity inside a winding by its former (ours; real coils +-20 %). */
export const FORMER_PERMITTIVITY = { air: 1, thin: 1.3, solid: 2.56, damp: 3 } as const;

/**
 * Self-capacitance of a single-layer coil, one end earthed; below length/diameter 0.1 the value there, scaled by the
 * diameter. Range: length/diameter 0.1 to 20. Against Medhurst's table, measured on solid rods, -3.8 to +2.5 %; real
 * coils +-20 % (common practice).
 * @see coils-and-capacitors.md F
 */
export function selfCapacitance(length: Metre, diameter: Metre, erInside: number): Farad {
  const ratio = Math.max(0.1, length / diameter);
  const d = 1 / ratio;
  const kc = 0.717439 * d + 0.933048 * d * Math.sqrt(d) + 0.106 * d * d;
  return ((4 * EPSILON_0 * ratio * diameter) / PI) * (1 + (kc * (1 + erInside)) / 2);
}

/** Capacitance in pF for each centimetre of diameter: the form the old table has. */
export function medhurstH(lengthOverDiameter: number, erInside: number): number {
  return selfCapacitance(lengthOverDiameter, 1, erInside) * 1e10;
}

/**
 * Resonance of an inductance and a capacitance. As a coil's self-resonance a lumped estimate, -20 to +10 %: the coil
 * is a line there.
 */
export function resonance(l: Henry, c: Farad): Hertz {
  return 1 / (TWO_PI * Math.sqrt(l * c));
}
