import type { Design } from '../design';
import { InvalidInput } from '../invalid-input';
import { parseDesign } from '../parse';
import { centre } from '../schema/value';
import { designFrom, DIRECT, FIRST_CAPACITOR, type Choice, type Settled } from './ask';
import type { Field } from './windings';

/** The parts as the engine reads them, by their places in the lists. */
export interface ReadLists {
  /** A whole design of the first parts; the others are put in its place. */
  template: Design;
  tuning: Map<number, Design['tuning']>;
  detectors: Map<number, Design['detector']>;
  earphones: Map<number, Design['earphone']>;
  couplings: Map<number, number>;
  returnResistors: Map<number, Design['returnResistor']>;
}

/**
 * Reads every part once, in a design of its own. Null where there is nothing to combine.
 * @throws InvalidInput with the list and the code of a part that cannot be
 */
export function readLists(ask: Settled, field: Field): ReadLists | null {
  const [pair] = field.pairs;
  const [capacitor] = field.capacitors;
  const [detector] = field.detectors;
  const [phone] = field.phones;
  if (pair === undefined || capacitor === undefined || detector === undefined || phone === undefined) return null;
  const { former, wire, most } = pair;
  const read = (changes: {
    coupling?: number;
    capacitor?: number;
    detector?: number;
    phone?: typeof phone;
  }): Design => {
    const { earphone, back } = changes.phone ?? phone;
    const choice: Choice = [
      former,
      wire,
      most,
      changes.coupling ?? DIRECT,
      0,
      0,
      changes.capacitor ?? capacitor,
      changes.detector ?? detector,
      earphone,
      back,
    ];
    return parseDesign(designFrom(ask, choice));
  };
  const template = read({});
  const lists: ReadLists = {
    template,
    tuning: new Map(),
    detectors: new Map(),
    earphones: new Map(),
    couplings: new Map(),
    returnResistors: new Map([[-1, undefined]]),
  };
  for (const place of field.capacitors)
    lists.tuning.set(place, named(ask, 'capacitors', place, () => read({ capacitor: place })).tuning);
  for (const place of field.detectors)
    lists.detectors.set(place, named(ask, 'detectors', place, () => read({ detector: place })).detector);
  for (const place of field.couplings) {
    const { coupling } = named(ask, 'couplings', place, () => read({ coupling: FIRST_CAPACITOR + place }));
    if (coupling.kind === 'series-c') lists.couplings.set(place, centre(coupling.c));
  }
  for (const each of field.phones) {
    const design = named(ask, 'earphones', each.earphone, () => read({ phone: each }));
    lists.earphones.set(each.earphone, design.earphone);
    lists.returnResistors.set(each.back, design.returnResistor);
  }
  return lists;
}

/** Says which part of which list a design failed for. */
function named(
  { lists }: Settled,
  list: 'capacitors' | 'detectors' | 'couplings' | 'earphones',
  place: number,
  read: () => Design,
): Design {
  try {
    return read();
  } catch (error) {
    if (!(error instanceof InvalidInput)) throw error;
    const code = lists[list][place]?.code ?? String(place);
    throw new InvalidInput(error.issues.map(({ path, message }) => ({ path: `${list}.${code}.${path}`, message })));
  }
}
