import type { Circuit, KitBand, NewKit } from '@/services/kits/schemas';
import type { Place } from '@/services/parts/schemas';
import { longWaveStations, stations } from './people';

const wave = (code: string, lo: number, hi: number, first: number, last: number, step = 9): KitBand => ({
  code,
  lo: lo * 1000,
  hi: hi * 1000,
  firstCarrier: first * 1000,
  lastCarrier: last * 1000,
  step: step * 1000,
});

const mediumWave = wave('MW-1', 526.5, 1606.5, 531, 1602);
const americas = wave('MW-2', 525, 1705, 540, 1700, 10);
const longWave = wave('LW-1', 148.5, 283.5, 153, 279);
const lowerHalf = wave('own', 526.5, 1003.5, 531, 999);
const upperHalf = wave('own', 895.5, 1606.5, 900, 1602);

/** A coil, its wire and the rest of the set; what a kit holds besides is the same in most. */
export interface DemoSet {
  former: string;
  wire: string;
  turns: number;
  pitch?: number;
  capacitor: string;
  coupling: Circuit['coupling'];
  couplingCapacitor?: string;
  aerialTap?: number;
  detectorTap?: number;
  detector: string;
  earphone: string;
  returnResistor?: string;
  aerial: string;
  vertical: number;
  horizontal: number;
  longWave?: boolean;
}

export interface DemoVersion {
  set: DemoSet;
  /** What the version goes through, in order. */
  fate: 'draft' | 'in-check' | 'held' | 'released' | 'withdrawn';
  /** What the checker writes when holding it, or the owner when withdrawing it. */
  remark?: string;
  by: 'Isolde Hark' | 'Piers Lindow';
}

export interface DemoKit {
  kit: NewKit;
  pence: number;
  versions: DemoVersion[];
}

const ebbLamp: DemoSet = {
  former: 'F-50T',
  wire: 'W-500',
  turns: 72,
  pitch: 0.00055,
  capacitor: 'C-500',
  coupling: 'series-c',
  couplingCapacitor: 'CC-12',
  detector: 'D-GE1',
  earphone: 'E-HM1',
  aerial: 'A-40',
  vertical: 8,
  horizontal: 30,
};
const withCrystal = { earphone: 'E-CR1', returnResistor: 'R-47K' } as const;
const shortWire = { aerial: 'A-18', vertical: 5, horizontal: 12 } as const;

