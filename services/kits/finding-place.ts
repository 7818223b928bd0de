import type { Place } from '../parts/schemas';

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
