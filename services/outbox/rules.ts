import { minutes } from '../time';

/** Minutes until the next try after each failed one: quick at first, then an hour, a last one the day after. */
const waits = [1, 2, 4, 8, 16, 32, 60, 24 * 60] as const;

/** How long a job waits after its nth failure, or null when nobody tries again by itself. */
export function waitBeforeRetry(failures: number): number | null {
  const wait = waits[failures - 1];
  return wait === undefined ? null : minutes(wait);
}

/** How long a worker may hold a job; one that died in the middle leaves it to the next after this. */
export const claimFor = minutes(5);
