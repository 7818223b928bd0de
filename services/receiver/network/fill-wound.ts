import type { Design } from '../design';
import { at } from '../numeric/cells';
import { LIMITS } from '../schema/limits';
import { cutsOf } from './cuts';
import type { CoilFiller } from './filler';
import { windingInto, wireReader, type WireSize } from './read-wire';
import { bySensitivity } from './sensitivity';
import type { Values } from './values';
import { geometryOf, type Wound } from './wound-geometry';

/** Q without measurement where no loss formula holds (ours): multilayer, solid wire. */
const MULTILAYER_Q = 40;

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
