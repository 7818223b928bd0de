import type { SeekAsk, StockLists } from '@/services/receiver/seek/ask';

/** An invented store for medium wave: prices in pence, wire by the metre. */
export const STOCK: StockLists = {
  formers: [
    { code: 'F-50', cost: 60, stock: 40, values: { diameter: 0.05, length: 0.12, wall: 'thin' } },
    { code: 'F-38', cost: 45, stock: 3, values: { diameter: 0.038, length: 0.1, wall: 'thin' } },
    { code: 'F-75', cost: 90, stock: 0, values: { diameter: 0.075, length: 0.09, wall: 'solid' } },
  ],
  wires: [
    { code: 'W-500', cost: 9, stock: 900, values: { bare: 0.0005, overall: 0.000534 } },
    { code: 'W-315', cost: 6, stock: 60, values: { bare: 0.000315, overall: 0.000342 } },
    { code: 'W-800', cost: 17, stock: 14, values: { bare: 0.0008, overall: 0.000842 } },
  ],
  capacitors: [
    {
      code: 'C-500',
      cost: 420,
      stock: 12,
      values: {
        kind: 'capacitor',
        min: { nominal: 1.2e-11, tol: 0.2 },
        max: { nominal: 5e-10, tol: 0.1 },
        law: 'capacitance',
      },
    },
    {
      code: 'C-365',
      cost: 380,
      stock: 30,
      values: {
        kind: 'capacitor',
        min: { nominal: 1.1e-11, tol: 0.2 },
        max: { nominal: 3.65e-10, tol: 0.05 },
        law: 'frequency',
      },
    },
    {
      code: 'K-1',
      cost: 150,
      stock: 9,
      values: {
        kind: 'foil',
        form: 'plates',
        width: 0.12,
        travel: 0.1,
        faces: 1,
        layers: [[0.0002, 2.5]],
        min: 9e-12,
        tan: 0.002,
      },
    },
  ],
  couplings: [
    { code: 'C-12', cost: 8, stock: 100, values: { nominal: 1.2e-11, tol: 0.05 } },
    { code: 'C-33', cost: 8, stock: 100, values: { nominal: 3.3e-11, tol: 0.05 } },
    { code: 'C-100', cost: 9, stock: 0, values: { nominal: 1e-10, tol: 0.05 } },
  ],
  detectors: [
    { code: 'D-G', cost: 70, stock: 25, values: { class: 'germanium', measured: true } },
    { code: 'D-Z', cost: 110, stock: 8, values: { class: 'zero-bias-schottky', measured: true } },
    { code: 'D-S', cost: 5, stock: 500, values: { class: 'silicon' } },
    { code: 'D-M', cost: 90, stock: 6, values: { class: 'mineral' } },
  ],
  earphones: [
    { code: 'E-H', cost: 900, stock: 5, values: { kind: 'magnetic', rDc: 4000, r: 18000, x: 16000, threshold: 3e-14 } },
    { code: 'E-C', cost: 190, stock: 60, values: { kind: 'ceramic', c: 1.5e-8 } },
    { code: 'E-30', cost: 150, stock: 90, values: { kind: 'dynamic', rDc: 30, r: 30 } },
  ],
  returns: [
    { code: 'R-100', cost: 2, stock: 400, values: 100e3 },
    { code: 'R-47', cost: 2, stock: 400, values: 47e3 },
    { code: 'R-2M', cost: 2, stock: 400, values: 2e6 },
  ],
};

/** Medium wave of regions 1 and 3 with a wire of 6 m up and 12 m along. */
export function anAsk(changes: Partial<SeekAsk> = {}): SeekAsk {
  return {
    band: { lo: 526500, hi: 1606500, firstCarrier: 531000, lastCarrier: 1602000, step: 9000 },
    aerial: { kind: 'wire', vertical: 6, horizontal: 12, radius: 0.0005 },
    stray: { nominal: 8e-12, tol: 0.5 },
    lFactor: { nominal: 1, tol: 0.04, dist: 'normal' },
    lists: STOCK,
    couplings: ['series-c', 'aerial-tap'],
    rank: 'cost',
    ...changes,
  };
}
