/** A paid order is late when it has not left after this many days. */
export const lateAfterDays = 2;

const dayKey = new Intl.DateTimeFormat('en-CA', { timeZone: 'Europe/London', dateStyle: 'short' });
const dayLabel = new Intl.DateTimeFormat('en-GB', { timeZone: 'Europe/London', weekday: 'short', day: 'numeric' });

/** The yard's calendar day of a moment, "2026-12-01". */
export const dayOf = (at: number): string => dayKey.format(at);
/** "Tue 1" */
export const labelOf = (at: number): string => dayLabel.format(at).replace(',', '');

/** The middle value, the lower of two middles; null of nothing. */
export function median(values: readonly number[]): number | null {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor((sorted.length - 1) / 2)] ?? null;
}

/** Sums amounts by the yard's day. */
export function byDay(rows: readonly { at: number; minor: number }[]): Map<string, number> {
  const days = new Map<string, number>();
  for (const { at, minor } of rows) days.set(dayOf(at), (days.get(dayOf(at)) ?? 0) + minor);
  return days;
}
