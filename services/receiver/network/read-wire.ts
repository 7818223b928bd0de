import { phi, type Winding } from '../coils/loss';
import { copper } from '../coils/wire';
import { at } from '../numeric/cells';
import { defaultOverall } from '../schema/cross-coil';
import type { Wire } from '../schema/coil';
import { LIMITS } from '../schema/limits';
import type { Metre } from '../units';
import type { Values } from './values';

/** Longer way of a twisted strand. */
const LITZ_LAY = 1.05;

export interface WireSize {
  bare: Metre;
  overall: Metre;
  strands: number;
}

export type WireReader = (x: Float64Array) => void;

/** Reads a wire into a record; without an overall diameter grade 1 stands in. */
export function wireReader(path: string, wire: Wire, values: Values, into: WireSize): WireReader {
  const bare = values.add(`${path}.bare`, wire.bare, LIMITS.wireBare);
  const overall = wire.overall === undefined ? null : values.add(`${path}.overall`, wire.overall, LIMITS.wireOverall);
  into.strands = wire.strands ?? 1;
  return (x) => {
    into.bare = at(x, bare);
    into.overall = overall === null ? defaultOverall(into.bare, into.strands) : at(x, overall);
  };
}

/** Litz counts as a wire of 0.95 of the bundle with even current. */
export function effectiveBare({ bare, overall, strands }: WireSize): Metre {
  return strands > 1 ? 0.95 * overall : bare;
}

/** Loss data of a winding, into the circuit's record. */
export function windingInto(
  into: Winding,
  wire: WireSize,
  length: Metre,
  lengthOverDiameter: number,
  pitch: Metre,
  temperature: number,
): void {
  const thick = wire.strands > 1 ? wire.overall : wire.bare;
  into.wire = length;
  into.bare = wire.bare;
  into.strands = wire.strands;
  into.bundle = wire.overall;
  into.phi = phi(lengthOverDiameter, pitch / thick);
  into.resistivity = copper(temperature);
  into.lay = wire.strands > 1 ? LITZ_LAY : 1;
}
