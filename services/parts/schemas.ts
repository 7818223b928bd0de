import { z } from 'zod';
import { PartId } from '../ids';
import { Currency, Money } from '../money';

/** Where a value comes from: the maker's sheet, our own measurement, or an estimate. */
export const Origin = z.enum(['maker', 'measured', 'estimate']);

const spread = {
  /** Relative half width, 0.05 for +-5 %. */
  tol: z.number().positive('A tolerance is more than zero; leave it out for an exact value.').max(1),
  dist: z.enum(['uniform', 'normal', 'binned', 'log-uniform']),
};

/** A value of a part in SI units, with its tolerance and where it comes from. */
export const PartValue = (min: number, max: number, sentence: string) =>
  z.strictObject({
    nominal: z.number().min(min, sentence).max(max, sentence),
    tol: spread.tol.optional(),
    dist: spread.dist.optional(),
    origin: Origin,
  });
export type PartValue = z.infer<ReturnType<typeof PartValue>>;

const farad = PartValue(1e-13, 1e-6, 'A capacitance lies between 0.1 pF and 1 μF. Check the unit.');
const ohm = PartValue(1, 1e8, 'A resistance lies between 1 Ω and 100 MΩ. Check the unit.');
const metres = (min: number, max: number, sentence: string) => z.number().min(min, sentence).max(max, sentence);

const CoilFormer = z.strictObject({
  kind: z.literal('coil-former'),
  outerDiameter: PartValue(0.003, 0.5, 'A former is 3 to 500 mm across. Check the unit.'),
  length: metres(0.005, 1, 'A former is 5 mm to 1 m long.'),
  wall: z.enum(['air', 'thin', 'solid', 'damp']),
});

const Wire = z
  .strictObject({
    kind: z.literal('wire'),
    bare: metres(0.00003, 0.003, 'Bare wire is 0.03 to 3 mm thick. A gauge number is not millimetres.'),
    overall: metres(0.00003, 0.0035, 'Covered wire is up to 3.5 mm thick.'),
    covering: z.string().trim().min(1, 'Name the covering, "enamel" say.').max(40),
  })
  .refine((wire) => wire.overall >= wire.bare && wire.overall <= wire.bare + 0.0005, {
    path: ['overall'],
    message: 'Over its covering the wire is at least as thick as bare, and at most 0.5 mm more. Are the two exchanged?',
  });

const VariableCapacitor = z
  .strictObject({
    kind: z.literal('variable-capacitor'),
    min: farad,
    max: farad,
    law: z.enum(['capacitance', 'wavelength', 'frequency']),
    turnDegrees: z.number().min(30, 'The turn is 30 to 360 degrees.').max(360, 'The turn is 30 to 360 degrees.'),
  })
  .refine((gang) => gang.min.nominal < gang.max.nominal, {
    path: ['max', 'nominal'],
    message: 'The largest capacitance is above the least. Are the two exchanged?',
  });

const FoilCapacitor = z.strictObject({
  kind: z.literal('foil-capacitor'),
  width: metres(0.005, 0.5, 'A plate is 5 to 500 mm wide.'),
  travel: metres(0.005, 0.5, 'A plate slides 5 to 500 mm.'),
  sheetThickness: PartValue(1e-6, 0.02, 'A sheet is 1 μm to 20 mm thick.'),
  sheetPermittivity: z
    .number()
    .min(1, 'Relative permittivity is 1 to 12.')
    .max(12, 'Relative permittivity is 1 to 12.'),
  faces: z.int().min(1, 'At least one face.').max(40),
  min: farad,
});

const FixedCapacitor = z.strictObject({ kind: z.literal('fixed-capacitor'), c: farad });
const Resistor = z.strictObject({ kind: z.literal('resistor'), r: ohm });

const Detector = z.strictObject({
  kind: z.literal('detector'),
  detectorClass: z.enum(['germanium', 'zero-bias-schottky', 'schottky', 'silicon', 'mineral', 'oxide-contact']),
  saturationCurrent: PartValue(1e-12, 1e-3, 'A saturation current lies between 1 pA and 1 mA.').optional(),
  idealityFactor: PartValue(1, 5, 'n lies between 1 and 5.').optional(),
  seriesResistance: PartValue(0, 10_000, 'Rs is at most 10 kΩ.').optional(),
  junctionCapacitance: PartValue(0, 2e-10, 'Cj is at most 200 pF.').optional(),
  forwardVoltageAt1mA: PartValue(0.05, 2, 'A forward voltage at 1 mA lies between 0.05 and 2 V.').optional(),
  /** The curve was measured, not taken from the class. */
  measured: z.boolean(),
});

