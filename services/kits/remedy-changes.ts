import type { PartValues, Place } from '../parts/schemas';
import type { Circuit, FrozenLine, VersionContent } from './schemas';

/** One change that a remedy asks for, by its path in the design file (`lines.L1.quantity` for the version's own). */
export interface DesignChange {
  path: string;
  from: unknown;
  to: unknown;
}

/** Another part for a place: the value it has to have, in farad or ohm. */
export interface PartWanted {
  place: Extract<Place, 'coupling capacitor' | 'return resistor' | 'bypass capacitor'>;
  value: number;
}

/** What a remedy does to a version: its settings, quantities of its lines, and parts to be chosen. */
export interface VersionChange {
  circuit: Circuit;
  quantities: ReadonlyMap<string, number>;
  wanted: readonly PartWanted[];
}

/** The remedy's changes as changes of the version; null where one of them is left to a person. */
export function versionChange(
  content: Pick<VersionContent, 'circuit'>,
  changes: readonly DesignChange[],
): VersionChange | null {
  if (changes.length === 0) return null;
  let made: VersionChange = { circuit: content.circuit, quantities: new Map(), wanted: [] };
  for (const change of changes) {
    const next = oneChange(made, change);
    if (!next) return null;
    made = next;
  }
  return made;
}

const wantedAt: Record<string, PartWanted['place']> = {
  'coupling.c': 'coupling capacitor',
  returnResistor: 'return resistor',
  bypass: 'bypass capacitor',
};

function oneChange(made: VersionChange, { path, to }: DesignChange): VersionChange | null {
  const { circuit } = made;
  const { winding, aerial } = circuit;
  const wind = (change: Partial<Circuit['winding']>) => ({
    ...made,
    circuit: { ...circuit, winding: { ...winding, ...change } },
  });
  const number = numberOf(to);
  const whole = number !== null && Number.isInteger(number) ? number : null;

  const reference = /^lines\.([A-Z0-9]+)\.quantity$/.exec(path)?.[1];
  if (reference !== undefined && whole !== null) {
    return { ...made, quantities: new Map(made.quantities).set(reference, whole) };
  }
  const place = wantedAt[path.replace(/\.nominal$/, '')];
  if (place !== undefined && number !== null) return { ...made, wanted: [...made.wanted, { place, value: number }] };
  switch (path) {
    case 'coil.turns':
      return whole === null ? null : wind({ turns: whole });
    case 'coil.pitch':
      return number === null ? null : wind({ pitch: number });
    case 'coil.taps.aerial':
      return whole === null ? null : wind({ aerialTap: whole });
    case 'coil.taps.detector':
      return whole === null ? null : wind({ detectorTap: whole });
    case 'coil.taps':
      return wind({
        aerialTap: numberOf(memberOf(to, 'aerial')) ?? winding.aerialTap,
        detectorTap: numberOf(memberOf(to, 'detector')) ?? winding.detectorTap,
      });
    case 'detectorAt':
      return to === 'top' || to === 'tap' ? { ...made, circuit: { ...circuit, detectorAt: to } } : null;
    case 'coupling': {
      const value = numberOf(memberOf(to, 'c'));
      if (memberOf(to, 'kind') !== 'series-c' || value === null) return null;
      return {
        ...made,
        circuit: { ...circuit, coupling: 'series-c' },
        wanted: [...made.wanted, { place: 'coupling capacitor', value }],
      };
    }
    case 'aerial.vertical':
      return number === null ? null : { ...made, circuit: { ...circuit, aerial: { ...aerial, vertical: number } } };
    case 'aerial.horizontal':
      return number === null ? null : { ...made, circuit: { ...circuit, aerial: { ...aerial, horizontal: number } } };
    default:
      return null;
  }
}

const memberOf = (value: unknown, key: string): unknown =>
  typeof value === 'object' && value !== null ? Object.entries(value).find(([name]) => name === key)?.[1] : undefined;

/** A value of the design file as its number: the number itself, or the nominal of its spread. */
function numberOf(value: unknown): number | null {
  const plain = typeof value === 'object' ? memberOf(value, 'nominal') : value;
  return typeof plain === 'number' ? plain : null;
}

/** The content with a remedy's changes, for judging it: a wanted part stands there with its value. */
export function withChange(content: VersionContent, { circuit, quantities, wanted }: VersionChange): VersionContent {
  let lines: FrozenLine[] = content.lines.map((line) => ({
    ...line,
    quantity: quantities.get(line.reference) ?? line.quantity,
  }));
  for (const { place, value } of wanted) {
    const present = lines.find((line) => line.place === place);
    const values = valuesOf(place, value, present?.part?.values);
    const part = { code: '', name: '', unit: 'each' as const, massMilligrams: 0, ...present?.part, values };
    const line = { reference: '', quantity: 1, note: '', ...present, place, part };
    lines = present ? lines.map((one) => (one === present ? line : one)) : [...lines, line];
  }
  return { ...content, circuit, lines };
}

function valuesOf(place: PartWanted['place'], nominal: number, present: PartValues | undefined): PartValues {
  const estimate = { nominal, origin: 'estimate' as const };
  if (place === 'return resistor') {
    return { kind: 'resistor', r: present?.kind === 'resistor' ? { ...present.r, nominal } : estimate };
  }
  return { kind: 'fixed-capacitor', c: present?.kind === 'fixed-capacitor' ? { ...present.c, nominal } : estimate };
}

/** How far a sold part's value may lie from the one wanted, as a ratio: half a step of the E12 series. */
const NEAR = 1.1;

/** The part of a list that comes nearest to what is wanted; null when none is near. */
export function nearestPart<P extends { values: PartValues }>(wanted: PartWanted, parts: readonly P[]): P | null {
  const ratio = ({ values }: P) => {
    const value =
      values.kind === 'resistor' ? values.r.nominal : values.kind === 'fixed-capacitor' ? values.c.nominal : null;
    return value === null ? Infinity : Math.max(value / wanted.value, wanted.value / value);
  };
  const [best] = [...parts].sort((a, b) => ratio(a) - ratio(b));
  return best && ratio(best) <= NEAR ? best : null;
}
