import type { Instant } from '@/services/time';

const format = new Intl.DateTimeFormat('en-GB', {
  weekday: 'short',
  day: 'numeric',
  month: 'short',
  hour: '2-digit',
  minute: '2-digit',
  timeZone: 'Europe/London',
});

/** "Tue 1 Dec, 11:20" */
export function showShortMoment(at: Instant): string {
  const parts = Object.fromEntries(format.formatToParts(at).map(({ type, value }) => [type, value]));
  return `${parts['weekday']} ${parts['day']} ${parts['month']}, ${parts['hour']}:${parts['minute']}`;
}
