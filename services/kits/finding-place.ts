import type { Place } from '../parts/schemas';
import type { Circuit, VersionContent } from './schemas';

/** What a person would change for a finding: a line of the version, a setting of the circuit, or the guide. */
export type FindingField =
  | { kind: 'line'; reference: string }
  | { kind: 'place'; place: Place }
  | { kind: 'circuit'; setting: string }
  | { kind: 'guide' }
  | { kind: 'whole' };

/** Paths of the design file that settings of the circuit stand behind. */
const settings: readonly [prefix: string, setting: string][] = [
  ['coil.turns', 'turns'],
  ['coil.pitch', 'pitch'],
  ['coil.taps.aerial', 'aerialTap'],
  ['coil.taps.detector', 'detectorTap'],
  ['coil.taps', 'aerialTap'],
  ['coil.lFactor', 'tolerance'],
  ['aerial.vertical', 'vertical'],
  ['aerial.horizontal', 'horizontal'],
  ['aerial.siteFactor', 'siteFactor'],
  ['earth', 'earth'],
  ['stray', 'stray'],
  ['detectorAt', 'detectorAt'],
  ['place', 'field'],
];
const places: readonly [prefix: string, place: Place][] = [
  ['coil', 'tuning coil'],
  ['tuning', 'tuning capacitor'],
  ['coupling.c', 'coupling capacitor'],
  ['coupling', 'coupling capacitor'],
  ['detector', 'detector'],
  ['earphone', 'earphone'],
  ['transformer', 'transformer'],
  ['returnResistor', 'return resistor'],
  ['bypass', 'bypass capacitor'],
  ['aerial', 'aerial'],
];

const under = (path: string, prefix: string) => path === prefix || path.startsWith(`${prefix}.`);

export function fieldOf(path: string): FindingField {
  if (path === 'guide') return { kind: 'guide' };
  const line = /^lines\.([A-Z0-9]+)/.exec(path)?.[1];
  if (line !== undefined) return { kind: 'line', reference: line };
  const setting = settings.find(([prefix]) => under(path, prefix));
  if (setting) return { kind: 'circuit', setting: setting[1] };
  const place = places.find(([prefix]) => under(path, prefix));
  if (place) return { kind: 'place', place: place[1] };
  return { kind: 'whole' };
}

export interface DesignChange {
  path: string;
  from: unknown;
  to: unknown;
}

/**
 * The version with a remedy's changes, as far as they are settings or quantities. Null where one of them asks for
 * another part: then a person has to choose it.
 */
export function settingsFrom(
  content: Pick<VersionContent, 'circuit' | 'lines'>,
  changes: readonly DesignChange[],
): { circuit: Circuit; quantities: Map<string, number> } | null {
  if (changes.length === 0) return null;
  const { winding, aerial } = content.circuit;
  let circuit: Circuit = content.circuit;
  const quantities = new Map<string, number>();
  for (const { path, to } of changes) {
    const whole = typeof to === 'number' && Number.isInteger(to) ? to : null;
    const reference = /^lines\.([A-Z0-9]+)\.quantity$/.exec(path)?.[1];
    if (reference !== undefined && whole !== null) quantities.set(reference, whole);
    else if (path === 'coil.turns' && whole !== null)
      circuit = { ...circuit, winding: { ...circuit.winding, turns: whole } };
    else if (path === 'coil.taps.aerial' && whole !== null && winding.aerialTap !== null) {
      circuit = { ...circuit, winding: { ...circuit.winding, aerialTap: whole } };
    } else if (path === 'coil.taps.detector' && whole !== null && winding.detectorTap !== null) {
      circuit = { ...circuit, winding: { ...circuit.winding, detectorTap: whole } };
    } else if (path === 'coil.pitch' && typeof to === 'number') {
      circuit = { ...circuit, winding: { ...circuit.winding, pitch: to } };
    } else if ((path === 'aerial.vertical' || path === 'aerial.horizontal') && typeof to === 'number') {
      const key = path === 'aerial.vertical' ? 'vertical' : 'horizontal';
      circuit = { ...circuit, aerial: { ...aerial, [key]: to } };
    } else return null;
  }
  return { circuit, quantities };
}
