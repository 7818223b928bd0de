import { z } from 'zod';

const share = z.number().min(0).max(1);
const decibels = z.number().min(-200).max(200);
const above = z.number().positive().finite();

/** A set of thresholds. Product decisions, not physics: `receiver.md` H, D, E7 and F give the reasons. */
export const Rules = z.strictObject({
  version: z.string().min(1).max(60),
  /** Margin asked at both ends, relative: at nominal values and at the corners. */
  guardNominal: share,
  guardCorner: z.number().min(-0.5).max(1),
  /** Share of boxes that must be sure to cover, and the confidence of that limit. */
  yieldTarget: share,
  yieldConfidence: z.number().min(0.5).max(0.9999),
  /** Share of the variance above which a part should have been measured. */
  dataShare: share,
  lotSmall: z.number().int().min(2).max(1000),
  adjacentNote: decibels,
  strongStation: decibels,
  loadedQ: above,
  /** Self-resonance is a note below this multiple of the band's upper edge. */
  selfResonanceSpan: above,
  detectorStop: share,
  detectorNote: share,
  forwardStop: above,
  forwardNote: above,
  powerStop: share,
  powerNote: share,
  voltageStop: share,
  voltageNote: share,
  returnMin: above,
  returnMax: above,
  lowpassStop: above,
  lowpassNote: above,
  damping: share,
  levelNote: decibels,
  levelInfo: decibels,
  /** Bare former asked at each end of a winding, metre. */
  formerMargin: z.number().min(0).max(1),
});

export type Rules = z.infer<typeof Rules>;

export const rules: Rules = {
  version: '2026-12-01',
  guardNominal: 0.01,
  guardCorner: 0,
  yieldTarget: 0.99,
  yieldConfidence: 0.95,
  dataShare: 0.1,
  lotSmall: 10,
  adjacentNote: -1,
  strongStation: -6,
  loadedQ: 15,
  selfResonanceSpan: 2,
  detectorStop: 0.15,
  detectorNote: 0.4,
  forwardStop: 0.5,
  forwardNote: 0.42,
  powerStop: 0.1,
  powerNote: 0.3,
  voltageStop: 0.03,
  voltageNote: 0.1,
  returnMin: 10e3,
  returnMax: 1e6,
  lowpassStop: 80,
  lowpassNote: 300,
  damping: 0.3,
  levelNote: 40,
  levelInfo: 50,
  formerMargin: 0.005,
};
