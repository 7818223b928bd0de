import { z } from 'zod';
import { LIMITS } from './limits';
import { quantity, value, whole } from './value';

const inductance = (words = 'an inductance from 1 nH to 1 H') => value(LIMITS.inductance, words);
const selfCapacitance = value(LIMITS.selfCapacitance, 'a capacitance from 0 to 10 nF');
const q = value(LIMITS.q, 'a Q from 1 to 10000');
const lFactor = value(LIMITS.lFactor, 'a factor from 0.1 to 10');
const turns = whole(1, 1000, 'a whole number of turns from 1 to 1000');
const tap = whole(1, 3000, 'a whole number of turns from the earth end');

const taps = z.strictObject({ aerial: tap.optional(), detector: tap.optional() });

export const Wire = z.strictObject({
  bare: value(LIMITS.wireBare, 'a bare diameter from 0.03 to 3 mm, in metres'),
  overall: value(LIMITS.wireOverall, 'an overall diameter of at least the bare one, up to 5 mm, in metres').optional(),
  strands: whole(1, 5000, 'the number of strands').optional(),
});

const wound = {
  wire: Wire,
  taps: taps.optional(),
  q: q.optional(),
  cSelf: selfCapacitance.optional(),
  lFactor: lFactor.optional(),
};

export const MeasuredCoil = z.strictObject({
  kind: z.literal('measured'),
  l: inductance().optional(),
  sections: z
    .array(z.array(value(LIMITS.mutual, 'an inductance in henry')).min(1).max(3), {
      error: 'Give a matrix of 1 x 1 to 3 x 3 inductances.',
    })
    .min(1)
    .max(3)
    .optional(),
  q: q.optional(),
  r: value(LIMITS.seriesR, 'a series resistance from 1 milliohm to 100 kilohm').optional(),
  cSelf: selfCapacitance.optional(),
  taps: taps.optional(),
  lFactor: lFactor.optional(),
});

export const Solenoid = z.strictObject({
  kind: z.literal('solenoid'),
  turns,
  formerDiameter: value(LIMITS.diameter, 'a former diameter from 3 mm to 0.5 m'),
  pitch: value(
    LIMITS.pitch,
    'a pitch of at least the overall diameter, up to a third of the winding diameter',
  ).optional(),
  formerLength: value(LIMITS.formerLength, 'a former length from 1 mm to 5 m').optional(),
  former: z.enum(['air', 'thin', 'solid', 'damp'], { error: 'Give air, thin, solid or damp.' }).optional(),
  ...wound,
});

export const Spiral = z.strictObject({
  kind: z.literal('spiral'),
  turns,
  innerDiameter: value(LIMITS.diameter, 'an inner diameter from 3 mm to 0.5 m'),
  pitch: value(LIMITS.spiralPitch, 'a pitch of at least the overall diameter'),
  offset: value(LIMITS.faceOffset, 'an offset from 0 to 20 mm').optional(),
  ...wound,
});

export const Multilayer = z.strictObject({
  kind: z.literal('multilayer'),
  innerDiameter: value(LIMITS.diameter, 'an inner diameter from 3 mm to 0.5 m'),
  length: value(LIMITS.windingLength, 'a winding length up to 0.5 m'),
  layers: whole(1, 1000, 'a whole number of layers'),
  turnsPerLayer: whole(1, 3000, 'a whole number of turns a layer'),
  layerPitch: value(LIMITS.layerPitch, 'a pitch between layers of at least the overall diameter'),
  ...wound,
});

export const Rod = z.strictObject({
  kind: z.literal('rod'),
  rodLength: value(LIMITS.rodLength, 'a rod length from 5 mm to 1 m'),
  rodDiameter: value(LIMITS.rodDiameter, 'a rod diameter from 1 mm to 0.1 m'),
  muInitial: value(LIMITS.muInitial, 'an initial permeability from 60 to 1000'),
  al: value(LIMITS.al, 'an inductance for one turn squared, in henry').optional(),
  turns,
  coilLength: value(LIMITS.coilLength, 'a coil length from a tenth to nine tenths of the rod'),
  offset: value(LIMITS.rodOffset, 'a distance from the rod middle, in metres').optional(),
  tanM: value(LIMITS.lossTangent, 'a loss tangent from 0 to 1').optional(),
  ...wound,
});

export const Coil = z.discriminatedUnion('kind', [MeasuredCoil, Solenoid, Spiral, Multilayer, Rod], {
  error: 'Give one of measured, solenoid, spiral, multilayer, rod.',
});

export type Coil = z.output<typeof Coil>;
export type Wire = z.output<typeof Wire>;

export const Primary = z.strictObject({
  kind: z.literal('primary'),
  l: inductance().optional(),
  r: value(LIMITS.primaryR, 'a resistance from 0 to 10 kilohm').optional(),
  k: value(LIMITS.k, 'a coupling above 0, up to 0.98').optional(),
  turns: whole(1, 1000, 'a whole number of turns from 1 to 1000').optional(),
  diameter: value(LIMITS.diameter, 'a mean diameter from 3 mm to 0.5 m').optional(),
  gap: value(LIMITS.gap, 'a gap in metres; minus its own length lies over the earth end').optional(),
  wire: Wire.optional(),
  pitch: value(LIMITS.pitch, 'a pitch of at least the overall diameter').optional(),
});

export type Primary = z.output<typeof Primary>;

export const layers = z
  .array(
    z.tuple(
      [
        value(LIMITS.layerThickness, 'a thickness from 1 um to 20 mm, in metres'),
        value(LIMITS.permittivity, 'a relative permittivity from 1 to 12'),
      ],
      {
        error: 'Give pairs of thickness and relative permittivity.',
      },
    ),
  )
  .min(1, { error: 'Give at least one layer.' })
  .max(12, { error: 'Give at most twelve layers.' });

export const faces = quantity(1, 1000, 'a whole number of faces').int({ error: 'Give a whole number of faces.' });
