import type { Design } from '../design';
import { at } from '../numeric/cells';
import { LIMITS } from '../schema/limits';
import { positiveDefinite } from '../schema/cross-coil';
import { cutsOf } from './cuts';
import type { CoilFiller } from './filler';
import type { Values } from './values';

/** A measured coil: sections between the taps in use are joined, their shares of the loss added. */
export function measuredFiller(design: Design, values: Values): CoilFiller {
  const { coil, tuning } = design;
  if (coil.kind !== 'measured') throw new TypeError('Not a measured coil.');
  const variable = tuning.kind === 'inductance';
  const size = coil.sections?.length ?? 1;
  const index = (i: number, j: number): number => (cells[Math.min(i, j)] ?? [])[Math.max(i, j)] ?? -1;
  const cells: number[][] = [];
  coil.sections?.forEach((row, i) => {
    cells.push(
      row.map((value, j) =>
        j < i ? -1 : values.add(`coil.sections.${i}.${j}`, value, i === j ? LIMITS.inductance : LIMITS.mutual),
      ),
    );
  });
  const single = coil.l === undefined ? null : values.add('coil.l', coil.l, LIMITS.inductance);
  const q = coil.q === undefined ? null : values.add('coil.q', coil.q, LIMITS.q);
  const r = coil.r === undefined ? null : values.add('coil.r', coil.r, LIMITS.seriesR);
  const own = coil.cSelf === undefined ? null : values.add('coil.cSelf', coil.cSelf, LIMITS.selfCapacitance);
  const factor = coil.lFactor === undefined ? null : values.add('coil.lFactor', coil.lFactor, LIMITS.lFactor);
  const { ends, aerialNode, detectorNode } = cutsOf(design, size);
  const entry = new Float64Array(9);

  return (x, circuit, position) => {
    circuit.sections = ends.length;
    circuit.aerialNode = aerialNode;
    circuit.detectorNode = detectorNode;
    const scale = factor === null ? 1 : at(x, factor);
    for (let i = 0; i < size; i += 1) {
      for (let j = 0; j < size; j += 1) {
        entry[i * 3 + j] = scale * (variable ? position : single === null ? at(x, index(i, j)) : at(x, single));
      }
    }
    if (size > 1 && !positiveDefinite(size, (i, j) => at(entry, i * 3 + j))) circuit.sound = false;
    let total = 0;
    let selves = 0;
    for (let i = 0; i < size; i += 1) selves += at(entry, i * 3 + i);
    for (let a = 0; a < ends.length; a += 1) {
      const fromA = a === 0 ? 0 : (ends[a - 1] ?? 0);
      let ownSum = 0;
      for (let i = fromA; i < (ends[a] ?? 0); i += 1) ownSum += at(entry, i * 3 + i);
      circuit.share[a] = ownSum / selves;
      for (let b = 0; b < ends.length; b += 1) {
        let sum = 0;
        for (let i = fromA; i < (ends[a] ?? 0); i += 1) {
          for (let j = b === 0 ? 0 : (ends[b - 1] ?? 0); j < (ends[b] ?? 0); j += 1) sum += at(entry, i * 3 + j);
        }
        circuit.m[a * 3 + b] = sum;
        total += sum;
      }
    }
    circuit.l = total;
    if (!(total > 0)) circuit.sound = false;
    circuit.loss = q === null ? 'r' : 'q';
    circuit.q = q === null ? 0 : at(x, q);
    circuit.r = r === null ? 0 : at(x, r);
    circuit.cSelf = own === null ? 0 : at(x, own);
  };
}
