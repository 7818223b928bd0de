import type { NewPart, PartValue, PartValues, ValuesOf } from '@/services/parts/schemas';

/** The invented yard's parts. Values are of kinds and sizes usual in the trade (common practice, no source). */
const pico = 1e-12;
const mm = 1e-3;

const maker = (nominal: number, tol?: number, dist: PartValue['dist'] = 'uniform'): PartValue => ({
  nominal,
  origin: 'maker',
  ...(tol !== undefined && { tol, dist }),
});

interface Row {
  code: string;
  name: string;
  grams: number;
  pence: number;
  note?: string;
  values: PartValues;
}

const former = (
  diameter: number,
  length: number,
  wall: 'thin' | 'solid' | 'damp',
  what: string,
  pence: number,
): Row => ({
  code: `F-${diameter}${wall === 'thin' ? 'T' : wall === 'solid' ? 'P' : 'D'}`,
  name: `${what}, ${diameter} mm`,
  grams: Math.round(diameter * length * (wall === 'thin' ? 0.004 : 0.009)),
  pence,
  values: {
    kind: 'coil-former',
    outerDiameter: maker(diameter * mm, 0.5 / diameter, 'normal'),
    length: length * mm,
    wall,
  },
});

const copperGramsAMetre = (bare: number) => 8890 * (Math.PI / 4) * (bare * mm) ** 2 * 1000;

const wire = (bare: number, overall: number, pence: number, covering = 'enamel'): Row => ({
  code: `W-${String(Math.round(bare * 1000)).padStart(3, '0')}${covering === 'enamel' ? '' : 'C'}`,
  name: covering === 'enamel' ? `Enamelled wire, ${bare} mm` : `Cotton-covered wire, ${bare} mm`,
  grams: copperGramsAMetre(bare) * (covering === 'enamel' ? 1.04 : 1.1),
  pence,
  values: { kind: 'wire', bare: bare * mm, overall: overall * mm, covering },
});

const gang = (
  code: string,
  min: number,
  max: number,
  law: 'capacitance' | 'wavelength' | 'frequency',
  tol: number,
  grams: number,
  pence: number,
): Row => ({
  code,
  name: `Variable capacitor, ${min} to ${max} pF`,
  grams,
  pence,
  values: {
    kind: 'variable-capacitor',
    min: maker(min * pico, 0.2),
    max: maker(max * pico, tol),
    law,
    turnDegrees: 180,
  },
});

const foil = (code: string, side: number, sheet: number, permittivity: number, what: string, pence: number): Row => ({
  code,
  name: `Foil plates on ${what}, ${side} mm`,
  grams: side / 4,
  pence,
  note: 'Two plates and sheets; the air between them decides the value, so press it flat.',
  values: {
    kind: 'foil-capacitor',
    width: side * mm,
    travel: side * mm,
    sheetThickness: { nominal: sheet * mm, tol: 0.3, dist: 'uniform', origin: 'estimate' },
    sheetPermittivity: permittivity,
    faces: 1,
    min: { nominal: 8 * pico, tol: 0.3, dist: 'uniform', origin: 'estimate' },
  },
});

const fixed = (picofarad: number): Row => ({
  code: `CC-${String(picofarad).replace('.', 'R')}`,
  name: `Ceramic capacitor C0G, ${picofarad >= 1000 ? `${picofarad / 1000} nF` : `${picofarad} pF`}`,
  grams: 0.3,
  pence: 9,
  values: { kind: 'fixed-capacitor', c: maker(picofarad * pico, 0.05) },
});

const resistor = (ohms: number, shown: string): Row => ({
  code: `R-${shown}`,
  name: `Carbon film resistor, ${shown.replace('K', ' kΩ').replace('M', ' MΩ')}`,
  grams: 0.25,
  pence: 3,
  values: { kind: 'resistor', r: maker(ohms, 0.05) },
});

const thing = (
  values: ValuesOf<'hardware' | 'tool' | 'print' | 'packaging'>,
  code: string,
  name: string,
  grams: number,
  pence: number,
): Row => ({
  code,
  name,
  grams,
  pence,
  values,
});

