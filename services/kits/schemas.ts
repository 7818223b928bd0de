import { z } from 'zod';
import { KitId, LineId, PartId, PersonId, VersionId } from '../ids';
import { PartValues, Place } from '../parts/schemas';

export const VersionState = z.enum(['draft', 'in-check', 'held', 'released', 'withdrawn']);
export type VersionState = z.infer<typeof VersionState>;

const sentence = (min: number, max: number, what: string) => z.string().trim().min(min, what).max(max, what);

/** The band a kit promises; the engine measures margins at its edges and tunes every carrier in it. */
export const KitBand = z
  .strictObject({
    code: z.string().min(1).max(20),
    lo: z.number(),
    hi: z.number(),
    firstCarrier: z.number(),
    lastCarrier: z.number(),
    step: z.number().positive(),
  })
  .refine((band) => band.lo < band.hi, { path: ['hi'], message: 'The top of the band is above its bottom.' })
  .refine((band) => band.lo >= 100_000, { path: ['lo'], message: 'A band starts at 100 kHz or above.' })
  .refine((band) => band.hi <= 30_000_000, { path: ['hi'], message: 'A band ends at 30 MHz or below.' })
  .refine((band) => band.hi <= 12 * band.lo, {
    path: ['hi'],
    message: 'No single capacitor tunes more than 12 to 1. Choose a narrower band.',
  })
  .refine((band) => band.lo <= band.firstCarrier && band.firstCarrier <= band.lastCarrier, {
    path: ['firstCarrier'],
    message: 'The first carrier lies in the band, at or below the last one.',
  })
  .refine((band) => band.lastCarrier <= band.hi, {
    path: ['lastCarrier'],
    message: 'The last carrier lies in the band.',
  });
export type KitBand = z.infer<typeof KitBand>;

export const KitCode = z
  .string()
  .trim()
  .toUpperCase()
  .regex(/^[A-HJ-NP-Z][A-HJ-NP-Z0-9]{1,5}$/, 'A kit code is 2 to 6 letters and digits without I and O, like MW7.');

export const NewKit = z.strictObject({
  code: KitCode,
  number: z.int().min(1, 'Kit numbers begin at 1.').max(9999),
  name: sentence(2, 40, 'A kit name has 2 to 40 characters.'),
  summary: sentence(10, 300, 'Say in 10 to 300 characters what the kit is.'),
  audience: sentence(3, 80, 'Say who it is for, in 3 to 80 characters.'),
  ageFrom: z.int().min(3, 'Small parts: never under 3 years.').max(99),
  band: KitBand,
});
export type NewKit = z.infer<typeof NewKit>;

/** A value of the circuit with its spread, SI units. */
const Spread = (min: number, max: number, what: string) =>
  z.strictObject({
    nominal: z.number().min(min, what).max(max, what),
    tol: z.number().positive().max(3).optional(),
    dist: z.enum(['uniform', 'normal', 'binned', 'log-uniform']).optional(),
  });

/** Circuit form, winding and assumptions of a version: what its parts alone do not say. */
export const Circuit = z.strictObject({
  winding: z.strictObject({
    turns: z.int('Turns are whole.').min(1, 'At least one turn.').max(1000, 'At most 1000 turns.'),
    /** Metre from turn to turn; null for a close winding by hand. */
    pitch: z.number().min(0.00003).max(0.05).nullable(),
    aerialTap: z.int().min(1).max(999).nullable(),
    detectorTap: z.int().min(1).max(999).nullable(),
    /** Relative half width of the wound inductance, normal. */
    tolerance: z.number().positive().max(0.5),
  }),
  coupling: z.enum(['direct', 'series-c', 'aerial-tap']),
  detectorAt: z.enum(['top', 'tap']),
  aerial: z.strictObject({
    vertical: z.number().min(0.5, 'The riser is 0.5 to 100 m.').max(100, 'The riser is 0.5 to 100 m.'),
    horizontal: z.number().min(0).max(100, 'The level part is at most 100 m.'),
    siteFactor: Spread(0.5, 2, 'The site factor lies between 0.5 and 2.'),
  }),
  earth: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('resistance'), r: Spread(0, 2000, 'An earth is at most 2 kΩ.') }),
    z.strictObject({ kind: z.literal('none') }),
  ]),
  stray: Spread(0, 1e-9, 'Stray capacitance is at most 1 nF.'),
  place: z.strictObject({
    field: z.number().min(1e-6).max(100),
    stations: z
      .array(
        z.strictObject({
          name: z.string().min(1).max(40),
          f: z.number().positive(),
          field: z.number().min(1e-6).max(100),
        }),
      )
      .max(40),
  }),
});
export type Circuit = z.infer<typeof Circuit>;

/** The cautions every guide must carry (`cautions.ts` has their words). */
export const CautionCode = z.enum([
  'outdoor-aerial',
  'thunder',
  'power-lines',
  'earth',
  'no-mains',
  'hearing',
  'small-parts',
  'hot-tools',
  'wire-across-path',
]);
export type CautionCode = z.infer<typeof CautionCode>;

