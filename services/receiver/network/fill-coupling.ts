import { coaxialMutual } from '../coils/loops';
import { solenoid } from '../coils/solenoid';
import { windingLength } from '../coils/wire';
import type { Winding } from '../coils/loss';
import type { Design } from '../design';
import { at } from '../numeric/cells';
import type { Primary, Wire } from '../schema/coil';
import { defaultOverall } from '../schema/cross-coil';
import { LIMITS } from '../schema/limits';
import type { Value } from '../schema/value';
import { sameAsBefore, type CoilFiller } from './filler';
import type { Values } from './values';
import { windingInto, wireReader, type WireSize } from './read-wire';

interface WoundPrimary {
  turns: number;
  diameter: Value;
  gap: Value;
  wire: Wire;
  pitch: Value | undefined;
}

/** The winding of a primary given by its geometry; null for one that was measured. */
function windingOf({ turns, diameter, gap, wire, pitch }: Primary): WoundPrimary | null {
  if (turns === undefined || diameter === undefined || gap === undefined || wire === undefined) return null;
  return { turns, diameter, gap, wire, pitch };
}

/** A primary wound beyond the coil's earth end, or over it where the gap is minus its own length. */
function woundPrimary(design: Design, primary: WoundPrimary, values: Values, temperature: number): CoilFiller {
  const { coil, tuning } = design;
  if (coil.kind !== 'solenoid') throw new TypeError('A wound primary needs a solenoid.');
  const wire: WireSize = { bare: 0, overall: 0, strands: primary.wire.strands ?? 1 };
  const read = wireReader('coupling.wire', primary.wire, values, wire);
  const diameter = values.add('coupling.diameter', primary.diameter, LIMITS.diameter);
  const gap = values.add('coupling.gap', primary.gap, LIMITS.gap);
  const given = primary.pitch === undefined ? null : values.add('coupling.pitch', primary.pitch, LIMITS.pitch);
  // The coil's own wire and pitch again, for the loop sum: the same entries by their paths.
  const indexOf = (path: string): number | null => {
    const index = values.entries.findIndex((entry) => entry.path === path);
    return index < 0 ? null : index;
  };
  const former = indexOf('coil.formerDiameter') ?? 0;
  const coilPitch = indexOf('coil.pitch');
  const coilWire: WireSize = { bare: 0, overall: 0, strands: coil.wire.strands ?? 1 };
  const coilBare = indexOf('coil.wire.bare') ?? 0;
  const coilOverall = indexOf('coil.wire.overall');
  const winding: Winding = { wire: 0, bare: 0, strands: 1, bundle: 0, phi: 1, resistivity: 0, lay: 1 };
  const unchanged = sameAsBefore(9);
  let mutual = 0;
  let own = 0;
  return (x, circuit, position) => {
    read(x);
    coilWire.bare = at(x, coilBare);
    coilWire.overall = coilOverall === null ? wireOverall(coilWire) : at(x, coilOverall);
    const pitch = given === null ? 1.03 * wire.overall : at(x, given);
    const turns1 = tuning.kind === 'slider' ? Math.max(1, Math.round(position)) : coil.turns;
    const diameter1 = at(x, former) + coilWire.overall;
    const pitch1 = coilPitch === null ? 1.03 * coilWire.overall : at(x, coilPitch);
    const start2 = -(at(x, gap) + primary.turns * pitch);
    if (
      !unchanged(turns1, diameter1, pitch1, at(x, diameter), pitch, start2, wire.bare, wire.overall, at(x, temperature))
    ) {
      const wireBare = wire.strands > 1 ? 0.95 * wire.overall : wire.bare;
      own = solenoid({
        turns: primary.turns,
        diameter: at(x, diameter),
        pitch,
        wireBare,
        highFrequency: wire.strands <= 1,
      });
      mutual = coaxialMutual({
        turns1,
        diameter1,
        pitch1,
        start1: 0,
        turns2: primary.turns,
        diameter2: at(x, diameter),
        pitch2: pitch,
        start2,
      });
      const length = windingLength(primary.turns, at(x, diameter), pitch);
      windingInto(winding, wire, length, (primary.turns * pitch) / at(x, diameter), pitch, at(x, temperature));
    }
    circuit.primary = true;
    circuit.primaryL = own;
    circuit.primaryR = 0;
    circuit.primaryWinding = winding;
    circuit.primaryK = Math.abs(mutual) / Math.sqrt(own * circuit.l);
    if (!(circuit.primaryK <= 0.98)) circuit.sound = false;
  };
}

function wireOverall(wire: WireSize): number {
  return defaultOverall(wire.bare, wire.strands);
}

/** How the aerial meets the coil. Runs after the coil: a wound primary's k is of the coil at its position. */
export function couplingFiller(design: Design, values: Values, temperature: number): CoilFiller {
  const { coupling } = design;
  if (coupling.kind === 'series-c') {
    const c = values.add('coupling.c', coupling.c, LIMITS.tuned);
    return (x, circuit) => {
      circuit.couplingC = at(x, c);
    };
  }
  if (coupling.kind !== 'primary') return () => undefined;
  const wound = windingOf(coupling);
  if (wound !== null) return woundPrimary(design, wound, values, temperature);
  const l = values.add('coupling.l', coupling.l ?? NaN, LIMITS.inductance);
  const r = values.add('coupling.r', coupling.r ?? NaN, LIMITS.primaryR);
  const k = values.add('coupling.k', coupling.k ?? NaN, LIMITS.k);
  return (x, circuit) => {
    circuit.primary = true;
    circuit.primaryL = at(x, l);
    circuit.primaryR = at(x, r);
    circuit.primaryK = at(x, k);
  };
}