const detectors: Row[] = [
  {
    code: 'D-GE1',
    name: 'Germanium diode, glass',
    grams: 0.28,
    pence: 42,
    values: {
      kind: 'detector',
      detectorClass: 'germanium',
      forwardVoltageAt1mA: maker(0.29, 0.08, 'normal'),
      measured: true,
    },
  },
  {
    code: 'D-GE2',
    name: 'Germanium diode, gold bonded',
    grams: 0.28,
    pence: 65,
    values: {
      kind: 'detector',
      detectorClass: 'germanium',
      forwardVoltageAt1mA: maker(0.26, 0.06, 'normal'),
      measured: true,
    },
  },
  {
    code: 'D-GE3',
    name: 'Germanium diode, picked at 1 mA',
    grams: 0.28,
    pence: 88,
    values: {
      kind: 'detector',
      detectorClass: 'germanium',
      forwardVoltageAt1mA: maker(0.3, 0.03, 'normal'),
      measured: true,
    },
  },
  {
    code: 'D-ZB1',
    name: 'Zero-bias Schottky diode',
    grams: 0.1,
    pence: 58,
    values: { kind: 'detector', detectorClass: 'zero-bias-schottky', measured: true },
  },
  {
    code: 'D-SS1',
    name: 'Small-signal Schottky diode',
    grams: 0.13,
    pence: 12,
    values: { kind: 'detector', detectorClass: 'schottky', measured: true },
  },
  {
    code: 'D-SI1',
    name: 'Silicon diode, signal',
    grams: 0.13,
    pence: 3,
    values: { kind: 'detector', detectorClass: 'silicon', measured: true },
  },
  {
    code: 'D-PY1',
    name: 'Pyrite and spring',
    grams: 14,
    pence: 240,
    values: { kind: 'detector', detectorClass: 'mineral', measured: false },
  },
  {
    code: 'D-BL1',
    name: 'Blued blade and graphite',
    grams: 6,
    pence: 60,
    values: { kind: 'detector', detectorClass: 'oxide-contact', measured: false },
  },
];

const earphones: Row[] = [
  {
    code: 'E-CR1',
    name: 'Crystal earphone, ceramic',
    grams: 9,
    pence: 210,
    values: { kind: 'earphone', earphoneKind: 'ceramic', c: maker(15e-9, 0.2), rDc: maker(20e6) },
  },
  {
    code: 'E-CR2',
    name: 'Crystal earphone, old type',
    grams: 11,
    pence: 640,
    values: { kind: 'earphone', earphoneKind: 'ceramic', c: maker(0.5e-9, 0.3), rDc: maker(30e6) },
  },
  {
    code: 'E-HM1',
    name: 'Headset, two 2000 Ω elements',
    grams: 190,
    pence: 1850,
    values: {
      kind: 'earphone',
      earphoneKind: 'magnetic',
      rDc: maker(4000, 0.1),
      r: maker(18_000, 0.2),
      x: 16_000,
      threshold: 3e-14,
    },
  },
  {
    code: 'E-HM2',
    name: 'Single element, 1000 Ω',
    grams: 95,
    pence: 900,
    values: { kind: 'earphone', earphoneKind: 'magnetic', rDc: maker(1000, 0.1), r: maker(4500, 0.2), x: 4000 },
  },
  {
    code: 'E-BA1',
    name: 'Balanced armature element',
    grams: 24,
    pence: 720,
    values: { kind: 'earphone', earphoneKind: 'armature', rDc: maker(150, 0.1), r: maker(560, 0.2), x: 250 },
  },
  {
    code: 'E-DY1',
    name: 'Ordinary earphone, 32 Ω',
    grams: 8,
    pence: 95,
    values: { kind: 'earphone', earphoneKind: 'dynamic', rDc: maker(32, 0.1), r: maker(32, 0.1), x: 0 },
  },
];

const transformers: Row[] = [
  {
    code: 'T-40',
    name: 'Matching transformer, 40 to 1',
    grams: 62,
    pence: 690,
    values: { kind: 'transformer', ratio: 40, primaryR: maker(900, 0.1), primaryL: 60, lossDb: 3 },
  },
  {
    code: 'T-12',
    name: 'Matching transformer, 12 to 1',
    grams: 48,
    pence: 540,
    values: { kind: 'transformer', ratio: 12, primaryR: maker(600, 0.1), primaryL: 40, lossDb: 3 },
  },
];

const aerial = (length: number, pence: number): Row => ({
  code: `A-${length}`,
  name: `Aerial wire, ${length} m, stranded`,
  grams: length * 8,
  pence,
  values: { kind: 'aerial-wire', length, radius: 0.0005 },
});

