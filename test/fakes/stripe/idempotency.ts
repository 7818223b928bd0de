import { keyInUse, keyOfAnotherRequest, invalidRequest } from './errors';
import { fingerprint, type FormTree } from './api/form';
import type { World } from './world';

export interface Answer {
  status: number;
  body: object;
}

/** A key with what was asked under it; without an answer the request is still being worked on. */
export interface Remembered {
  path: string;
  parameters: string;
  requestId: string;
  /** UTC ms. */
  at: number;
  answer: Answer | null;
}

const KEPT_MS = 24 * 60 * 60 * 1000;
const LONGEST_KEY = 255;

interface Call {
  key: string;
  path: string;
  tree: FormTree;
  requestId: string;
}

/** The first answer under this key if there is one; else the key is in use until `remember` or `forget`. */
export function claim(world: World, { key, path, tree, requestId }: Call): Remembered | undefined {
  const { remembered } = world.store.shelves;
  dropOld(world);
  if (key.length > LONGEST_KEY) throw invalidRequest(`Idempotency keys can be up to ${LONGEST_KEY} characters long.`);
  const known = remembered.get(key);
  if (known) {
    if (known.path !== path) throw keyOfAnotherRequest(key, 'endpoint');
    if (known.parameters !== fingerprint(tree)) throw keyOfAnotherRequest(key, 'parameters');
    if (!known.answer) throw keyInUse(key);
    return known;
  }
  remembered.set(key, { path, parameters: fingerprint(tree), requestId, at: world.clock.now(), answer: null });
  return undefined;
}

export function remember(world: World, key: string, answer: Answer): void {
  const known = world.store.shelves.remembered.get(key);
  if (known) known.answer = answer;
}

/** For a request that never began: wrong parameters, an outage, a rate limit. */
export function forget(world: World, key: string): void {
  world.store.shelves.remembered.delete(key);
}

/** The shelf is in the order of first use, so the old ones stand in front. */
function dropOld(world: World): void {
  for (const [key, { at }] of world.store.shelves.remembered) {
    if (at > world.clock.now() - KEPT_MS) return;
    world.store.shelves.remembered.delete(key);
  }
}
