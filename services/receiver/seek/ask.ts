import { windingLength } from '../coils/wire';
import type { Design, DesignInput } from '../design';
import { InvalidInput, within } from '../invalid-input';
import { defaultOverall } from '../schema/cross-coil';
import { parseDesign } from '../parse';
import { rules as defaultRules, type Rules } from '../rules';
import { centre, type Value } from '../schema/value';
import type { Metre } from '../units';

/** A part that may be taken, with what it costs (minor units of one currency) and how many are in store. */
export interface StockPart<Values> {
  code: string;
  cost: number;
  stock: number;
  values: Values;
}

export interface FormerValues {
  diameter: Value;
  length: Metre;
  wall: 'air' | 'thin' | 'solid' | 'damp';
}

type GangInput = Extract<DesignInput['tuning'], { kind: 'capacitor' | 'foil' }>;

/** What seek may choose from. Cost and stock of a wire are a metre and in metres. */
export interface StockLists {
  formers: readonly StockPart<FormerValues>[];
  wires: readonly StockPart<{ bare: Value; overall?: Value; strands?: number }>[];
  capacitors: readonly StockPart<GangInput>[];
  couplings: readonly StockPart<Value>[];
  detectors: readonly StockPart<DesignInput['detector']>[];
  earphones: readonly StockPart<DesignInput['earphone']>[];
  /** Return resistors, for ceramic phones. */
  returns: readonly StockPart<Value>[];
}

export type Rank = 'cost' | 'margin' | 'stock';

export interface SeekAsk {
  band: DesignInput['band'];
  aerial: DesignInput['aerial'];
  earth?: DesignInput['earth'];
  stray?: DesignInput['stray'];
  place?: DesignInput['place'];
  temperature?: number;
  /** Spread of a wound inductance; 1 with no spread where it is left out. */
  lFactor?: Value;
  lists: StockLists;
  couplings: readonly ('direct' | 'series-c' | 'aerial-tap')[];
  /** Only the top where it is left out. */
  detectorAt?: readonly ('top' | 'tap')[];
  /** Places of a tap along the winding that are tried; 24 where it is left out. */
  tapPlaces?: number;
  /** Fewest and most turns that are tried; else what the former takes. */
  turns?: { least: number; most: number };
  inStoreOnly?: boolean;
  mostCost?: number;
  /** Code of the one former to use. */
  former?: string;
  rank: Rank;
  /** How many designs to find; 20 where it is left out. */
  most?: number;
  /** Windings listed of the same parts; 1 where it is left out. */
  windingsEach?: number;
  seed?: number;
  boxes?: number;
  rules?: Rules;
}

/**
 * One combination, as places in the lists: turns, taps (0 for none) and coupling kind beside them. A tuple of numbers,
 * so that it has an order and is written to a cursor as it is.
 */
export type Choice = readonly [
  former: number,
  wire: number,
  turns: number,
  /** 0 direct, 1 aerial tap, 2 and up the coupling capacitors of the list. */
  coupling: number,
  aerialTap: number,
  detectorTap: number,
  capacitor: number,
  detector: number,
  earphone: number,
  /** Place of the return resistor; -1 for none. */
  back: number,
];

export const DIRECT = 0;
export const AERIAL_TAP = 1;
export const FIRST_CAPACITOR = 2;

/** The ask with everything that may be left out. */
export interface Settled extends SeekAsk {
  most: number;
  windingsEach: number;
  tapPlaces: number;
  seed: number;
  boxes: number;
  rules: Rules;
}

export function settled(ask: SeekAsk): Settled {
  const { most = 20, windingsEach = 1, tapPlaces = 24, seed = 1, boxes = 2000, rules = defaultRules } = ask;
  within('most', most, 1, 1000);
  within('windingsEach', windingsEach, 1, 1000);
  within('tapPlaces', tapPlaces, 1, 1000);
  return { ...ask, most, windingsEach, tapPlaces, seed, boxes, rules };
}

function part<T>(list: readonly StockPart<T>[], place: number): StockPart<T> {
  const found = list[place];
  if (found === undefined) throw new RangeError(`The list has no part ${place}.`);
  return found;
}

