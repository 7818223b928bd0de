import { z } from 'zod';
import { KitId, VersionId } from '../ids';
import { CautionCode, Circuit, Guide, VersionState } from '../kits/schemas';
import { Money } from '../money';
import { PartValues, Place } from '../parts/schemas';

export const PriceStep = z.strictObject({
  fromQuantity: z.int('Whole kits.').min(1, 'A step begins at 1 kit or more.').max(100_000),
  /** Tax included. */
  unit: Money,
});
export type PriceStep = z.infer<typeof PriceStep>;

export const SetPrice = z.strictObject({
  kitId: KitId,
  steps: z
    .array(PriceStep)
    .min(1, 'Give at least the price of one kit.')
    .max(6, 'Six steps at most, so that a buyer can read them.')
    .superRefine((steps, context) => {
      steps.forEach((step, index) => {
        const before = steps[index - 1];
        const at = (field: string, message: string) =>
          context.addIssue({ code: 'custom', path: [index, field], message });
        if (!before && step.fromQuantity !== 1) at('fromQuantity', 'The first step begins at 1 kit.');
        if (before && step.fromQuantity <= before.fromQuantity)
          at('fromQuantity', 'Each step begins later than the one before.');
        if (before && step.unit.minor > before.unit.minor) at('unit', 'More kits are never dearer each than fewer.');
        if (step.unit.minor < 1) at('unit', 'A price is more than nothing.');
      });
    }),
});
export type SetPrice = z.infer<typeof SetPrice>;

const Span = z.strictObject({ lo: z.number(), hi: z.number() });

/** What the reach rail shows of a version. */
export const Reach = z.strictObject({ band: Span, nominal: Span, worst: Span });
export type Reach = z.infer<typeof Reach>;

export const KitStation = z.strictObject({ name: z.string(), f: z.number() });

/** What decides how a kit is drawn. */
export const KitShape = z.strictObject({
  coil: z.enum(['flat', 'tube', 'rod']),
  turns: z.int(),
  taps: z.array(z.int()),
  /** The former's length and diameter and the length of the winding on it, metres. */
  tube: z.strictObject({ length: z.number(), diameter: z.number(), wound: z.number() }).nullable(),
  tuning: z.enum(['vanes', 'foil-plates', 'slider']),
  /** Largest capacitance of the vanes, farads. */
  largest: z.number().nullable(),
  earphone: z.enum(['earpiece', 'headset']),
});
export type KitShape = z.infer<typeof KitShape>;

export const KitCard = z.strictObject({
  kitId: KitId,
  versionId: VersionId,
  code: z.string(),
  number: z.int(),
  name: z.string(),
  letter: z.string(),
  summary: z.string(),
  ageFrom: z.int(),
  bandName: z.string(),
  reach: Reach.nullable(),
  stations: z.array(KitStation),
  shape: KitShape,
  /** Price steps, tax included; none while the owner has not set them. */
  prices: z.array(PriceStep),
  /** Boxes that the store makes now, if only this kit is built. */
  ready: z.int(),
  releasedAt: z.int(),
});
export type KitCard = z.infer<typeof KitCard>;

export const OnSale = z.strictObject({ kits: z.array(KitCard) });
export type OnSale = z.infer<typeof OnSale>;

export const BoxItem = z.strictObject({
  reference: z.string(),
  place: Place,
  name: z.string(),
  quantity: z.int(),
  unit: z.enum(['each', 'metre', 'gram']),
  values: PartValues,
});
export type BoxItem = z.infer<typeof BoxItem>;

export const KitPage = KitCard.extend({
  audience: z.string(),
  box: z.array(BoxItem),
  circuit: Circuit,
  guide: Guide,
  cautions: z.array(z.strictObject({ code: CautionCode, title: z.string(), text: z.string() })),
  cautionNote: z.string(),
  massMilligrams: z.int(),
  contour: z.strictObject({ f: z.array(z.number()), share: z.array(z.number()) }).nullable(),
  check: z
    .strictObject({
      by: z.string(),
      at: z.int(),
      contentHash: z.string(),
      engineVersion: z.string(),
      rulesVersion: z.string(),
      share: z.strictObject({ covered: z.int(), boxes: z.int() }).nullable(),
      findings: z.array(
        z.strictObject({
          severity: z.enum(['stop', 'note', 'info']),
          message: z.string(),
          reason: z.string().nullable(),
        }),
      ),
    })
    .nullable(),
});
export type KitPage = z.infer<typeof KitPage>;

/** A kit with a released version, as the owner prices it. */
export const PricedKit = z.strictObject({
  kitId: KitId,
  code: z.string(),
  number: z.int(),
  name: z.string(),
  letter: z.string(),
  state: VersionState,
  reach: Reach.nullable(),
  prices: z.array(PriceStep),
  ready: z.int(),
  limitedBy: z.string().nullable(),
  /** Parts of one box at the costs in the list of parts. */
  cost: Money,
});
export type PricedKit = z.infer<typeof PricedKit>;
