import { effectiveHeight, radiationResistance, wireCapacitance } from '../aerial/wire';
import type { Plan } from '../network/plan';
import { coilResistanceAt } from '../network/solve';
import { at } from '../numeric/cells';
import { tan } from '../numeric/trig';
import { LIGHT_SPEED, TWO_PI, type Hertz, type Ohm } from '../units';
import { BLOCK, type Sampler } from './draws';

/** Counts the covered boxes among the first `count` of a block. */
export type Counter = (count: number) => number;

/** Values that the closed form reads; a design with a spread anywhere else takes the general way. */
const READ = [
  'aerial.r',
  'aerial.l',
  'aerial.c',
  'aerial.siteFactor',
  'aerial.effectiveHeight',
  'earth.r',
  'coupling.c',
  'coil.l',
  'coil.q',
  'coil.r',
  'coil.lFactor',
  'coil.cSelf',
  'stray',
  'detector.cj',
  'tuning.min',
  'tuning.max',
] as const;
type Read = (typeof READ)[number];

const AERIAL: readonly string[] = ['aerial.r', 'aerial.l', 'aerial.c', 'aerial.siteFactor', 'earth.r', 'coupling.c'];

/**
 * Coverage of a set with one node (aerial, coil and detector all at the top) in closed form, column by column: the same
 * operations in the same order as the solver, so the same boxes cover, several times as fast. Null where the design has
 * more nodes or a spread in what shapes its coil.
 * @see receiver.md C1, `direct`
 */
export function oneNodeCounter(plan: Plan, sampler: Sampler, indices: readonly number[]): Counter | null {
  const { circuit, design, mode, values } = plan;
  if (mode !== 'capacitor' || design.tuning.kind !== 'capacitor' || circuit.sections > 1 || circuit.primary)
    return null;
  if (design.padder !== undefined || design.trimmer !== undefined) return null;
  if (design.coil.kind === 'measured' && design.coil.l === undefined) return null;
  const paths = indices.map((index) => values.entries[index]?.path ?? '');
  if (paths.some((path) => !READ.some((read) => read === path))) return null;

  const columnOf = (path: Read, constant: number): Float64Array =>
    sampler.columns[paths.indexOf(path)] ?? new Float64Array(BLOCK).fill(constant);
  plan.fill(plan.nominal);
  const nominal = (path: Read): number => values.entries.find((entry) => entry.path === path)?.centre ?? 1;
  const wire = design.aerial.kind === 'wire';
  const bare =
    circuit.wire && design.aerial.kind === 'wire'
      ? wireCapacitance(circuit.vertical, circuit.horizontal, at(plan.nominal, indexOf(plan, 'aerial.radius')))
      : 0;
  const base = design.coil.kind === 'measured' ? null : (plan.wound?.inductance(0, plan.wound.turns) ?? null);
  const columns: Columns = {
    aerialR: columnOf('aerial.r', circuit.aerialR),
    aerialL: columnOf('aerial.l', circuit.aerialL),
    aerialC: wire ? columnOf('aerial.siteFactor', nominal('aerial.siteFactor')) : columnOf('aerial.c', circuit.aerialC),
    earthR: columnOf('earth.r', circuit.earthR),
    couplingC: columnOf('coupling.c', circuit.couplingC),
    l: base === null ? columnOf('coil.l', nominal('coil.l')) : new Float64Array(BLOCK).fill(base),
    factor: columnOf('coil.lFactor', nominal('coil.lFactor')),
    loss: circuit.loss === 'r' ? columnOf('coil.r', circuit.r) : columnOf('coil.q', circuit.q),
    cSelf: columnOf('coil.cSelf', circuit.cSelf),
    stray: columnOf('stray', circuit.stray),
    cj: columnOf('detector.cj', circuit.cj),
    cMin: columnOf('tuning.min', circuit.cMin),
    cMax: columnOf('tuning.max', circuit.cMax),
  };
  const form: Form = { plan, columns, bare, aerialFixed: paths.every((path) => !AERIAL.includes(path)) };
  const low = endOf(form, design.band.lo);
  const high = endOf(form, design.band.hi);
  const { possible } = sampler;
  return (count) => {
    low.needed(count);
    high.needed(count);
    return coveredIn(count, low.needs, high.needs, columns, possible);
  };
}

function indexOf(plan: Plan, path: string): number {
  return plan.values.entries.findIndex((entry) => entry.path === path);
}

interface Columns {
  aerialR: Float64Array;
  aerialL: Float64Array;
  /** Capacitance of the aerial; a wire's site factor. */
  aerialC: Float64Array;
  earthR: Float64Array;
  couplingC: Float64Array;
  l: Float64Array;
  factor: Float64Array;
  /** Q or series resistance. */
  loss: Float64Array;
  cSelf: Float64Array;
  stray: Float64Array;
  cj: Float64Array;
  cMin: Float64Array;
  cMax: Float64Array;
}

