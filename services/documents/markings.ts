/** How a part says its value: the codes of IEC 60062 for the parts that carry one. */

const colours = ['black', 'brown', 'red', 'orange', 'yellow', 'green', 'blue', 'violet', 'grey', 'white'] as const;

/** Tolerance bands by relative half width. */
const toleranceBands: readonly [number, string][] = [
  [0.01, 'brown'],
  [0.02, 'red'],
  [0.05, 'gold'],
  [0.1, 'silver'],
];

/** The four bands of a resistor of two figures: 47 kΩ, 5 % is yellow, violet, orange, gold. Null where two do not say it. */
export function resistorBands(ohm: number, tolerance: number | undefined): string[] | null {
  const figures = twoFigures(ohm);
  if (!figures) return null;
  const { first, second, zeros } = figures;
  const multiplier = zeros >= 0 ? colours[zeros] : zeros === -1 ? 'gold' : zeros === -2 ? 'silver' : undefined;
  const bands = [colours[first], colours[second], multiplier];
  const last = toleranceBands.find(([width]) => tolerance !== undefined && Math.abs(width - tolerance) < 1e-9)?.[1];
  const all = last === undefined ? bands : [...bands, last];
  return all.every((band) => band !== undefined) ? all : null;
}

/** The three figures on a small capacitor, picofarads: 220 pF is 221, 10 pF is 100. Null where they do not say it. */
export function capacitorCode(farad: number): string | null {
  const figures = twoFigures(farad * 1e12);
  if (!figures || figures.zeros < 0 || figures.zeros > 7) return null;
  return `${figures.first}${figures.second}${figures.zeros}`;
}

/** A value as two figures and a number of zeros, if that is all there is to it. */
function twoFigures(value: number): { first: number; second: number; zeros: number } | null {
  if (!(value > 0)) return null;
  const [mantissa = '', exponent = '0'] = value.toExponential(1).split('e');
  const exact = Math.abs(Number(value.toPrecision(2)) - value) <= value * 1e-6;
  if (!exact) return null;
  const [first = '0', second = '0'] = mantissa.replace('.', '');
  return { first: Number(first), second: Number(second), zeros: Number(exponent) - 1 };
}
