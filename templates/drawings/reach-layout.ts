import { place, type Axis, type Contour, type Station } from './reach-axis';

export type RailSize = 'list' | 'card' | 'bench' | 'front' | 'print';

/** Heights of one size of rail, in pixels of the screen (points on paper), from its upper edge. */
export type RailLayout = {
  height: number;
  axis: number;
  axisLine: number;
  bar: { top: number; height: number };
  bracket: { top: number; foot: number; tick: number; line: number };
  contour: { top: number; foot: number; line: number } | null;
  pin: { top: number; foot: number; radius: number } | null;
  /** Baseline and size of the scale; null: no scale. */
  scale: { at: number; size: number } | null;
  /** Baseline and size of the words over the brackets; `under` puts the bare band ends below instead. */
  ends: { at: number; size: number; under: boolean } | null;
  /** Baselines of the two rows of station names. */
  names: readonly [number, number] | null;
};

const bench: RailLayout = {
  height: 114,
  axis: 78.5,
  axisLine: 1,
  bar: { top: 60.75, height: 16.5 },
  bracket: { top: 21.5, foot: 79.5, tick: 8, line: 3 },
  contour: { top: 32, foot: 60, line: 1.5 },
  pin: { top: 78, foot: 87, radius: 3.4 },
  scale: { at: 110, size: 11 },
  ends: { at: 14, size: 13, under: false },
  names: null,
};

export const railLayouts: Record<RailSize, RailLayout> = {
  list: {
    height: 16,
    axis: 8,
    axisLine: 1.2,
    bar: { top: 4.75, height: 6.5 },
    bracket: { top: 1, foot: 15, tick: 4, line: 2 },
    contour: null,
    pin: null,
    scale: null,
    ends: null,
    names: null,
  },
  card: {
    height: 51,
    axis: 24.5,
    axisLine: 1,
    bar: { top: 15.75, height: 7.5 },
    bracket: { top: 3, foot: 25, tick: 4, line: 2 },
    contour: { top: 7, foot: 15, line: 1 },
    pin: { top: 24, foot: 29, radius: 2.1 },
    scale: null,
    ends: { at: 49, size: 11, under: true },
    names: null,
  },
  bench,
  front: {
    height: 172,
    axis: 76.5,
    axisLine: 1,
    bar: { top: 56.75, height: 18.5 },
    bracket: { top: 21.5, foot: 77.5, tick: 8, line: 3 },
    contour: { top: 32, foot: 56, line: 1.5 },
    pin: { top: 76, foot: 87, radius: 4.2 },
    scale: { at: 118, size: 12 },
    ends: { at: 14, size: 13, under: false },
    names: [134, 156],
  },
  print: bench,
};

/**
 * The chance as steps: full height where every tried box reaches the frequency, the foot where none does.
 * `across` is the width in the caller's units; the path is open at the foot, `closed` ends it there.
 */
export function contourPath(options: {
  axis: Axis;
  contour: Contour;
  across: number;
  top: number;
  foot: number;
}): { line: string; area: string } | null {
  const { axis, contour, across, top, foot } = options;
  const inside = contour.f
    .map((f, index) => ({ f, share: Math.min(1, Math.max(0, contour.share[index] ?? 0)) }))
    .filter((point) => Number.isFinite(point.f) && point.f >= axis.lo && point.f <= axis.hi);
  const [first] = inside;
  const last = inside.at(-1);
  if (!first || !last || inside.length < 2) return null;
  const x = (f: number) => round(place(axis, f) * across);
  const y = (share: number) => round(foot - share * (foot - top));
  const steps = inside.slice(1).map((point) => `H${x(point.f)}V${y(point.share)}`);
  const line = `M${x(first.f)} ${y(first.share)}${steps.join('')}`;
  return { line, area: `${line}V${foot}H${x(first.f)}Z` };
}

export type NamedStation = Station & { at: number; row: 0 | 1 | null };

/** Gives station names two rows; a name that would lie on another stands in neither (its pin and its table row stay). */
export function stationRows(axis: Axis, stations: readonly Station[], width: number): NamedStation[] {
  const CHARACTER = 7.2; // mean advance of the 13 px text face, pixels
  const GAP = 10;
  const ends: [number, number] = [-Infinity, -Infinity];
  return [...stations]
    .filter((station) => station.f >= axis.lo && station.f <= axis.hi)
    .sort((a, b) => a.f - b.f)
    .map((station, index) => {
      const at = place(axis, station.f);
      const half = (Math.max(4, station.name.length) * CHARACTER) / 2;
      const first = index % 2 === 0 ? 0 : 1;
      const row = ([first, first === 0 ? 1 : 0] as const).find(
        (candidate) => at * width - half > ends[candidate] + GAP,
      );
      if (row === undefined) return { ...station, at, row: null };
      ends[row] = at * width + half;
      return { ...station, at, row };
    });
}

const round = (value: number) => Math.round(value * 100) / 100;
