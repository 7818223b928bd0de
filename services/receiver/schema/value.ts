import { z } from 'zod';
import type { Limits } from './limits';

export const DISTRIBUTIONS = ['uniform', 'normal', 'binned', 'log-uniform'] as const;
export type Distribution = (typeof DISTRIBUTIONS)[number];

/** A plain number with its limits and the words that tell a person what to enter. */
export function quantity(min: number, max: number, words: string) {
  const message = `Give ${words}.`;
  return z.number({ error: message }).min(min, { error: message }).max(max, { error: message });
}

export function whole(min: number, max: number, words: string) {
  const message = `Give ${words}.`;
  return z.int({ error: message }).min(min, { error: message }).max(max, { error: message });
}

export interface Spread {
  nominal: number;
  tol: number;
  dist?: Distribution | undefined;
  bin?: number | undefined;
  lot?: { n: number; mean: number; s?: number | undefined } | undefined;
}

export type Value = number | Spread;

/** An exact number, or a number with its spread and perhaps the lot that was measured. */
export function value([min, max]: Limits, words: string) {
  const number = quantity(min, max, words);
  const spread = z
    .strictObject({
      nominal: number,
      tol: quantity(0, 100, 'a relative half width from 0 (0.05 means 5 %)'),
      dist: z.enum(DISTRIBUTIONS, { error: `Give one of ${DISTRIBUTIONS.join(', ')}.` }).optional(),
      bin: quantity(0, 1, 'the relative half width that was sorted out, from 0 to below tol').optional(),
      lot: z
        .strictObject({
          n: whole(1, 1000000, 'the number of parts measured'),
          mean: number,
          s: quantity(0, 1e30, 'the standard deviation of the lot, zero or more').optional(),
        })
        .optional(),
    })
    .superRefine((spread, context) => {
      const issue = (path: string[], message: string): void => context.addIssue({ code: 'custom', path, message });
      const { tol, dist = 'uniform', bin, lot } = spread;
      if (dist !== 'log-uniform' && tol >= 1) issue(['tol'], 'Give a relative half width below 1, or log-uniform.');
      if (dist === 'binned' && bin === undefined) issue(['bin'], 'Give the half width that was sorted out.');
      if (dist !== 'binned' && bin !== undefined) issue(['bin'], 'Only a binned value has this key: take it out.');
      if (dist === 'binned' && bin !== undefined && bin > tol) issue(['bin'], 'Give a half width no larger than tol.');
      if (lot !== undefined && lot.n >= 3 && !(lot.s !== undefined && lot.s > 0)) {
        issue(['lot', 's'], 'Give the standard deviation of the lot, above zero: three or more parts were measured.');
      }
    });
  return z.union([number, spread]);
}

/** The number that stands for a value wherever no spread is drawn: the lot's mean, the nominal or the number itself. */
export function centre(value: Value): number {
  return typeof value === 'number' ? value : (value.lot?.mean ?? value.nominal);
}