/** A step may still lack its words in a draft; the check room's rules ask for them. */
export const GuideStep = z.strictObject({
  title: z.string().trim().max(80, 'Keep the title under 80 characters.'),
  text: z.string().trim().max(1200, 'Keep a step under 1200 characters.'),
  /** References of the lines this step uses: L1, C1. */
  uses: z.array(z.string()).max(20),
  /** What to see or measure before going on; empty where there is nothing. */
  check: z.string().trim().max(300),
});
export type GuideStep = z.infer<typeof GuideStep>;

export const Guide = z.strictObject({
  intro: z.string().trim().max(1200),
  steps: z.array(GuideStep).max(40),
  cautions: z.array(CautionCode),
});
export type Guide = z.infer<typeof Guide>;

export const NewLine = z.strictObject({
  versionId: VersionId,
  place: Place,
  partId: PartId.nullable(),
  reference: z
    .string()
    .trim()
    .toUpperCase()
    .regex(/^[A-Z]{1,2}[0-9]{0,3}$/, 'A reference is one or two letters and a number, like L1.'),
  quantity: z.int('Whole pieces, or whole millimetres of wire.').min(1, 'At least one.').max(1_000_000),
  note: z.string().trim().max(200).default(''),
});
export type NewLine = z.infer<typeof NewLine>;

export const SaveLine = NewLine.omit({ versionId: true }).extend({ lineId: LineId, basedOn: z.int() });
export type SaveLine = z.infer<typeof SaveLine>;

export const RemoveLine = z.strictObject({ lineId: LineId });
export const SaveCircuit = z.strictObject({ versionId: VersionId, circuit: Circuit, basedOn: z.int() });
export const SaveGuide = z.strictObject({ versionId: VersionId, guide: Guide, basedOn: z.int() });
export type RemoveLine = z.infer<typeof RemoveLine>;
export type SaveCircuit = z.infer<typeof SaveCircuit>;
export type SaveGuide = z.infer<typeof SaveGuide>;
export const StartVersion = z.strictObject({ kitId: KitId, fromVersionId: VersionId.nullable() });

export type StartVersion = z.infer<typeof StartVersion>;

/** A part as it stands in a frozen version: what it is, never which row it was. */
export const FrozenPart = z.strictObject({
  code: z.string(),
  name: z.string(),
  unit: z.enum(['each', 'metre', 'gram']),
  massMilligrams: z.int(),
  values: PartValues,
});

export const FrozenLine = z.strictObject({
  reference: z.string(),
  place: Place,
  quantity: z.int(),
  note: z.string(),
  part: FrozenPart.nullable(),
});
export type FrozenLine = z.infer<typeof FrozenLine>;

/**
 * Everything a version is. Frozen as canonical text under its SHA-256 when it is sent to check; no ids and no times,
 * so that equal content has an equal hash.
 */
export const VersionContent = z.strictObject({
  format: z.literal('coilyard-version/1'),
  kit: z.strictObject({
    code: z.string(),
    number: z.int(),
    name: z.string(),
    summary: z.string(),
    audience: z.string(),
    ageFrom: z.int(),
    band: KitBand,
  }),
  letter: z.string(),
  circuit: Circuit,
  guide: Guide,
  lines: z.array(FrozenLine),
});
export type VersionContent = z.infer<typeof VersionContent>;

/** A line as the workbench shows it. */
export const LineView = z.strictObject({
  id: LineId,
  reference: z.string(),
  place: Place,
  quantity: z.int(),
  note: z.string(),
  position: z.int(),
  saveNo: z.int(),
  partId: PartId.nullable(),
  part: FrozenPart.nullable(),
  costMinor: z.int(),
  retired: z.boolean(),
});
export type LineView = z.infer<typeof LineView>;

/** One version as the bench sees it. */
export const VersionView = z.strictObject({
  id: VersionId,
  kitId: KitId,
  letter: z.string(),
  state: VersionState,
  saveNo: z.int(),
  content: VersionContent,
  contentHash: z.string().nullable(),
  lines: z.array(LineView),
  editors: z.array(z.strictObject({ id: PersonId, name: z.string() })),
  /** Whoever asks drew or edited it, so may not judge it. */
  own: z.boolean(),
  createdAt: z.int(),
  updatedAt: z.int(),
  sentAt: z.int().nullable(),
  /** Letters and states of all versions of the kit, oldest first, for the tabs. */
  siblings: z.array(z.strictObject({ id: VersionId, letter: z.string(), state: VersionState })),
  /** What the check room said, when it held this version or the one this is based on. */
  held: z
    .strictObject({
      letter: z.string(),
      by: z.string(),
      at: z.int(),
      remark: z.string(),
      findings: z.array(z.strictObject({ code: z.string(), severity: z.string(), message: z.string() })),
      /** What this version does otherwise than the held one; empty on the held one itself. */
      changes: z.array(z.strictObject({ what: z.string(), from: z.string().nullable(), to: z.string().nullable() })),
    })
    .nullable(),
});
export type VersionView = z.infer<typeof VersionView>;
