import { positive } from '../invalid-input';
import { log } from '../numeric/exp-log';
import { PI } from '../numeric/trig';
import { EPSILON_0, TWO_PI, type Farad, type Metre } from '../units';

/** Thickness and relative permittivity of one layer between two plates. */
export type Layer = readonly [thickness: Metre, permittivity: number];

/**
 * Capacitance of a plate pair, layers in series and faces in parallel; edges left out (below 2 % for paper). Exact for
 * what it says, but a hand-made foil capacitor differs by 30 %: half a tenth of a millimetre of air halves it.
 * @see coils-and-capacitors.md G2
 */
export function plates({ area, layers, faces = 1 }: { area: number; layers: readonly Layer[]; faces?: number }): Farad {
  let gap = 0;
  for (const [thickness, permittivity] of layers)
    gap += positive('layers', thickness) / positive('layers', permittivity);
  return (faces * EPSILON_0 * positive('area', area)) / gap;
}

/**
 * Two discs in air (Kirchhoff). Against Love's integral equation -0.02 % at gap over radius 0.01, -0.8 % at 0.1, -2.3
 * % at 0.2.
 */
export function disc(radius: Metre, gap: Metre): Farad {
  const edge = (gap / (PI * radius)) * (log((16 * PI * radius) / gap) - 1);
  return ((EPSILON_0 * PI * radius * radius) / gap) * (1 + edge);
}

/**
 * Two rectangles in air (Palmer). Against a moment solution +1 % at gap over side 0.02, +2.1 % at 0.05, +3.7 % at 0.1.
 */
export function rect(width: Metre, height: Metre, gap: Metre): Farad {
  const edge = (side: Metre): number => (gap / (PI * side)) * (1 + log((TWO_PI * side) / gap));
  return ((EPSILON_0 * width * height) / gap) * (1 + edge(width)) * (1 + edge(height));
}

/**
 * Two foils on sleeves that slide over each other; the end adds about one gap of length, left out. @see
 * coils-and-capacitors.md G3
 */
export function sleeve({
  overlap,
  innerRadius,
  layers,
}: {
  overlap: Metre;
  innerRadius: Metre;
  layers: readonly Layer[];
}): Farad {
  let radius = positive('innerRadius', innerRadius);
  let gap = 0;
  for (const [thickness, permittivity] of layers) {
    const outer = radius + positive('layers', thickness);
    gap += log(outer / radius) / positive('layers', permittivity);
    radius = outer;
  }
  return (TWO_PI * EPSILON_0 * positive('overlap', overlap)) / gap;
}

/** Least capacitance of a foil pair if it was not measured: 5 pF and 2 % of the full value (ours). */
export function foilMinimum(full: Farad): Farad {
  return 5e-12 + 0.02 * full;
}
