import type Stripe from 'stripe';
import { invalidRequest, noSuch } from '../errors';

export interface PageInput {
  limit?: number | undefined;
  starting_after?: string | undefined;
  ending_before?: string | undefined;
}

const USUAL_PAGE = 10;

/** One page of a list that is in the order it shall be shown. */
export function pageOf<T extends { id: string }>(all: T[], input: PageInput, url: string): Stripe.ApiList<T> {
  if (input.starting_after !== undefined && input.ending_before !== undefined) {
    throw invalidRequest('You may only specify one of these parameters: ending_before, starting_after.');
  }
  const limit = input.limit ?? USUAL_PAGE;
  if (input.ending_before !== undefined) {
    const before = all.slice(0, indexOf(all, input.ending_before, 'ending_before'));
    return { object: 'list', data: before.slice(-limit), has_more: before.length > limit, url };
  }
  const after =
    input.starting_after === undefined ? all : all.slice(indexOf(all, input.starting_after, 'starting_after') + 1);
  return { object: 'list', data: after.slice(0, limit), has_more: after.length > limit, url };
}

export function newestFirst<T>(shelf: Map<string, T>): T[] {
  return [...shelf.values()].reverse();
}

type Range = { gt?: number | undefined; gte?: number | undefined; lt?: number | undefined; lte?: number | undefined };

export function inRange(created: number, range: number | Range | undefined): boolean {
  if (range === undefined) return true;
  if (typeof range === 'number') return created === range;
  const { gt = -Infinity, gte = -Infinity, lt = Infinity, lte = Infinity } = range;
  return created > gt && created >= gte && created < lt && created <= lte;
}

function indexOf(all: { id: string }[], id: string, param: string): number {
  const index = all.findIndex((one) => one.id === id);
  if (index < 0) throw noSuch('object', id, param);
  return index;
}
