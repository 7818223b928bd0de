import { invalidRequest } from '../errors';
import type { World } from '../world';
import { newestFirst, pageOf } from './lists';

type Json = string | number | boolean | null | Json[] | { [key: string]: Json };

/** The answer as it goes over the wire, with each id named in `expand[]` replaced by what it stands for. */
export function expanded(world: World, answer: object, paths: readonly string[]): object {
  const tree = asJson(answer);
  for (const path of paths) follow(world, tree, path.split('.'), path);
  return typeof tree === 'object' && tree !== null ? tree : {};
}

function follow(world: World, tree: Json, [head, ...rest]: string[], path: string): void {
  if (head === undefined || tree === null) return;
  if (Array.isArray(tree)) {
    for (const one of tree) follow(world, one, [head, ...rest], path);
    return;
  }
  if (typeof tree !== 'object') throw notExpandable(path);
  const included = includedOnRequest(world, tree, head);
  if (included) tree[head] = asJson(included);
  const value = tree[head];
  if (value === undefined) throw notExpandable(path);
  if (typeof value === 'string') {
    const found = world.store.find(value);
    if (!found) throw notExpandable(path);
    tree[head] = asJson(found);
  }
  const next = tree[head];
  if (next !== undefined) follow(world, next, rest, path);
}

/** Lists the provider leaves out unless asked. */
function includedOnRequest(world: World, tree: { [key: string]: Json }, head: string): object | undefined {
  const id = String(tree['id']);
  const { sessions, refunds } = world.store.shelves;
  if (tree['object'] === 'checkout.session' && head === 'line_items') {
    return pageOf(sessions.get(id)?.lines ?? [], {}, `/v1/checkout/sessions/${id}/line_items`);
  }
  if (tree['object'] === 'charge' && head === 'refunds') {
    const own = newestFirst(refunds).filter((refund) => refund.charge === id);
    return pageOf(own, {}, `/v1/charges/${id}/refunds`);
  }
  return undefined;
}

function notExpandable(path: string) {
  return invalidRequest(`This property cannot be expanded (${path}).`, { param: 'expand' });
}

function asJson(value: object): Json {
  return JSON.parse(JSON.stringify(value));
}
