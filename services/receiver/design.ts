import { z } from 'zod';
import { DETECTOR_CLASSES } from './detector/diode';
import { PI } from './numeric/trig';
import { Coil, Primary, faces, layers } from './schema/coil';
import { crossIssues } from './schema/cross';
import { LIMITS } from './schema/limits';
import { quantity, value } from './schema/value';

const frequency = (words: string) => quantity(100e3, 30e6, words);
const tuned = () => value(LIMITS.tuned, 'a capacitance from 0.1 pF to 10 nF');
const metres = (words: string) => value(LIMITS.wireLength, words);

export const Band = z.strictObject({
  lo: frequency('the lower edge of the band, 100 kHz to 30 MHz'),
  hi: frequency('the upper edge of the band, 100 kHz to 30 MHz'),
  firstCarrier: frequency('the first carrier, inside the band'),
  lastCarrier: frequency('the last carrier, inside the band'),
  step: z
    .number({ error: 'Give the distance of two carriers, above zero.' })
    .positive({ error: 'Give a step above zero.' })
    .max(30e6),
});

const Aerial = z.discriminatedUnion(
  'kind',
  [
    z.strictObject({
      kind: z.literal('wire'),
      vertical: metres('a riser from 0.5 to 100 m'),
      horizontal: z.union([z.literal(0), metres('a top wire from 0.5 to 100 m, or 0 for none')]),
      radius: value(LIMITS.wireRadius, 'a wire radius from 0.01 mm to 50 mm, in metres'),
      siteFactor: value(LIMITS.siteFactor, 'a factor from 0.5 to 2').default(1.1),
    }),
    z.strictObject({
      kind: z.literal('circuit'),
      r: value(LIMITS.aerialR, 'a resistance from 0 to 100 kilohm'),
      l: value(LIMITS.aerialL, 'an inductance from 0 to 0.1 H'),
      c: value(LIMITS.aerialC, 'a capacitance from 1 pF to 10 nF'),
      effectiveHeight: value(LIMITS.effectiveHeight, 'an effective height from 0.01 to 50 m'),
    }),
  ],
  { error: 'Give wire or circuit.' },
);

const Earth = z.discriminatedUnion(
  'kind',
  [
    z.strictObject({
      kind: z.literal('resistance'),
      r: value(LIMITS.earthR, 'a resistance from 0 to 2000 ohm').default(50),
    }),
    z.strictObject({ kind: z.literal('none') }),
  ],
  { error: 'Give resistance or none.' },
);

const Coupling = z.discriminatedUnion(
  'kind',
  [
    z.strictObject({ kind: z.literal('direct') }),
    z.strictObject({ kind: z.literal('series-c'), c: tuned() }),
    z.strictObject({ kind: z.literal('aerial-tap') }),
    Primary,
  ],
  { error: 'Give one of direct, series-c, aerial-tap, primary.' },
);

const turn = value(LIMITS.turn, 'a turn above 0, up to 2 pi').default(PI);

const Capacitor = z.strictObject({
  kind: z.literal('capacitor'),
  min: tuned(),
  max: tuned(),
  law: z.enum(['capacitance', 'wavelength', 'frequency'], { error: 'Give capacitance, wavelength or frequency.' }),
  turn,
});

const foilKeys = {
  kind: z.literal('foil'),
  layers,
  min: tuned().optional(),
  tan: value(LIMITS.lossTangent, 'a loss tangent from 0 to 1').optional(),
  travel: value(LIMITS.foilSide, 'a travel from 0.1 mm to 1 m'),
};

const Foil = z.discriminatedUnion(
  'form',
  [
    z.strictObject({
      ...foilKeys,
      form: z.literal('plates'),
      width: value(LIMITS.foilSide, 'a width from 0.1 mm to 1 m'),
      faces,
    }),
    z.strictObject({
      ...foilKeys,
      form: z.literal('sleeve'),
      innerRadius: value(LIMITS.foilRadius, 'a radius from 0.5 mm to 0.25 m'),
    }),
  ],
  { error: 'Give plates or sleeve.' },
);

const wholeTurns = quantity(1, 1000, 'a whole number of turns from 1 to 1000').int({
  error: 'Give a whole number of turns.',
});

const Tuning = z.discriminatedUnion(
  'kind',
  [
    Capacitor,
    Foil,
    z.strictObject({
      kind: z.literal('inductance'),
      min: value(LIMITS.inductance, 'an inductance from 1 nH to 1 H'),
      max: value(LIMITS.inductance, 'an inductance from 1 nH to 1 H'),
      c: tuned(),
    }),
    z.strictObject({
      kind: z.literal('slider'),
      minTurns: wholeTurns,
      maxTurns: wholeTurns,
      c: z.union([value(LIMITS.sliderC, 'a capacitance from 0 to 10 nF'), Capacitor, Foil]),
    }),
  ],
  { error: 'Give one of capacitor, foil, inductance, slider.' },
);