const Earphone = z.discriminatedUnion('earphoneKind', [
  z.strictObject({
    kind: z.literal('earphone'),
    earphoneKind: z.literal('ceramic'),
    c: PartValue(1e-11, 5e-7, 'A ceramic phone has 10 pF to 500 nF.'),
    rDc: ohm,
    threshold: z.number().positive().max(1).optional(),
  }),
  z.strictObject({
    kind: z.literal('earphone'),
    earphoneKind: z.enum(['magnetic', 'armature', 'dynamic']),
    rDc: ohm,
    /** Impedance r + jx at 1 kHz, the pair as connected. */
    r: ohm,
    x: z.number().min(-1e6).max(1e6),
    threshold: z.number().positive().max(1).optional(),
  }),
]);

const Transformer = z.strictObject({
  kind: z.literal('transformer'),
  ratio: z.number().min(1, 'The ratio is 1 to 500.').max(500, 'The ratio is 1 to 500.'),
  primaryR: ohm,
  primaryL: z.number().positive().max(10_000).optional(),
  lossDb: z.number().min(0).max(30),
});

const AerialWire = z.strictObject({
  kind: z.literal('aerial-wire'),
  length: metres(0.5, 200, 'An aerial wire is 0.5 to 200 m long.'),
  radius: metres(0.00005, 0.005, 'An aerial wire is 0.1 to 10 mm thick.'),
});
const EarthLead = z.strictObject({
  kind: z.literal('earth-lead'),
  length: metres(0.2, 50, 'A lead is 0.2 to 50 m long.'),
});
/** Hardware is one kind of many shapes: which of them stands for the part in pictures. */
export const HardwareDrawing = z.enum(['terminal', 'board', 'knob', 'screw', 'packet']);

const Hardware = z.strictObject({ kind: z.literal('hardware'), drawing: HardwareDrawing.optional() });
const Tool = z.strictObject({ kind: z.literal('tool') });
const Print = z.strictObject({ kind: z.literal('print') });
const Packaging = z.strictObject({ kind: z.literal('packaging') });

/** The values of a part by its kind; one schema for form, API and storage. */
export const PartValues = z.union([
  z.discriminatedUnion('kind', [
    CoilFormer,
    VariableCapacitor,
    FoilCapacitor,
    FixedCapacitor,
    Resistor,
    Detector,
    Transformer,
    AerialWire,
    EarthLead,
    Hardware,
    Tool,
    Print,
    Packaging,
  ]),
  Wire,
  Earphone,
]);
export type PartValues = z.infer<typeof PartValues>;
export type PartKind = PartValues['kind'];
export type ValuesOf<K extends PartKind> = Extract<PartValues, { kind: K }>;

/** What a line does in the circuit. */
export const Place = z.enum([
  'tuning coil',
  'tuning capacitor',
  'coupling capacitor',
  'detector',
  'earphone',
  'transformer',
  'return resistor',
  'bypass capacitor',
  'aerial',
  'earth',
  'hardware',
  'tool',
  'print',
  'packaging',
]);
export type Place = z.infer<typeof Place>;

export type PartUnit = 'each' | 'metre' | 'gram';
export type Silhouette =
  | 'coil-tube'
  | 'reel'
  | 'vanes'
  | 'foil-plates'
  | 'fixed-capacitor'
  | 'resistor'
  | 'detector'
  | 'earpiece'
  | 'headset'
  | 'transformer'
  | 'aerial'
  | 'earth'
  | 'terminal'
  | 'board'
  | 'knob'
  | 'screw'
  | 'tool'
  | 'guide'
  | 'packet'
  | 'box';

interface KindEntry {
  label: string;
  unit: PartUnit;
  places: readonly Place[];
  silhouette: Silhouette;
}

