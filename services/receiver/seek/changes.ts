import { keyed } from '../schema/reading';
import type { Change } from '../verdict';

type Json = Change['to'];

/** A JSON value of any depth, undefined as null. */
function json(value: unknown): Json {
  if (value === null || value === undefined) return null;
  if (typeof value === 'number' || typeof value === 'string' || typeof value === 'boolean') return value;
  if (Array.isArray(value)) return value.map(json);
  return Object.fromEntries(
    Object.entries(keyed(value))
      .filter(([, item]) => item !== undefined)
      .map(([key, item]) => [key, json(item)]),
  );
}

/** What stands at a dotted path of a design as it was given; undefined where nothing does. */
export function readAt(input: unknown, path: string): unknown {
  return path.split('.').reduce<unknown>((at, key) => (Array.isArray(at) ? at[Number(key)] : keyed(at)[key]), input);
}

/** A change of the whole thing at a path. */
export function changeTo(input: unknown, path: string, to: unknown): Change {
  return { path, from: json(readAt(input, path)), to: json(to) };
}

/**
 * A change of a physical value: its number, or the nominal of its spread. Where a lot was measured another part takes its
 * place, with the assumed spread.
 */
export function changeValue(input: unknown, path: string, to: number): Change {
  const present = readAt(input, path);
  const spread = keyed(present);
  if (typeof spread['nominal'] !== 'number') return changeTo(input, path, to);
  if (spread['lot'] === undefined) return changeTo(input, `${path}.nominal`, to);
  const kept = Object.entries(spread).filter(([key]) => key !== 'lot');
  return changeTo(input, path, { ...Object.fromEntries(kept), nominal: to });
}

function put(at: unknown, keys: readonly string[], to: Json): unknown {
  const [key, ...rest] = keys;
  if (key === undefined) return to;
  if (Array.isArray(at)) return at.map((item: unknown, index) => (index === Number(key) ? put(item, rest, to) : item));
  const object = keyed(at);
  return { ...object, [key]: put(object[key], rest, to) };
}

/** A copy of a design with changes made, in their order. */
export function applyChanges(input: unknown, changes: readonly Change[]): unknown {
  return changes.reduce<unknown>((at, { path, to }) => put(at, path.split('.'), to), input);
}

/** A number to three figures, upward or downward, so that a change does not fall short by rounding. */
export function threeFigures(value: number, direction: 'up' | 'down'): number {
  if (value === 0) return 0;
  const rounded = Number(value.toPrecision(3));
  if (direction === 'up' ? rounded >= value * (1 - 1e-12) : rounded <= value * (1 + 1e-12)) return rounded;
  const [, power = '0'] = rounded.toExponential(2).split('e');
  const unit = Number(`1e${Number(power) - 2}`);
  return Number((rounded + (direction === 'up' ? unit : -unit)).toPrecision(3));
}
