import { multilayerRange } from '../coils/multilayer';
import { rodFormula, rodMuSensitivity } from '../coils/rod';
import { FORMER_PERMITTIVITY, selfCapacitance } from '../coils/self-capacitance';
import { solenoid } from '../coils/solenoid';
import { spiralRange } from '../coils/spiral';
import { windingLength } from '../coils/wire';
import { at } from '../numeric/cells';
import type { Coil } from '../schema/coil';
import { LIMITS } from '../schema/limits';
import type { Farad, Henry, Metre } from '../units';
import { effectiveBare, type WireReader, type WireSize } from './read-wire';
import type { Values } from './values';

/** Self-capacitance without measurement (ours), farad. */
const SPIRAL_C: Farad = 5e-12;
const MULTILAYER_C: Farad = 20e-12;

/** A wound coil's geometry as the formulas read it; one record, filled again for each draw. */
export interface Wound {
  turns: number;
  wire: WireSize;
  inductance(from: number, to: number): Henry;
  cSelf(): Farad;
  /** Length of wire, and l/D and p/d for the loss model. */
  wireLength(): Metre;
  lengthOverDiameter(): number;
  pitch(): Metre;
  /** Axial length of the winding; null for a flat spiral. */
  length(): Metre | null;
  coreTan(): number;
}

export type Geometry = (x: Float64Array) => void;

function solenoidGeometry(
  coil: Extract<Coil, { kind: 'solenoid' }>,
  values: Values,
  wire: WireSize,
  read: WireReader,
): [Wound, Geometry] {
  const former = values.add('coil.formerDiameter', coil.formerDiameter, LIMITS.diameter);
  const given = coil.pitch === undefined ? null : values.add('coil.pitch', coil.pitch, LIMITS.pitch);
  const inside = FORMER_PERMITTIVITY[coil.former ?? 'thin'];
  const shape = { turns: coil.turns, diameter: 0, pitch: 0, wireBare: 0, highFrequency: wire.strands <= 1 };
  const wound: Wound = {
    turns: coil.turns,
    wire,
    inductance(from, to) {
      shape.turns = to - from;
      return solenoid(shape);
    },
    cSelf: () => selfCapacitance(wound.turns * shape.pitch, shape.diameter, inside),
    wireLength: () => windingLength(wound.turns, shape.diameter, shape.pitch),
    lengthOverDiameter: () => (wound.turns * shape.pitch) / shape.diameter,
    pitch: () => shape.pitch,
    length: () => wound.turns * shape.pitch,
    coreTan: () => 0,
  };
  const geometry: Geometry = (x) => {
    read(x);
    shape.diameter = at(x, former) + wire.overall;
    shape.pitch = given === null ? 1.03 * wire.overall : at(x, given);
    shape.wireBare = effectiveBare(wire);
  };
  return [wound, geometry];
}

function spiralGeometry(
  coil: Extract<Coil, { kind: 'spiral' }>,
  values: Values,
  wire: WireSize,
  read: WireReader,
): [Wound, Geometry] {
  const inner = values.add('coil.innerDiameter', coil.innerDiameter, LIMITS.diameter);
  const pitch = values.add('coil.pitch', coil.pitch, LIMITS.spiralPitch);
  const offset = coil.offset === undefined ? null : values.add('coil.offset', coil.offset, LIMITS.faceOffset);
  const shape = {
    turns: coil.turns,
    innerDiameter: 0,
    pitch: 0,
    wireBare: 0,
    offset: 0,
    highFrequency: wire.strands <= 1,
  };
  const wound: Wound = {
    turns: coil.turns,
    wire,
    inductance: (from, to) => spiralRange(shape, from, to),
    cSelf: () => SPIRAL_C,
    wireLength: () => windingLength(coil.turns, shape.innerDiameter + coil.turns * shape.pitch, 0),
    lengthOverDiameter: () => 1,
    pitch: () => shape.pitch,
    length: () => null,
    coreTan: () => 0,
  };
  const geometry: Geometry = (x) => {
    read(x);
    shape.innerDiameter = at(x, inner);
    shape.pitch = at(x, pitch);
    shape.offset = offset === null ? 0 : at(x, offset);
    shape.wireBare = effectiveBare(wire);
  };
  return [wound, geometry];
}

