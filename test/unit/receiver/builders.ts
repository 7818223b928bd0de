import type { DesignInput } from '@/services/receiver';

/** The plainest set that clears: measured coil, capacitor, aerial through a small capacitor, magnetic phones. */
export function aSet(changes: Partial<DesignInput> = {}): DesignInput {
  return {
    format: 'coilyard-design/1',
    band: { lo: 526500, hi: 1606500, firstCarrier: 531000, lastCarrier: 1602000, step: 9000 },
    aerial: { kind: 'circuit', r: 1, l: 2e-5, c: 2e-10, effectiveHeight: 6 },
    earth: { kind: 'resistance', r: 40 },
    coupling: { kind: 'series-c', c: 1.2e-11 },
    coil: { kind: 'measured', l: 0.000205, q: 140, cSelf: 6e-12 },
    tuning: { kind: 'capacitor', min: 1.2e-11, max: 5e-10, law: 'capacitance' },
    stray: 4e-12,
    detector: { is: 2e-7, n: 1.3, rs: 7, cj: 8e-13, measured: true },
    earphone: { kind: 'magnetic', rDc: 4000, r: 18000, x: 16000, threshold: 3e-14 },
    ...changes,
  };
}

export const aSolenoid = {
  kind: 'solenoid',
  turns: 72,
  formerDiameter: 0.05,
  wire: { bare: 0.0005, overall: 0.000534 },
  pitch: 0.00055,
  q: 150,
} as const satisfies DesignInput['coil'];