interface Form {
  plan: Plan;
  columns: Columns;
  /** Capacitance of a wire aerial before its site factor. */
  bare: number;
  aerialFixed: boolean;
}

interface End {
  needs: Float64Array;
  needed: (count: number) => void;
}

/** Capacitance needed at one edge of the band, for each box of the block. */
function endOf({ plan, columns, bare, aerialFixed }: Form, f: Hertz): End {
  const { circuit } = plan;
  const w = TWO_PI * f;
  const needs = new Float64Array(BLOCK);
  const aerial = new Float64Array(BLOCK);
  const length = circuit.vertical + circuit.horizontal;
  const wire: WireTerms | null = circuit.wire
    ? {
        bare,
        length,
        tangent: tan((w * length) / LIGHT_SPEED),
        radiation: radiationResistance(effectiveHeight(circuit.vertical, circuit.horizontal, f), f),
      }
    : null;
  const { earthC } = circuit;
  const coupled = circuit.couplingC > 0;
  const fillAerial = (count: number): void =>
    wire === null
      ? circuitAerial(count, w, columns, earthC, coupled, aerial)
      : wireAerial(count, w, columns, earthC, coupled, aerial, wire);
  if (aerialFixed) fillAerial(BLOCK);
  const byQ = circuit.loss === 'q';
  // The loss model's resistance follows from the geometry, which has no spread here; its core part follows L.
  const modelled = circuit.loss === 'model';
  return {
    needs,
    needed(count) {
      if (!aerialFixed) fillAerial(count);
      if (modelled) modelledCoil(plan, count, f, columns, aerial, needs);
      else knownCoil(count, w, byQ, columns, aerial, needs);
    },
  };
}

interface WireTerms {
  bare: number;
  length: number;
  tangent: number;
  radiation: Ohm;
}

function circuitAerial(
  count: number,
  w: number,
  columns: Columns,
  earthC: number,
  coupled: boolean,
  into: Float64Array,
): void {
  const { aerialR, aerialL, aerialC, earthR, couplingC } = columns;
  const earth = earthC > 0 ? 1 / (w * earthC) : 0;
  for (let i = 0; i < count; i += 1) {
    const r = at(aerialR, i) + at(earthR, i);
    let x = w * at(aerialL, i) - 1 / (w * at(aerialC, i));
    if (earthC > 0) x -= earth;
    if (coupled) x -= 1 / (w * at(couplingC, i));
    into[i] = -x / (r * r + x * x + 1e-18);
  }
}

function wireAerial(
  count: number,
  w: number,
  columns: Columns,
  earthC: number,
  coupled: boolean,
  into: Float64Array,
  { bare, length, tangent, radiation }: WireTerms,
): void {
  const { aerialR, aerialC, earthR, couplingC } = columns;
  const earth = earthC > 0 ? 1 / (w * earthC) : 0;
  for (let i = 0; i < count; i += 1) {
    const r = at(aerialR, i) + at(earthR, i) + radiation;
    let x = -length / (LIGHT_SPEED * (at(aerialC, i) * bare) * tangent);
    if (earthC > 0) x -= earth;
    if (coupled) x -= 1 / (w * at(couplingC, i));
    into[i] = -x / (r * r + x * x + 1e-18);
  }
}

function knownCoil(
  count: number,
  w: number,
  byQ: boolean,
  columns: Columns,
  aerial: Float64Array,
  into: Float64Array,
): void {
  const { l, factor, loss, cSelf, stray, cj } = columns;
  for (let i = 0; i < count; i += 1) {
    const x = w * (at(factor, i) * at(l, i));
    const r = byQ ? x / at(loss, i) : at(loss, i);
    const im = at(aerial, i) - x / (r * r + x * x) + w * (at(cSelf, i) + at(stray, i) + at(cj, i));
    into[i] = -im / w;
  }
}

function modelledCoil(
  { circuit }: Plan,
  count: number,
  f: Hertz,
  columns: Columns,
  aerial: Float64Array,
  into: Float64Array,
): void {
  const { l, factor, cSelf, stray, cj } = columns;
  const w = TWO_PI * f;
  for (let i = 0; i < count; i += 1) {
    circuit.l = at(factor, i) * at(l, i);
    const r = coilResistanceAt(circuit, f);
    const x = w * circuit.l;
    const im = at(aerial, i) - x / (r * r + x * x) + w * (at(cSelf, i) + at(stray, i) + at(cj, i));
    into[i] = -im / w;
  }
}

function coveredIn(
  count: number,
  low: Float64Array,
  high: Float64Array,
  { cMin, cMax, l, factor }: Columns,
  possible: Uint8Array,
): number {
  let covered = 0;
  for (let i = 0; i < count; i += 1) {
    const least = at(cMin, i);
    const most = at(cMax, i);
    const sound = possible[i] === 1 && least < most && at(factor, i) * at(l, i) > 0;
    if (sound && at(low, i) <= most && at(high, i) >= least) covered += 1;
  }
  return covered;
}
