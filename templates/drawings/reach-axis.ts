/** Edges in hertz. */
export type Span = { lo: number; hi: number };

/** A station of the rail; its frequency in hertz. */
export type Station = { name: string; f: number };

/** Share of tried boxes, 0 to 1, that reach each frequency in hertz. */
export type Contour = { f: readonly number[]; share: readonly number[] };

export type ReachView = {
  band: Span;
  /** Null where the set tunes nothing. */
  nominal: Span | null;
  /** Null before the corners are worked out. */
  worst: Span | null;
  contour?: Contour | null;
  stations?: readonly Station[];
};

export type Axis = Span & { ticks: readonly number[]; fewTicks: readonly number[] };

const KILO = 1000;
const khz = (...values: number[]) => values.map((value) => value * KILO);

/** The same ends for every kit of a waveband, so that rails in a list can be compared by eye. */
const MEDIUM: Axis = {
  lo: 480 * KILO,
  hi: 1800 * KILO,
  ticks: khz(500, 600, 700, 800, 1000, 1200, 1400, 1600),
  fewTicks: khz(500, 700, 1000, 1600),
};
const LONG: Axis = {
  lo: 120 * KILO,
  hi: 330 * KILO,
  ticks: khz(125, 150, 175, 200, 225, 250, 300),
  fewTicks: khz(150, 200, 250, 300),
};

export function axisFor(band: Span): Axis {
  for (const axis of [LONG, MEDIUM]) {
    if (band.lo >= axis.lo && band.hi <= axis.hi) return axis;
  }
  // Short wave and own edges: a fifth of the band's own width (in octaves) is left at each end.
  const margin = Math.max(1.001, (band.hi / band.lo) ** 0.2);
  const lo = band.lo / margin;
  const hi = band.hi * margin;
  const ticks = evenTicks({ lo, hi });
  return { lo, hi, ticks, fewTicks: ticks.filter((_, index) => index % 2 === 0) };
}

/** Where a frequency lies on the rail, 0 at the left end and 1 at the right; held inside. */
export function place(axis: Span, f: number): number {
  const along = Math.log(f / axis.lo) / Math.log(axis.hi / axis.lo);
  return MARGIN + (1 - 2 * MARGIN) * Math.min(1, Math.max(0, along));
}

/** Left free at each end, as a share of the width. */
export const MARGIN = 0.012;

/** The frequency at a place of the rail: the inverse of `place`. */
export function frequencyAt(axis: Span, at: number): number {
  const along = Math.min(1, Math.max(0, (at - MARGIN) / (1 - 2 * MARGIN)));
  return axis.lo * (axis.hi / axis.lo) ** along;
}

export type PinFit = 'worst' | 'nominal' | 'outside';

/** Full pin inside the worst case, half inside the nominal reach only, hollow outside. */
export function pinFit(view: ReachView, f: number): PinFit {
  if (view.worst && holds(view.worst, f)) return 'worst';
  if (view.nominal && holds(view.nominal, f)) return 'nominal';
  return 'outside';
}

/** What is missing at each end at worst case (at nominal, while there is no worst case), in hertz; 0 where the band is covered. */
export function shortfall(view: ReachView): { low: number; high: number } {
  const reach = view.worst ?? view.nominal;
  if (!reach || reach.hi <= reach.lo) return { low: 0, high: 0 };
  const { band } = view;
  const width = band.hi - band.lo;
  return {
    low: Math.min(width, Math.max(0, reach.lo - band.lo)),
    high: Math.min(width, Math.max(0, band.hi - reach.hi)),
  };
}

/** Frequencies are printed in whole kilohertz, never grouped; below 10 kHz of difference in a narrow band one decimal helps nobody. */
export function shownKHz(hertz: number): string {
  return String(Math.round(hertz / KILO));
}

/** The edge of a band as the plan of bands gives it: 526.5, 1602. A reach is rounded, what is asked is not. */
export function shownEdge(hertz: number): string {
  return String(Math.round(hertz / 100) / 10);
}

/** A difference in kilohertz; one that rounds to nothing is still said. */
export function shownDifference(hertz: number): string {
  const whole = Math.round(hertz / KILO);
  return whole === 0 && hertz > 0 ? 'under 1' : String(whole);
}

const holds = (span: Span, f: number) => f >= span.lo && f <= span.hi;

function evenTicks({ lo, hi }: Span): number[] {
  const wanted = 7;
  const rough = (hi - lo) / wanted;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = ([1, 2, 2.5, 5, 10].find((factor) => factor * power >= rough) ?? 10) * power;
  const first = Math.ceil(lo / step);
  const last = Math.floor(hi / step);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => (first + index) * step);
}