function multilayerGeometry(
  coil: Extract<Coil, { kind: 'multilayer' }>,
  values: Values,
  wire: WireSize,
  read: WireReader,
): [Wound, Geometry] {
  const inner = values.add('coil.innerDiameter', coil.innerDiameter, LIMITS.diameter);
  const length = values.add('coil.length', coil.length, LIMITS.windingLength);
  const layerPitch = values.add('coil.layerPitch', coil.layerPitch, LIMITS.layerPitch);
  const { layers, turnsPerLayer } = coil;
  const shape = {
    innerDiameter: 0,
    length: 0,
    layers,
    turnsPerLayer,
    layerPitch: 0,
    wireBare: 0,
    highFrequency: wire.strands <= 1,
  };
  const wound: Wound = {
    turns: layers * turnsPerLayer,
    wire,
    inductance: (from, to) => multilayerRange(shape, from, to),
    cSelf: () => MULTILAYER_C,
    wireLength: () =>
      windingLength(
        layers * turnsPerLayer,
        shape.innerDiameter + layers * shape.layerPitch,
        shape.length / turnsPerLayer,
      ),
    lengthOverDiameter: () => 1,
    pitch: () => shape.length / turnsPerLayer,
    length: () => shape.length,
    coreTan: () => 0,
  };
  const geometry: Geometry = (x) => {
    read(x);
    shape.innerDiameter = at(x, inner);
    shape.length = at(x, length);
    shape.layerPitch = at(x, layerPitch);
    shape.wireBare = effectiveBare(wire);
  };
  return [wound, geometry];
}

function rodGeometry(
  coil: Extract<Coil, { kind: 'rod' }>,
  values: Values,
  wire: WireSize,
  read: WireReader,
): [Wound, Geometry] {
  const rodLength = values.add('coil.rodLength', coil.rodLength, LIMITS.rodLength);
  const rodDiameter = values.add('coil.rodDiameter', coil.rodDiameter, LIMITS.rodDiameter);
  const mu = values.add('coil.muInitial', coil.muInitial, LIMITS.muInitial);
  const al = coil.al === undefined ? null : values.add('coil.al', coil.al, LIMITS.al);
  const coilLength = values.add('coil.coilLength', coil.coilLength, LIMITS.coilLength);
  const offset = coil.offset === undefined ? null : values.add('coil.offset', coil.offset, LIMITS.rodOffset);
  const tanM = coil.tanM === undefined ? null : values.add('coil.tanM', coil.tanM, LIMITS.lossTangent);
  const { turns } = coil;
  const shape = { rodLength: 0, rodDiameter: 0, muInitial: 0, turns, coilLength: 0, offset: 0 };
  const part = { ...shape };
  let scale = 1;
  let core = 0;
  const wound: Wound = {
    turns,
    wire,
    inductance(from, to) {
      Object.assign(part, shape);
      part.turns = to - from;
      part.coilLength = (shape.coilLength * (to - from)) / turns;
      part.offset = shape.offset + shape.coilLength * ((from + to) / (2 * turns) - 0.5);
      return scale * rodFormula(part);
    },
    cSelf: () => selfCapacitance(shape.coilLength, shape.rodDiameter + wire.overall, FORMER_PERMITTIVITY.thin),
    wireLength: () => windingLength(turns, shape.rodDiameter + wire.overall, shape.coilLength / turns),
    lengthOverDiameter: () => shape.coilLength / (shape.rodDiameter + wire.overall),
    pitch: () => shape.coilLength / turns,
    length: () => shape.coilLength,
    coreTan: () => core,
  };
  const geometry: Geometry = (x) => {
    read(x);
    shape.rodLength = at(x, rodLength);
    shape.rodDiameter = at(x, rodDiameter);
    shape.muInitial = at(x, mu);
    shape.coilLength = at(x, coilLength);
    shape.offset = offset === null ? 0 : at(x, offset);
    scale = al === null ? 1 : (at(x, al) * turns * turns) / rodFormula(shape);
    core = tanM === null ? 0 : at(x, tanM) * rodMuSensitivity(shape);
  };
  return [wound, geometry];
}

/** Geometry reader of a wound coil, by its kind. */
export function geometryOf(
  coil: Exclude<Coil, { kind: 'measured' }>,
  values: Values,
  wire: WireSize,
  read: WireReader,
): [Wound, Geometry] {
  switch (coil.kind) {
    case 'solenoid':
      return solenoidGeometry(coil, values, wire, read);
    case 'spiral':
      return spiralGeometry(coil, values, wire, read);
    case 'multilayer':
      return multilayerGeometry(coil, values, wire, read);
    case 'rod':
      return rodGeometry(coil, values, wire, read);
  }
}