const earth = (code: string, name: string, length: number, grams: number, pence: number): Row => ({
  code,
  name,
  grams,
  pence,
  values: { kind: 'earth-lead', length },
});

const resistances: [number, string][] = [
  [22e3, '22K'],
  [33e3, '33K'],
  [47e3, '47K'],
  [56e3, '56K'],
  [68e3, '68K'],
  [82e3, '82K'],
  [100e3, '100K'],
  [120e3, '120K'],
  [150e3, '150K'],
  [220e3, '220K'],
  [470e3, '470K'],
  [1e6, '1M'],
];

type Drawn = NonNullable<ValuesOf<'hardware'>['drawing']>;

const hardware: [string, string, number, number, Drawn?][] = [
  ['X-TERM', 'Brass terminal with nut', 7.2, 38, 'terminal'],
  ['X-TERMB', 'Brass terminal, black cap', 7.4, 44, 'terminal'],
  ['X-TERMR', 'Brass terminal, red cap', 7.4, 44, 'terminal'],
  ['X-KNOB', 'Knob, 38 mm, with screw', 18, 95, 'knob'],
  ['X-KNOBS', 'Knob, 25 mm, with screw', 9, 70, 'knob'],
  ['X-DIAL', 'Dial plate, blank', 12, 60, 'knob'],
  ['X-SCREW', 'Wood screw, 10 mm', 0.9, 2, 'screw'],
  ['X-SCREWL', 'Wood screw, 20 mm', 1.6, 3, 'screw'],
  ['X-BOLT', 'Bolt M3, 12 mm, with nut', 1.1, 4, 'screw'],
  ['X-WASH', 'Washer M3', 0.31, 1],
  ['X-BOARD', 'Drilled board, beech, 120 by 180 mm', 210, 260, 'board'],
  ['X-BOARDS', 'Drilled board, birch ply, 90 by 140 mm', 88, 150, 'board'],
  ['X-BOARDL', 'Drilled board, beech, 160 by 240 mm', 390, 380, 'board'],
  ['X-CLIP', 'Spring clip', 3.1, 14, 'terminal'],
  ['X-CROC', 'Crocodile clip, covered', 4.5, 19, 'terminal'],
  ['X-LUG', 'Solder lug', 0.4, 3],
  ['X-FOOT', 'Felt foot', 0.6, 4],
  ['X-TAPE', 'Paper tape, 1 m', 1.2, 6],
  ['X-SPRING', 'Spring terminal strip, 4 way', 11, 85, 'terminal'],
  ['X-SOCK', 'Earphone socket', 5.2, 46, 'terminal'],
  ['X-BRACK', 'Capacitor bracket', 8.5, 35],
  ['X-INSUL', 'Egg insulator', 32, 55],
  ['X-CORD', 'Halyard cord, 5 m', 24, 70],
  ['X-ROD', 'Earth rod, 0.6 m', 480, 620],
  ['X-SLEEVE', 'Insulating sleeve, 200 mm', 0.8, 5],
  ['X-TAG', 'Tag strip, 5 way', 6.1, 28],
  ['X-WIRE', 'Hook-up wire, 0.5 m', 2.4, 8],
  ['X-PAPER', 'Fine sandpaper, 60 by 60 mm', 1.0, 3],
  ['X-WAX', 'Beeswax block', 10, 40],
  ['X-PEG', 'Peg for tap loops', 0.7, 4],
];
const tools: [string, string, number, number][] = [
  ['T-DRV', 'Flat screwdriver, 75 mm', 38, 120],
  ['T-STRIP', 'Wire scraper', 14, 90],
  ['T-RULE', 'Paper rule, 300 mm', 3, 6],
  ['T-GLASS', 'Magnifier, 3 times', 21, 80],
  ['T-PROBE', 'Continuity lamp with cell', 46, 260],
];
const packaging: [string, string, number, number][] = [
  ['K-BOX', 'Carton, 200 by 150 by 90 mm', 96, 62],
  ['K-BOXL', 'Carton, 280 by 200 by 110 mm', 160, 88],
  ['K-BOXS', 'Carton, 150 by 110 by 70 mm', 60, 48],
  ['K-BAG', 'Paper bag for small parts', 2.2, 4],
  ['K-PAD', 'Paper padding', 14, 6],
  ['K-SLEEVE', 'Sleeve for the guide', 9, 12],
];

