import { within } from '../invalid-input';
import type { Farad } from '../units';

export type GangLaw = 'capacitance' | 'wavelength' | 'frequency';

export interface GangShape {
  law: GangLaw;
  min: Farad;
  max: Farad;
  /** Whole turn, radian. */
  turn: number;
  /** Stray capacitance that the plate law includes; 0 if unknown. */
  lawStray?: number | undefined;
}

export interface Gang {
  /** Capacitance at an angle from the open stop. */
  at(angle: number): Farad;
  /** Angle of a capacitance; beyond the ends it runs on. */
  angleOf(c: Farad): number;
}

/**
 * A tuning capacitor's capacity against angle, by the law its plates are cut to. Real plates keep the law over 10 to 95 % of
 * the travel; scales of hand-made sets lie within 3 % of frequency before they are calibrated (common practice).
 * @see coils-and-capacitors.md G1
 */
export function gang({ law, min, max, turn, lawStray = 0 }: GangShape): Gang {
  within('turn', turn, 1e-6, 6.2832);
  const a = Math.sqrt(min + lawStray);
  const b = Math.sqrt(max + lawStray);
  if (law === 'capacitance') {
    return { at: (angle) => min + ((max - min) * angle) / turn, angleOf: (c) => ((c - min) / (max - min)) * turn };
  }
  if (law === 'wavelength') {
    return {
      at: (angle) => {
        const root = a + (angle / turn) * (b - a);
        return root * root - lawStray;
      },
      angleOf: (c) => ((Math.sqrt(c + lawStray) - a) / (b - a)) * turn,
    };
  }
  return {
    at: (angle) => {
      const inverse = 1 / a + (angle / turn) * (1 / b - 1 / a);
      return 1 / (inverse * inverse) - lawStray;
    },
    angleOf: (c) => ((1 / Math.sqrt(c + lawStray) - 1 / a) / (1 / b - 1 / a)) * turn,
  };
}
