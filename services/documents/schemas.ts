import { z } from 'zod';

export const PaperKind = z.enum(['slip', 'guide', 'label', 'invoice']);
export type PaperKind = z.infer<typeof PaperKind>;

export const PaperSize = z.enum(['a4', 'letter']);
export type PaperSize = z.infer<typeof PaperSize>;

export const RenderPaper = z.strictObject({
  kind: PaperKind,
  /** The box for slip, guide and label; the order's invoice for an invoice. */
  id: z.string().regex(/^[0-9a-hjkmnp-tv-z]{26}$/, 'There is no such paper.'),
  size: PaperSize.default('a4'),
  /** The secret of the order's link, for a buyer who has not signed in. */
  key: z.string().max(100).optional(),
});
export type RenderPaper = z.input<typeof RenderPaper>;

const Ends = z.strictObject({ lo: z.number(), hi: z.number() });

export const PrintPlate = z.strictObject({ number: z.int(), letter: z.string(), name: z.string() });
export type PrintPlate = z.infer<typeof PrintPlate>;

/** The rail in one ink; the form that the drawing takes. */
export const PrintReach = z.strictObject({
  band: Ends,
  nominal: Ends.nullable(),
  worst: Ends.nullable(),
  contour: z.strictObject({ f: z.array(z.number()), share: z.array(z.number()) }).nullable(),
  stations: z.array(z.strictObject({ name: z.string(), f: z.number() })),
});
export type PrintReach = z.infer<typeof PrintReach>;

export const SlipView = z.strictObject({
  seller: z.string(),
  plate: PrintPlate,
  serial: z.string(),
  hash: z.string(),
  orderNumber: z.string(),
  position: z.int(),
  of: z.int(),
  sendTo: z.array(z.string()),
  packed: z.strictObject({ on: z.string(), by: z.string() }).nullable(),
  weight: z.strictObject({ weighed: z.string().nullable(), expected: z.string() }),
  lines: z.array(
    z.strictObject({
      reference: z.string(),
      family: z.string(),
      name: z.string(),
      bin: z.string(),
      pieces: z.int(),
      amount: z.string(),
      scanned: z.string(),
    }),
  ),
  pieces: z.int(),
  giftNote: z.string(),
  reach: PrintReach,
  signOff: z.strictObject({ by: z.string(), on: z.string() }).nullable(),
  missing: z.string(),
});
export type SlipView = z.infer<typeof SlipView>;

/** A part as the checklist and the steps name it. */
export const GuidePart = z.strictObject({
  reference: z.string(),
  name: z.string(),
  family: z.string(),
  amount: z.string(),
  /** How to recognise it: "marked 470", "yellow violet orange gold". */
  marking: z.string(),
  note: z.string(),
});
export type GuidePart = z.infer<typeof GuidePart>;

/** A reading to take before going on, with a blank beside its limits. */
export const Gate = z.strictObject({ low: z.string(), high: z.string(), unit: z.string() });
export type Gate = z.infer<typeof Gate>;

const Label = z.strictObject({ ref: z.string(), value: z.string() });

export const PrintCircuit = z.strictObject({
  aerial: z.string(),
  earth: z.string(),
  coupling: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('direct') }),
    z.strictObject({ kind: z.literal('series-c'), label: Label }),
    z.strictObject({ kind: z.literal('aerial-tap'), label: z.string() }),
  ]),
  coil: Label,
  tuning: z.strictObject({ kind: z.enum(['capacitor', 'foil']), label: Label }),
  padder: z.null(),
  trimmer: z.null(),
  detectorAt: z.enum(['top', 'tap']),
  detector: Label,
  returnResistor: Label.nullable(),
  bypass: Label.nullable(),
  transformer: Label.nullable(),
  earphone: Label,
});
export type PrintCircuit = z.infer<typeof PrintCircuit>;

export const PrintWinding = z.strictObject({
  former: z.strictObject({
    form: z.literal('tube'),
    diameterMm: z.number(),
    lengthMm: z.number(),
    windingMm: z.number(),
  }),
  turns: z.int(),
  taps: z.array(z.strictObject({ turn: z.int(), label: z.string() })),
  startGoesTo: z.string(),
  endGoesTo: z.string(),
});
export type PrintWinding = z.infer<typeof PrintWinding>;

export const GuideStepView = z.strictObject({
  number: z.int(),
  title: z.string(),
  text: z.string(),
  uses: z.array(GuidePart),
  check: z.string(),
  gate: Gate.nullable(),
  drawing: z.enum(['winding', 'circuit', 'parts']),
});
export type GuideStepView = z.infer<typeof GuideStepView>;

/** The whole build guide of one box. */
export const GuideView = z.strictObject({
  seller: z.string(),
  plate: PrintPlate,
  serial: z.string(),
  hash: z.string(),
  code: z.string(),
  summary: z.string(),
  audience: z.string(),
  ageFrom: z.int(),
  intro: z.string(),
  released: z.strictObject({ by: z.string(), on: z.string() }).nullable(),
  /** Said on old boxes whose version was withdrawn since; empty as a rule. */
  withdrawn: z.string(),
  reach: PrintReach,
  cautions: z.array(z.strictObject({ title: z.string(), text: z.string() })),
  cautionNote: z.string(),
  needs: z.array(z.string()),
  parts: z.array(GuidePart),
  pieces: z.int(),
  tools: z.array(z.string()),
  winding: PrintWinding,
  /** The winding table, row by row: what, and its figure. */
  windingRows: z.array(z.strictObject({ what: z.string(), value: z.string() })),
  tapRows: z.array(z.strictObject({ point: z.string(), turns: z.string(), wire: z.string(), goesTo: z.string() })),
  circuit: PrintCircuit,
  steps: z.array(GuideStepView),
  tune: z.array(z.strictObject({ end: z.string(), nominal: z.string(), worst: z.string(), hint: z.string() })),
  faults: z.array(z.strictObject({ sign: z.string(), cure: z.string() })),
  missing: z.string(),
});
export type GuideView = z.infer<typeof GuideView>;

export const LabelView = z.strictObject({
  seller: z.string(),
  plate: PrintPlate,
  serial: z.string(),
  hash: z.string(),
  orderNumber: z.string(),
  position: z.int(),
  of: z.int(),
  mass: z.string(),
  ageFrom: z.int(),
});
export type LabelView = z.infer<typeof LabelView>;