/** One row a kind: what it is called, how it is counted, where it may stand, how it is drawn. */
export const partKinds: Record<PartKind, KindEntry> = {
  'coil-former': { label: 'Coil former', unit: 'each', places: ['tuning coil'], silhouette: 'coil-tube' },
  wire: { label: 'Wire', unit: 'metre', places: ['tuning coil', 'hardware'], silhouette: 'reel' },
  'variable-capacitor': {
    label: 'Variable capacitor',
    unit: 'each',
    places: ['tuning capacitor'],
    silhouette: 'vanes',
  },
  'foil-capacitor': {
    label: 'Foil capacitor set',
    unit: 'each',
    places: ['tuning capacitor'],
    silhouette: 'foil-plates',
  },
  'fixed-capacitor': {
    label: 'Fixed capacitor',
    unit: 'each',
    places: ['coupling capacitor', 'bypass capacitor'],
    silhouette: 'fixed-capacitor',
  },
  resistor: { label: 'Resistor', unit: 'each', places: ['return resistor'], silhouette: 'resistor' },
  detector: { label: 'Detector', unit: 'each', places: ['detector'], silhouette: 'detector' },
  earphone: { label: 'Earphone', unit: 'each', places: ['earphone'], silhouette: 'earpiece' },
  transformer: { label: 'Transformer', unit: 'each', places: ['transformer'], silhouette: 'transformer' },
  'aerial-wire': { label: 'Aerial wire', unit: 'each', places: ['aerial'], silhouette: 'aerial' },
  'earth-lead': { label: 'Earth lead', unit: 'each', places: ['earth'], silhouette: 'earth' },
  hardware: { label: 'Terminal and hardware', unit: 'each', places: ['hardware'], silhouette: 'terminal' },
  tool: { label: 'Tool', unit: 'each', places: ['tool'], silhouette: 'tool' },
  print: { label: 'Print', unit: 'each', places: ['print'], silhouette: 'guide' },
  packaging: { label: 'Packaging', unit: 'each', places: ['packaging'], silhouette: 'box' },
};

/** How a part is drawn: by its kind, hardware by its own drawing, a pair of capsules on a band as a headset. */
export function silhouetteOf(values: PartValues): Silhouette {
  if (values.kind === 'hardware') return values.drawing ?? 'packet';
  if (values.kind === 'earphone' && values.earphoneKind !== 'ceramic') return 'headset';
  return partKinds[values.kind].silhouette;
}

/** The kinds in the order they are listed. */
export const PART_KINDS = Object.keys(partKinds) as [PartKind, ...PartKind[]]; // the keys of the table above

export const PartCode = z
  .string()
  .trim()
  .toUpperCase()
  .regex(/^[A-Z0-9][A-Z0-9-]{1,19}$/, 'A code is 2 to 20 letters, digits and hyphens, like C-365.');

/** A new part, as form, API and CSV send it. */
export const NewPart = z.strictObject({
  code: PartCode,
  name: z.string().trim().min(2, 'Give the part a name.').max(80, 'Keep the name under 80 characters.'),
  massMilligrams: z.int().min(0).max(100_000_000),
  cost: Money,
  note: z.string().trim().max(300).default(''),
  values: PartValues,
});
export type NewPart = z.infer<typeof NewPart>;

export const ChangePart = NewPart.omit({ code: true }).extend({ partId: PartId, basedOn: z.int() });
export type ChangePart = z.infer<typeof ChangePart>;

/** A part as a screen or a program sees it. */
export const PartView = z.strictObject({
  id: PartId,
  code: z.string(),
  kind: z.string(),
  name: z.string(),
  unit: z.enum(['each', 'metre', 'gram']),
  massMilligrams: z.int(),
  cost: z.strictObject({ minor: z.int(), currency: Currency }),
  note: z.string(),
  values: PartValues,
  saveNo: z.int(),
  retired: z.boolean(),
  stock: z.strictObject({ onHand: z.int(), available: z.int() }),
});
export type PartView = z.infer<typeof PartView>;

export const ListParts = z.strictObject({
  kind: z.enum(PART_KINDS).optional(),
  place: Place.optional(),
  /** A piece of the code or the name. */
  q: z.string().trim().max(80).optional(),
  /** The code of the last part of the page before. */
  after: z.string().max(20).optional(),
  retired: z.boolean().optional(),
});
export type ListParts = z.input<typeof ListParts>;

export interface PartPage {
  parts: PartView[];
  /** Hand it back as `after` for the next page; null on the last one. */
  next: string | null;
}

/** A part is retired, never removed: versions go on naming it. Retiring can be taken back. */
export const RetirePart = z.strictObject({ partId: PartId, basedOn: z.int(), retired: z.boolean() });
export type RetirePart = z.infer<typeof RetirePart>;