/** The design file of a combination. */
export function designFrom(ask: SeekAsk, choice: Choice): DesignInput {
  const [former, wire, turns, coupling, aerialTap, detectorTap, capacitor, detector, earphone, back] = choice;
  const { lists } = ask;
  const tube = part(lists.formers, former).values;
  const taps = {
    ...(aerialTap > 0 && { aerial: aerialTap }),
    ...(detectorTap > 0 && { detector: detectorTap }),
  };
  return {
    format: 'coilyard-design/1',
    band: ask.band,
    aerial: ask.aerial,
    ...(ask.earth !== undefined && { earth: ask.earth }),
    coupling:
      coupling === DIRECT
        ? { kind: 'direct' }
        : coupling === AERIAL_TAP
          ? { kind: 'aerial-tap' }
          : { kind: 'series-c', c: part(lists.couplings, coupling - FIRST_CAPACITOR).values },
    detectorAt: detectorTap > 0 ? 'tap' : 'top',
    coil: {
      kind: 'solenoid',
      turns,
      formerDiameter: tube.diameter,
      formerLength: tube.length,
      former: tube.wall,
      wire: part(lists.wires, wire).values,
      ...(Object.keys(taps).length > 0 && { taps }),
      ...(ask.lFactor !== undefined && { lFactor: ask.lFactor }),
    },
    tuning: part(lists.capacitors, capacitor).values,
    ...(ask.stray !== undefined && { stray: ask.stray }),
    detector: part(lists.detectors, detector).values,
    earphone: part(lists.earphones, earphone).values,
    ...(back >= 0 && { returnResistor: part(lists.returns, back).values }),
    ...(ask.place !== undefined && { place: ask.place }),
    ...(ask.temperature !== undefined && { temperature: ask.temperature }),
  };
}

/** The same, read; null where these parts make no design: a wire too thick for its former, say. */
export function readChoice(ask: SeekAsk, choice: Choice): Design | null {
  try {
    return parseDesign(designFrom(ask, choice));
  } catch (error) {
    if (error instanceof InvalidInput) return null;
    throw error;
  }
}

/** Bare wire at both ends and in the loop of a tap. @see coils-and-capacitors.md D */
const LEADS: Metre = 0.3;
const TAP_LOOP: Metre = 0.08;

export interface Bill {
  /** Minor units; wire is charged by the metre and the sum rounded up. */
  cost: number;
  /** How many can be built from what is in store. */
  builds: number;
}

/** Cost of a combination's parts and how many the store makes. */
export function billOf({ lists }: SeekAsk, choice: Choice): Bill {
  const [former, wire, turns, coupling, aerialTap, detectorTap, capacitor, detector, earphone, back] = choice;
  const copper = part(lists.wires, wire);
  const metres = wireOf(part(lists.formers, former).values, copper.values, turns);
  const loops = (aerialTap > 0 ? 1 : 0) + (detectorTap > 0 && detectorTap !== aerialTap ? 1 : 0);
  const length = metres + LEADS + loops * TAP_LOOP;
  const pieces: StockPart<unknown>[] = [
    part(lists.formers, former),
    part(lists.capacitors, capacitor),
    part(lists.detectors, detector),
    part(lists.earphones, earphone),
  ];
  if (coupling >= FIRST_CAPACITOR) pieces.push(part(lists.couplings, coupling - FIRST_CAPACITOR));
  if (back >= 0) pieces.push(part(lists.returns, back));
  let cost = copper.cost * length;
  let builds = Math.floor(copper.stock / length);
  for (const piece of pieces) {
    cost += piece.cost;
    builds = Math.min(builds, Math.floor(piece.stock));
  }
  return { cost: Math.ceil(cost - 1e-9), builds };
}

/** Wire on the winding itself. */
function wireOf(tube: FormerValues, wire: StockLists['wires'][number]['values'], turns: number): Metre {
  const overall = overallOf(wire);
  return windingLength(turns, centre(tube.diameter) + overall, PITCH * overall);
}

/** Lay of a hand winding: pitch over the overall diameter, as the engine takes it where none is given. */
export const PITCH = 1.03;

export function overallOf(wire: StockLists['wires'][number]['values']): Metre {
  return wire.overall === undefined ? defaultOverall(centre(wire.bare), wire.strands ?? 1) : centre(wire.overall);
}
