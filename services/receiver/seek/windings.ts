import { centre } from '../schema/value';
import {
  AERIAL_TAP,
  DIRECT,
  FIRST_CAPACITOR,
  overallOf,
  PITCH,
  readChoice,
  type Choice,
  type Settled,
  type StockPart,
} from './ask';

/** A former with a wire, and the turns that it takes. */
export interface Pair {
  former: number;
  wire: number;
  least: number;
  most: number;
}

/** Aerial and detector on the coil. */
export interface Placement {
  coupling: number;
  aerialTap: number;
  detectorTap: number;
}

/** An earphone with the resistor that it needs, if any. */
export interface Phone {
  earphone: number;
  back: number;
}

/** Everything that is combined, as places in the lists; what may not be used is left out from the start. */
export interface Field {
  pairs: Pair[];
  capacitors: number[];
  couplings: number[];
  detectors: number[];
  phones: Phone[];
}

/** Winding length over diameter within which the coil formula holds. */
const SHORTEST = 0.02;
const LONGEST = 20;
const MOST_TURNS = 1000;

export function fieldOf(ask: Settled): Field {
  const { lists } = ask;
  const usable = <T>(list: readonly StockPart<T>[]): number[] =>
    list.flatMap(({ stock }, place) => (ask.inStoreOnly === true && stock < 1 ? [] : [place]));
  const capacitors = usable(lists.capacitors);
  const detectors = usable(lists.detectors);
  const backs = usable(lists.returns);
  const phones = usable(lists.earphones).flatMap((earphone): Phone[] =>
    lists.earphones[earphone]?.values.kind === 'ceramic'
      ? backs.map((back) => ({ earphone, back }))
      : [{ earphone, back: -1 }],
  );
  const first = [capacitors[0], detectors[0], phones[0]] as const;
  const pairs: Pair[] = [];
  for (const former of usable(lists.formers)) {
    if (ask.former !== undefined && lists.formers[former]?.code !== ask.former) continue;
    for (const wire of lists.wires.keys()) {
      const pair = pairOf(ask, former, wire);
      const [capacitor, detector, phone] = first;
      if (pair === null || capacitor === undefined || detector === undefined || phone === undefined) continue;
      const { earphone, back } = phone;
      const trial: Choice = [former, wire, pair.most, DIRECT, 0, 0, capacitor, detector, earphone, back];
      if (readChoice(ask, trial) !== null) pairs.push(pair);
    }
  }
  return { pairs, capacitors, couplings: usable(lists.couplings), detectors, phones };
}

/** Turns that a former takes of a wire, with the margin at its ends. */
function pairOf(ask: Settled, former: number, wire: number): Pair | null {
  const tube = ask.lists.formers[former]?.values;
  const copper = ask.lists.wires[wire]?.values;
  if (tube === undefined || copper === undefined) return null;
  const overall = overallOf(copper);
  const pitch = PITCH * overall;
  const diameter = centre(tube.diameter) + overall;
  const fits = Math.floor((tube.length - 2 * ask.rules.formerMargin) / pitch + 1e-9);
  const least = Math.max(1, ask.turns?.least ?? 1, Math.ceil((SHORTEST * diameter) / pitch));
  const most = Math.min(MOST_TURNS, ask.turns?.most ?? MOST_TURNS, fits, Math.floor((LONGEST * diameter) / pitch));
  return most >= least ? { former, wire, least, most } : null;
}

function tapsOf(turns: number, places: number): number[] {
  const stride = Math.max(1, Math.floor(turns / places));
  const taps: number[] = [];
  for (let tap = stride; tap < turns; tap += stride) taps.push(tap);
  return taps;
}

/** Every way to put aerial and detector on a coil of so many turns. */
export function placementsOf(ask: Settled, { couplings }: Field, turns: number): Placement[] {
  const taps = tapsOf(turns, ask.tapPlaces);
  const aerials: [coupling: number, tap: number][] = [];
  if (ask.couplings.includes('direct')) aerials.push([DIRECT, 0]);
  if (ask.couplings.includes('aerial-tap')) for (const tap of taps) aerials.push([AERIAL_TAP, tap]);
  if (ask.couplings.includes('series-c')) for (const place of couplings) aerials.push([FIRST_CAPACITOR + place, 0]);
  const at = ask.detectorAt ?? ['top'];
  const detectors = [...(at.includes('top') ? [0] : []), ...(at.includes('tap') ? taps : [])];
  return aerials.flatMap(([coupling, aerialTap]) =>
    detectors.map((detectorTap) => ({ coupling, aerialTap, detectorTap })),
  );
}

/** Combinations of one winding, and of all. */
export function combinationsOf(field: Field, placements: number): number {
  return placements * field.capacitors.length * field.detectors.length * field.phones.length;
}

export function totalOf(ask: Settled, field: Field): { windings: number; combinations: number } {
  let windings = 0;
  let combinations = 0;
  const known = new Map<number, number>();
  for (const { least, most } of field.pairs) {
    for (let turns = least; turns <= most; turns += 1) {
      const count = known.get(turns) ?? placementsOf(ask, field, turns).length;
      known.set(turns, count);
      combinations += combinationsOf(field, count);
      windings += 1;
    }
  }
  return { windings, combinations };
}

/** Every combination there is, without any bound: for small lists, and to compare with. */
export function* everyChoice(ask: Settled, field: Field): Generator<Choice> {
  for (const { former, wire, least, most } of field.pairs) {
    for (let turns = least; turns <= most; turns += 1) {
      for (const { coupling, aerialTap, detectorTap } of placementsOf(ask, field, turns)) {
        for (const capacitor of field.capacitors) {
          for (const detector of field.detectors) {
            for (const { earphone, back } of field.phones)
              yield [former, wire, turns, coupling, aerialTap, detectorTap, capacitor, detector, earphone, back];
          }
        }
      }
    }
  }
}
