/** Milliseconds since 1970 in UTC; the only form in which a moment is stored or handed on. */
export type Instant = number;

const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', timeZone: 'Europe/London' });
const dayYear = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'long',
  year: 'numeric',
  timeZone: 'Europe/London',
});
const clock = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', timeZone: 'Europe/London' });

/** "1 December" */
export const showDay = (at: Instant) => day.format(at);
/** "1 December 2026" */
export const showDate = (at: Instant) => dayYear.format(at);
/** "10:42" */
export const showClock = (at: Instant) => clock.format(at);
/** "1 December, 10:42" */
export const showMoment = (at: Instant) => `${day.format(at)}, ${clock.format(at)}`;

export const minutes = (count: number) => count * 60_000;
export const days = (count: number) => count * 86_400_000;
