import { showQuantity } from '../quantity';
import type { Circuit, FrozenLine, VersionContent } from './schemas';

/** One thing that is not the same in two versions: what, and how it was and is; null where it was not there. */
export interface Difference {
  what: string;
  from: string | null;
  to: string | null;
}

/** What differs between two versions, lines by their reference and never by their position. */
export function differences(before: VersionContent, after: VersionContent): Difference[] {
  return [
    ...lineDifferences(before.lines, after.lines),
    ...circuitDifferences(before.circuit, after.circuit),
    ...guideDifferences(before, after),
  ];
}

function lineDifferences(before: readonly FrozenLine[], after: readonly FrozenLine[]): Difference[] {
  const references = [...new Set([...before, ...after].map((line) => line.reference))].sort();
  return references.flatMap((reference) => {
    const from = before.find((line) => line.reference === reference);
    const to = after.find((line) => line.reference === reference);
    const what = `line ${reference}`;
    if (!from || !to) return [{ what, from: from ? lineWords(from) : null, to: to ? lineWords(to) : null }];
    if (lineWords(from) !== lineWords(to)) return [{ what, from: lineWords(from), to: lineWords(to) }];
    if (JSON.stringify(from.part) !== JSON.stringify(to.part)) {
      return [{ what: `values of ${reference}`, from: 'as they were', to: 'as the part has them now' }];
    }
    return [];
  });
}

export function lineWords({ part, quantity }: Pick<FrozenLine, 'part' | 'quantity'>): string {
  if (!part) return 'no part';
  return `${part.name}, ${quantityWords(quantity, part.unit)}`;
}

/** "14.2 m", "35 g", "2": a line's quantity as people say it. */
export function quantityWords(quantity: number, unit: 'each' | 'metre' | 'gram'): string {
  if (unit === 'metre') return `${quantity / 1000} m`;
  if (unit === 'gram') return `${quantity / 1000} g`;
  return String(quantity);
}

const couplings: Record<Circuit['coupling'], string> = {
  direct: 'direct',
  'series-c': 'through a capacitor',
  'aerial-tap': 'aerial tap',
};

function circuitDifferences(before: Circuit, after: Circuit): Difference[] {
  const words = (circuit: Circuit): Record<string, string> => ({
    turns: String(circuit.winding.turns),
    pitch: circuit.winding.pitch === null ? 'close' : showQuantity(circuit.winding.pitch, 'mm'),
    'aerial tap': circuit.winding.aerialTap === null ? 'none' : `turn ${circuit.winding.aerialTap}`,
    'detector tap': circuit.winding.detectorTap === null ? 'none' : `turn ${circuit.winding.detectorTap}`,
    'winding tolerance': `±${showQuantity(circuit.winding.tolerance, '%')}`,
    coupling: couplings[circuit.coupling],
    detector: circuit.detectorAt === 'top' ? 'at the top' : 'at the tap',
    'aerial, riser': showQuantity(circuit.aerial.vertical, 'm'),
    'aerial, level part': showQuantity(circuit.aerial.horizontal, 'm'),
    earth: circuit.earth.kind === 'none' ? 'none' : showQuantity(circuit.earth.r.nominal, 'Ω'),
    stray: showQuantity(circuit.stray.nominal, 'pF'),
  });
  const [from, to] = [words(before), words(after)];
  return Object.keys(to).flatMap((what) =>
    from[what] === to[what] ? [] : [{ what, from: from[what] ?? null, to: to[what] ?? null }],
  );
}

function guideDifferences({ guide: before }: VersionContent, { guide: after }: VersionContent): Difference[] {
  const found: Difference[] = [];
  if (before.steps.length !== after.steps.length) {
    found.push({ what: 'steps of the guide', from: String(before.steps.length), to: String(after.steps.length) });
  } else if (JSON.stringify(before.steps) !== JSON.stringify(after.steps)) {
    found.push({ what: 'words of the guide', from: 'as they were', to: 'written anew' });
  }
  if (before.cautions.length !== after.cautions.length) {
    found.push({ what: 'cautions', from: String(before.cautions.length), to: String(after.cautions.length) });
  }
  return found;
}