const Detector = z.strictObject({
  class: z.enum(DETECTOR_CLASSES, { error: `Give one of ${DETECTOR_CLASSES.join(', ')}.` }).optional(),
  is: value(LIMITS.is, 'a saturation current from 1e-12 to 1e-3 A').optional(),
  n: value(LIMITS.n, 'an ideality from 1 to 5').optional(),
  rs: value(LIMITS.rs, 'a resistance from 0 to 10 kilohm').optional(),
  cj: value(LIMITS.cj, 'a capacitance from 0 to 200 pF').optional(),
  vf1mA: value(LIMITS.vf1mA, 'a forward voltage at 1 mA from 0.05 to 0.9 V').optional(),
  measured: z.boolean({ error: 'Give true or false.' }).default(false),
});

const resistance = () => value(LIMITS.phoneR, 'a resistance from 1 ohm to 100 megohm');
const threshold = value(LIMITS.threshold, 'a threshold power in watt').optional();
const coilPhone = {
  rDc: resistance(),
  r: resistance(),
  x: value(LIMITS.phoneX, 'a reactance at 1 kHz in ohm').default(0),
  threshold,
};

const Earphone = z.discriminatedUnion(
  'kind',
  [
    z.strictObject({
      kind: z.literal('ceramic'),
      c: value(LIMITS.ceramicC, 'a capacitance from 10 pF to 500 nF'),
      rDc: resistance().default(20e6),
      threshold,
    }),
    z.strictObject({ kind: z.literal('magnetic'), ...coilPhone }),
    z.strictObject({ kind: z.literal('armature'), ...coilPhone }),
    z.strictObject({ kind: z.literal('dynamic'), ...coilPhone }),
  ],
  { error: 'Give one of ceramic, magnetic, armature, dynamic.' },
);

const field = () => value(LIMITS.field, 'a field from 1 uV/m to 100 V/m');

/** The shape of a design without the rules that tie two of its keys together. */
const DesignShape = z.strictObject({
  format: z.literal('coilyard-design/1', { error: 'Give coilyard-design/1.' }),
  name: z.string({ error: 'Give a text.' }).max(200, { error: 'Give at most 200 characters.' }).optional(),
  band: Band,
  aerial: Aerial,
  earth: Earth.default({ kind: 'resistance', r: 50 }),
  coupling: Coupling,
  detectorAt: z.enum(['top', 'tap'], { error: 'Give top or tap.' }).default('top'),
  coil: Coil,
  tuning: Tuning,
  padder: value(LIMITS.padder, 'a capacitance from 0.1 pF to 100 nF').optional(),
  trimmer: value(LIMITS.padder, 'a capacitance from 0.1 pF to 100 nF').optional(),
  stray: value(LIMITS.stray, 'a capacitance from 0 to 1 nF').default(0),
  detector: Detector,
  earphone: Earphone,
  transformer: z
    .strictObject({
      ratio: value(LIMITS.ratio, 'a ratio from 1 to 500'),
      primaryR: value(LIMITS.transformerR, 'a winding resistance from 0.1 ohm to 1 megohm'),
      primaryL: value(LIMITS.transformerL, 'an inductance from 1 mH').optional(),
      loss: value(LIMITS.transformerLoss, 'a loss from 0 to 60 dB').default(0),
    })
    .optional(),
  returnResistor: value(LIMITS.returnResistor, 'a resistance from 100 ohm to 100 megohm').optional(),
  bypass: value(LIMITS.bypass, 'a capacitance from 1 pF to 1 uF').optional(),
  place: z
    .strictObject({
      field: field().default(0.01),
      stations: z
        .array(
          z.strictObject({
            name: z.string({ error: 'Give a name.' }).max(200, { error: 'Give at most 200 characters.' }),
            f: quantity(10e3, 50e6, 'a frequency from 10 kHz to 50 MHz'),
            field: field(),
          }),
        )
        .max(50, { error: 'Give at most fifty stations.' })
        .default([]),
    })
    .optional(),
  temperature: value(LIMITS.temperature, 'a temperature from 233 to 373 K').default(293.15),
});

/** The design file, `coilyard-design/1`, with every limit of evaluate.md. All issues of a file are listed at once. */
export const Design = DesignShape.superRefine(
  (design, context) => {
    for (const { path, message } of crossIssues(design)) {
      context.addIssue({ code: 'custom', path: path === '' ? [] : path.split('.'), message });
    }
  },
  // Also where a key is already wrong, so that a file's errors come all together; crossIssues reads with care.
  { when: () => true },
);

export type DesignInput = z.input<typeof Design>;
export type Design = z.output<typeof Design>;
export type Aerial = Design['aerial'];
export type Coupling = Design['coupling'];
export type Tuning = Design['tuning'];
export type GangForm = z.output<typeof Capacitor> | z.output<typeof Foil>;
export type FoilForm = z.output<typeof Foil>;
