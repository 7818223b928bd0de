import {
  pinFit,
  shortfall,
  shownDifference,
  shownEdge,
  shownKHz,
  type PinFit,
  type ReachView,
  type Span,
} from './reach-axis';

/** The whole rail as one text for readers: band, nominal, worst case, and what is missing. */
export function reachSentence(view: ReachView): string {
  const band = `Band ${shownEdge(view.band.lo)} to ${shownEdge(view.band.hi)} kHz.`;
  if (!view.nominal) return `${band} No reach: this set tunes nothing.`;
  if (!view.worst) return `${band} Nominal ${range(view.nominal)} kHz. Worst case is not worked out yet.`;
  return `${band} Nominal ${range(view.nominal)}, worst case ${range(view.worst)}. ${shortWords(view)}`;
}

/** What is missing at worst case, or that nothing is. */
export function shortWords(view: ReachView): string {
  if (!view.nominal) return 'Tunes nothing.';
  const { low, high } = shortfall(view);
  const at = view.worst ? 'at worst case' : 'at nominal';
  const ends = [
    low > 0 && `${shownDifference(low)} kHz at the low end`,
    high > 0 && `${shownDifference(high)} kHz at the high end`,
  ].filter((end) => end !== false);
  return ends.length > 0 ? `Short by ${ends.join(' and ')}, ${at}.` : `Covers the band ${at}.`;
}

export const pinWords: Record<PinFit, string> = {
  worst: 'inside, even at worst case',
  nominal: 'inside at nominal only',
  outside: 'out of reach',
};

/** One station in words: "Sluice, 747 kHz, inside, even at worst case". */
export function stationWords(view: ReachView, station: { name: string; f: number }): string {
  return `${station.name}, ${shownKHz(station.f)} kHz, ${pinWords[pinFit(view, station.f)]}`;
}

const range = (span: Span) => `${shownKHz(span.lo)} to ${shownKHz(span.hi)}`;