export const demoKits: DemoKit[] = [
  {
    kit: {
      code: 'MW4',
      number: 4,
      name: 'Tollgate',
      summary: 'The first one to build: the lower half of the medium wave on a card tube, in one evening.',
      audience: 'Classes and clubs, from ten years on',
      ageFrom: 10,
      band: lowerHalf,
    },
    pence: 2950,
    versions: [
      {
        set: {
          ...ebbLamp,
          ...withCrystal,
          ...shortWire,
          former: 'F-60T',
          wire: 'W-400',
          turns: 78,
          capacitor: 'C-300',
          couplingCapacitor: 'CC-22',
        },
        fate: 'released',
        by: 'Isolde Hark',
      },
    ],
  },
  {
    kit: {
      code: 'MW9',
      number: 9,
      name: 'Breakwater',
      summary: 'The upper half of the medium wave, where the coast stations sit, on a small film capacitor.',
      audience: 'Beginners near the coast',
      ageFrom: 10,
      band: upperHalf,
    },
    pence: 2700,
    versions: [
      {
        set: {
          ...ebbLamp,
          ...withCrystal,
          ...shortWire,
          former: 'F-50T',
          wire: 'W-500',
          turns: 60,
          capacitor: 'C-220',
          couplingCapacitor: 'CC-15',
          earphone: 'E-DY1',
        },
        fate: 'held',
        by: 'Piers Lindow',
        remark: 'The earphone takes next to nothing of the power there is. A crystal earphone, please.',
      },
      {
        set: {
          ...ebbLamp,
          ...withCrystal,
          ...shortWire,
          former: 'F-50T',
          wire: 'W-500',
          turns: 60,
          capacitor: 'C-220',
          couplingCapacitor: 'CC-15',
        },
        fate: 'released',
        by: 'Piers Lindow',
      },
    ],
  },
  {
    kit: {
      code: 'LW11',
      number: 11,
      name: 'Long Meadow',
      summary: 'Long wave on a wide tube of fine wire: slow to wind, and worth the evening.',
      audience: 'Patient winders',
      ageFrom: 14,
      band: longWave,
    },
    pence: 6400,
    versions: [
      {
        set: {
          ...ebbLamp,
          former: 'F-90T',
          longWave: true,
          wire: 'W-315',
          turns: 222,
          capacitor: 'C-500',
          couplingCapacitor: 'CC-33',
        },
        fate: 'released',
        by: 'Isolde Hark',
      },
    ],
  },
  {
    kit: {
      code: 'MW12',
      number: 12,
      name: 'Weir House',
      summary: 'Medium wave with a short aerial tied straight to a tap of the coil.',
      audience: 'Flats and balconies',
      ageFrom: 12,
      band: mediumWave,
    },
    pence: 3900,
    versions: [
      {
        set: { ...ebbLamp, ...withCrystal, turns: 84, couplingCapacitor: 'CC-47' },
        fate: 'held',
        by: 'Isolde Hark',
        remark: 'The top of the band is out of reach: too much of the aerial hangs on the coil.',
      },
    ],
  },
  {
    kit: {
      code: 'MW14',
      number: 14,
      name: 'Lantern Hill',
      summary: 'A full set with a headset for two listeners, one element each.',
      audience: 'Two listeners at one table',
      ageFrom: 12,
      band: mediumWave,
    },
    pence: 5200,
    versions: [
      {
        set: { ...ebbLamp, earphone: 'E-DY1' },
        fate: 'held',
        by: 'Piers Lindow',
        remark: 'An ordinary 32 Ω earphone does not suit a set without power.',
      },
      { set: { ...ebbLamp, earphone: 'E-HM2' }, fate: 'in-check', by: 'Piers Lindow' },
    ],
  },
  {
    kit: {
      code: 'MW3',
      number: 3,
      name: 'Ropewalk',
      summary: 'The yard’s first kit, on a turned beech former. No longer sold; its guide stays.',
      audience: 'Builders of all ages',
      ageFrom: 12,
      band: mediumWave,
    },
    pence: 4800,
    versions: [
      {
        set: { ...ebbLamp, detector: 'D-GE2' },
        fate: 'withdrawn',
        by: 'Isolde Hark',
        remark: 'The beech formers are no longer made.',
      },
    ],
  },
  {
    kit: {
      code: 'MW15',
      number: 15,
      name: 'Coopers Row',
      summary: 'Medium wave for the Americas, 540 to 1700 kHz, on the same tube as Ebb Lamp.',
      audience: 'Builders overseas',
      ageFrom: 12,
      band: americas,
    },
    pence: 5900,
    versions: [{ set: { ...ebbLamp, turns: 70, couplingCapacitor: 'CC-10' }, fate: 'in-check', by: 'Isolde Hark' }],
  },
  {
    kit: {
      code: 'MW16',
      number: 16,
      name: 'Gull Rock',
      summary: 'Foil plates on film in place of a bought capacitor: a set made of kitchen things.',
      audience: 'Science lessons',
      ageFrom: 10,
      band: lowerHalf,
    },
    pence: 1900,
    versions: [
      {
        set: { ...ebbLamp, ...withCrystal, ...shortWire, capacitor: 'P-80F', turns: 66 },
        fate: 'draft',
        by: 'Piers Lindow',
      },
    ],
  },
  {
    kit: {
      code: 'MW7',
      number: 7,
      name: 'Ebb Lamp',
      summary: 'The whole medium wave on one coil and a big air capacitor. Two evenings and a flat screwdriver.',
      audience: 'Builders who have made one set before',
      ageFrom: 12,
      band: mediumWave,
    },
    pence: 5800,
    versions: [
      {
        set: { ...ebbLamp, turns: 64 },
        fate: 'held',
        by: 'Isolde Hark',
        remark: 'The low end is out of reach. More turns, and send it again.',
      },
      { set: ebbLamp, fate: 'released', by: 'Isolde Hark' },
      { set: { ...ebbLamp, capacitor: 'C-365', turns: 80 }, fate: 'draft', by: 'Isolde Hark' },
    ],
  },
];

export const circuitOf = (set: DemoSet): Circuit => ({
  winding: {
    turns: set.turns,
    pitch: set.pitch ?? null,
    aerialTap: set.aerialTap ?? null,
    detectorTap: set.detectorTap ?? null,
    tolerance: 0.04,
  },
  coupling: set.coupling,
  detectorAt: set.detectorTap === undefined ? 'top' : 'tap',
  aerial: {
    vertical: set.vertical,
    horizontal: set.horizontal,
    siteFactor: { nominal: 1.1, tol: 0.15, dist: 'uniform' },
  },
  earth: { kind: 'resistance', r: { nominal: 50, tol: 1, dist: 'log-uniform' } },
  stray: { nominal: 5e-12, tol: 0.4, dist: 'uniform' },
  place: { field: 0.01, stations: set.longWave ? longWaveStations : stations },
});

type DemoLine = [reference: string, place: Place, code: string, quantity: number];

/** The lines of a set: its circuit, then what every kit of the yard holds. */
export function linesOf(set: DemoSet, wireMillimetres: number): DemoLine[] {
  const circuit: (DemoLine | false)[] = [
    ['L1', 'tuning coil', set.former, 1],
    ['W1', 'tuning coil', set.wire, wireMillimetres],
    ['C1', 'tuning capacitor', set.capacitor, 1],
    set.couplingCapacitor !== undefined && ['C2', 'coupling capacitor', set.couplingCapacitor, 1],
    ['D1', 'detector', set.detector, 1],
    ['E1', 'earphone', set.earphone, 1],
    set.returnResistor !== undefined && ['R1', 'return resistor', set.returnResistor, 1],
    ['A1', 'aerial', set.aerial, 1],
    ['G1', 'earth', 'G-30', 1],
  ];
  const rest: DemoLine[] = [
    ['B1', 'hardware', 'X-BOARD', 1],
    ['X1', 'hardware', 'X-TERM', 4],
    ['K1', 'hardware', 'X-KNOB', 1],
    ['X2', 'hardware', 'X-SCREW', 9],
    ['X3', 'hardware', 'X-PAPER', 1],
    ['P1', 'packaging', 'K-BOX', 1],
    ['P2', 'packaging', 'K-BAG', 2],
    ['Q1', 'print', 'G-GUIDE', 1],
  ];
  return [...circuit.filter((line) => line !== false), ...rest];
}
