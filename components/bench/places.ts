import type { Circuit } from '@/services/kits/schemas';
import type { Place } from '@/services/parts/schemas';

/** How the lines of a version are grouped on the bench, and what a group may not lack. */
export interface PlaceGroup {
  title: string;
  places: readonly Place[];
}

export const placeGroups: readonly PlaceGroup[] = [
  { title: 'Tuning', places: ['tuning coil', 'tuning capacitor'] },
  { title: 'Coupling', places: ['coupling capacitor'] },
  { title: 'Detector', places: ['detector', 'return resistor', 'bypass capacitor'] },
  { title: 'Earphone', places: ['earphone', 'transformer'] },
  { title: 'Aerial and earth', places: ['aerial', 'earth'] },
  { title: 'Hardware', places: ['hardware', 'tool'] },
  { title: 'Print and packaging', places: ['print', 'packaging'] },
];

/** References begin with the letter of their place, as on the board. */
export const referenceLetters: Record<Place, string> = {
  'tuning coil': 'L',
  'tuning capacitor': 'C',
  'coupling capacitor': 'C',
  detector: 'D',
  earphone: 'E',
  transformer: 'T',
  'return resistor': 'R',
  'bypass capacitor': 'C',
  aerial: 'W',
  earth: 'G',
  hardware: 'H',
  tool: 'X',
  print: 'P',
  packaging: 'B',
};

/** The next free reference of a letter: L1, L2. */
export function nextReference(letter: string, taken: readonly string[]): string {
  for (let number = 1; ; number++) {
    const reference = `${letter}${number}`;
    if (!taken.includes(reference)) return reference;
  }
}

/** Places that have to be filled for a verdict. The coil needs its former and its wire. */
export function emptyPlaces(
  lines: readonly { place: Place; part: { values: { kind: string } } | null }[],
  circuit: Circuit,
): { place: Place; words: string }[] {
  const has = (place: Place, ...kinds: string[]) =>
    lines.some(
      (line) =>
        line.place === place && line.part !== null && (kinds.length === 0 || kinds.includes(line.part.values.kind)),
    );
  const empty: { place: Place; words: string }[] = [];
  if (!has('tuning coil', 'coil-former')) empty.push({ place: 'tuning coil', words: 'No coil former chosen' });
  if (!has('tuning coil', 'wire')) empty.push({ place: 'tuning coil', words: 'No wire for the coil chosen' });
  if (!has('tuning capacitor')) empty.push({ place: 'tuning capacitor', words: 'No tuning capacitor chosen' });
  if (circuit.coupling === 'series-c' && !has('coupling capacitor')) {
    empty.push({ place: 'coupling capacitor', words: 'No coupling capacitor chosen' });
  }
  if (!has('detector')) empty.push({ place: 'detector', words: 'No detector chosen' });
  if (!has('earphone')) empty.push({ place: 'earphone', words: 'No earphone chosen' });
  if (!has('aerial')) empty.push({ place: 'aerial', words: 'No aerial wire chosen' });
  return empty;
}