const rows: Row[] = [
  former(32, 90, 'thin', 'Card tube', 35),
  former(38, 100, 'thin', 'Card tube', 42),
  former(42, 110, 'thin', 'Card tube', 48),
  former(50, 110, 'thin', 'Card tube', 55),
  former(60, 120, 'thin', 'Card tube', 62),
  former(76, 130, 'thin', 'Card tube', 85),
  former(90, 150, 'thin', 'Card tube', 110),
  former(32, 80, 'solid', 'Plastic pipe', 40),
  former(40, 110, 'solid', 'Plastic pipe', 55),
  former(50, 110, 'solid', 'Plastic pipe', 70),
  former(63, 130, 'solid', 'Plastic pipe', 95),
  former(80, 140, 'solid', 'Turned beech', 480),
  wire(0.2, 0.22, 5),
  wire(0.25, 0.274, 6),
  wire(0.315, 0.3415, 7),
  wire(0.4, 0.43, 9),
  wire(0.5, 0.534, 12),
  wire(0.56, 0.5955, 14),
  wire(0.63, 0.668, 17),
  wire(0.71, 0.75, 21),
  wire(0.8, 0.8425, 26),
  wire(0.4, 0.62, 18, 'cotton'),
  wire(0.5, 0.73, 22, 'cotton'),
  gang('C-365', 14, 365, 'capacitance', 0.05, 92, 640),
  gang('C-500', 12, 500, 'capacitance', 0.05, 118, 860),
  gang('C-500W', 12, 500, 'wavelength', 0.05, 124, 940),
  gang('C-500F', 14, 500, 'frequency', 0.05, 131, 1080),
  gang('C-410', 11, 410, 'wavelength', 0.05, 105, 780),
  gang('C-300', 12, 300, 'capacitance', 0.05, 84, 560),
  gang('C-220', 10, 220, 'capacitance', 0.1, 12, 190),
  gang('C-160', 6, 160, 'capacitance', 0.1, 11, 160),
  gang('C-270', 7, 270, 'capacitance', 0.1, 13, 210),
  gang('C-1000', 20, 1000, 'capacitance', 0.05, 190, 1450),
  gang('C-100', 6, 100, 'frequency', 0.05, 58, 520),
  gang('C-50', 5, 50, 'capacitance', 0.05, 40, 390),
  foil('P-60', 60, 0.1, 2.4, 'paper', 60),
  foil('P-100', 100, 0.1, 2.4, 'paper', 85),
  foil('P-80F', 80, 0.1, 2.2, 'polypropylene film', 110),
  foil('P-30', 30, 1, 3, 'card', 40),
  ...[4.7, 6.8, 8.2, 10, 12, 15, 18, 22, 27, 33, 39, 47, 56, 68, 82, 100, 120, 150, 180, 220, 330, 470, 1000, 2200].map(
    fixed,
  ),
  ...resistances.map(([ohms, shown]) => resistor(ohms, shown)),
  ...detectors,
  ...earphones,
  ...transformers,
  aerial(6, 90),
  aerial(10, 140),
  aerial(15, 200),
  aerial(18, 240),
  aerial(22, 290),
  aerial(30, 380),
  aerial(40, 490),
  earth('G-15', 'Earth clip and lead, 1.5 m', 1.5, 46, 130),
  earth('G-30', 'Earth clip and lead, 3 m', 3, 74, 180),
  earth('G-50', 'Earth clip and lead, 5 m', 5, 110, 240),
  earth('G-CP', 'Counterpoise wire, 8 m', 8, 60, 150),
  ...hardware.map(([code, name, grams, pence, drawing = 'packet']) =>
    thing({ kind: 'hardware', drawing }, code, name, grams, pence),
  ),
  ...tools.map(([code, name, grams, pence]) => thing({ kind: 'tool' }, code, name, grams, pence)),
  ...packaging.map(([code, name, grams, pence]) => thing({ kind: 'packaging' }, code, name, grams, pence)),
  thing({ kind: 'print' }, 'G-GUIDE', 'Printed build guide', 78, 60),
];

export const demoParts: NewPart[] = rows.map(({ grams, pence, note, ...row }) => ({
  ...row,
  massMilligrams: Math.round(grams * 1000),
  cost: { minor: pence, currency: 'GBP' },
  note: note ?? '',
}));
