import { copper, windingLength } from '../coils/wire';
import { phi } from '../coils/loss';
import { multilayerRange } from '../coils/multilayer';
import { rodFormula, rodMuSensitivity } from '../coils/rod';
import { FORMER_PERMITTIVITY, selfCapacitance } from '../coils/self-capacitance';
import { solenoid } from '../coils/solenoid';
import { spiralRange } from '../coils/spiral';
import type { Design } from '../design';
import { at } from '../numeric/cells';
import { defaultOverall } from '../schema/cross-coil';
import type { Coil, Wire } from '../schema/coil';
import { LIMITS } from '../schema/limits';
import type { Farad, Henry, Metre } from '../units';
import type { Winding } from '../coils/loss';
import { cutsOf } from './cuts';
import type { CoilFiller } from './filler';
import { bySensitivity } from './sensitivity';
import type { Values } from './values';

/** Q without measurement where no loss formula holds (ours): multilayer, solid wire. */
const MULTILAYER_Q = 40;
/** Self-capacitance without measurement (ours), farad. */
const SPIRAL_C: Farad = 5e-12;
const MULTILAYER_C: Farad = 20e-12;
/** Longer way of a twisted strand. */
const LITZ_LAY = 1.05;

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
function effectiveBare({ bare, overall, strands }: WireSize): Metre {
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

type Geometry = (x: Float64Array) => void;

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
function geometryOf(
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

export interface WoundFiller {
  fill: CoilFiller;
  wound: Wound;
  /** Indices of the geometry's values: while these stay, inductances stay. */
  geometry: number[];
}

/** A wound coil: sections between the taps in use from the formula of its kind, loss shared by turns. */
export function woundFiller(design: Design, values: Values, temperature: number): WoundFiller {
  const { coil, tuning } = design;
  if (coil.kind === 'measured') throw new TypeError('Not a wound coil.');
  const wire: WireSize = { bare: 0, overall: 0, strands: coil.wire.strands ?? 1 };
  const first = values.entries.length;
  const read = wireReader('coil.wire', coil.wire, values, wire);
  const [wound, geometry] = geometryOf(coil, values, wire, read);
  const geometryIndices = Array.from({ length: values.entries.length - first }, (_, i) => first + i);
  const q = coil.q === undefined ? null : values.add('coil.q', coil.q, LIMITS.q);
  const own = coil.cSelf === undefined ? null : values.add('coil.cSelf', coil.cSelf, LIMITS.selfCapacitance);
  const factor = coil.lFactor === undefined ? null : values.add('coil.lFactor', coil.lFactor, LIMITS.lFactor);
  const whole = wound.turns;
  const { ends, aerialNode, detectorNode } = cutsOf(design, whole);
  const n = ends.length;
  const base = new Float64Array(9);
  const kept = new Float64Array(geometryIndices.length + 2).fill(NaN);

  // A sum over loops takes up to a millisecond: too long for each of thousands of boxes.
  const summed = coil.kind === 'spiral' || coil.kind === 'multilayer';
  const nominal = Float64Array.from(values.entries, (entry) => entry.centre);
  const sums = (row: Float64Array, into: Float64Array): void => {
    geometry(row);
    sectionsInto(into, ends, whole, wound);
  };
  let quick: ((base: Float64Array, x: Float64Array) => void) | null = null;
  const quickInto = (into: Float64Array, x: Float64Array): void => {
    quick ??= bySensitivity(nominal, geometryIndices, sums);
    quick(into, x);
    geometry(x);
  };

  const fill: CoilFiller = (x, circuit, position) => {
    const turns = tuning.kind === 'slider' ? position : whole;
    let same = kept[0] === turns && kept[1] === at(x, temperature);
    for (let i = 0; i < geometryIndices.length; i += 1) {
      const now = at(x, geometryIndices[i] ?? 0);
      if (kept[i + 2] !== now) {
        kept[i + 2] = now;
        same = false;
      }
    }
    kept[0] = turns;
    kept[1] = at(x, temperature);
    circuit.sections = n;
    circuit.aerialNode = aerialNode;
    circuit.detectorNode = detectorNode;
    if (!same) {
      geometry(x);
      wound.turns = turns;
      if (circuit.drawing && summed) quickInto(base, x);
      else sectionsInto(base, ends, turns, wound);
      if (q === null)
        windingInto(
          circuit.winding,
          wire,
          wound.wireLength(),
          wound.lengthOverDiameter(),
          wound.pitch(),
          at(x, temperature),
        );
    }
    if (!(wire.overall >= wire.bare)) circuit.sound = false;
    const scale = factor === null ? 1 : at(x, factor);
    let total = 0;
    for (let i = 0; i < n; i += 1) {
      const from = i === 0 ? 0 : (ends[i - 1] ?? 0);
      circuit.share[i] = n === 1 ? 1 : ((ends[i] ?? 0) - from) / whole;
      for (let j = 0; j < n; j += 1) {
        const l = scale * at(base, i * 3 + j);
        circuit.m[i * 3 + j] = l;
        total += l;
      }
    }
    circuit.l = total;
    if (!(total > 0)) circuit.sound = false;
    circuit.loss = q === null ? 'model' : 'q';
    circuit.q = q === null ? (coil.kind === 'multilayer' ? MULTILAYER_Q : 0) : at(x, q);
    if (q === null && coil.kind === 'multilayer') circuit.loss = 'q';
    circuit.coreTan = wound.coreTan();
    circuit.cSelf = own === null ? wound.cSelf() : at(x, own);
  };
  return { fill, wound, geometry: geometryIndices };
}

/** Section inductances of a wound coil at any cuts, as rows, before its factor. */
export function sectionRows(wound: Wound, ends: readonly number[]): number[][] {
  const cells = new Float64Array(9);
  sectionsInto(cells, ends, wound.turns, wound);
  return ends.map((_, i) => ends.map((_end, j) => at(cells, i * 3 + j)));
}

/** Inductances of the sections from the inductances of ranges of turns: M12 = (L(12) - L1 - L2)/2 and so on. */
function sectionsInto(base: Float64Array, ends: readonly number[], turns: number, wound: Wound): void {
  const n = ends.length;
  if (n === 1) {
    base[0] = wound.inductance(0, turns);
    return;
  }
  const [a = 0, b = 0, c = 0] = ends;
  const l1 = wound.inductance(0, a);
  const l2 = wound.inductance(a, b);
  const l12 = wound.inductance(0, b);
  base[0] = l1;
  base[4] = l2;
  base[1] = (l12 - l1 - l2) / 2;
  base[3] = at(base, 1);
  if (n === 2) return;
  const l3 = wound.inductance(b, c);
  const l23 = wound.inductance(a, c);
  const l123 = wound.inductance(0, c);
  base[8] = l3;
  base[5] = (l23 - l2 - l3) / 2;
  base[7] = at(base, 5);
  base[2] = (l123 + l2 - l12 - l23) / 2;
  base[6] = at(base, 2);
}
