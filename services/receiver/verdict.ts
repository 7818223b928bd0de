import { z } from 'zod';

const number = z.number();
const maybe = z.number().nullable();
const ends = z.strictObject({ lo: number, hi: number });

export const SEVERITIES = ['stop', 'note', 'info'] as const;

export const Change = z.strictObject({ path: z.string(), from: z.json(), to: z.json() });

export const Finding = z.strictObject({
  code: z.string(),
  severity: z.enum(SEVERITIES),
  path: z.string(),
  value: maybe,
  limit: maybe,
  unit: z.string(),
  message: z.string(),
  remedy: z.strictObject({ text: z.string(), changes: z.array(Change) }).nullable(),
});

/** The outcome of an evaluation, `coilyard-verdict/1`; a number that does not exist is null. */
export const Verdict = z.strictObject({
  format: z.literal('coilyard-verdict/1'),
  engine: z.string(),
  rules: z.strictObject({ version: z.string(), digest: z.string() }),
  seed: number,
  boxes: number,
  digest: z.string(),
  outcome: z.enum(['clears', 'stops']),
  reach: z.strictObject({ nominal: ends, corners: ends, aerialHalf: ends, aerialDouble: ends }),
  margins: ends,
  /** Null in a first verdict without the boxes. */
  share: z.strictObject({ covered: number, boxes: number, low: number, high: number }).nullable(),
  limits: z.array(z.strictObject({ path: z.string(), end: z.enum(['lo', 'hi']), share: number })),
  coil: z.strictObject({
    l: number,
    sections: z.array(z.array(number)),
    q: maybe,
    cSelf: number,
    selfResonance: maybe,
    wireLength: maybe,
    length: maybe,
    rDc: maybe,
  }),
  points: z.array(
    z.strictObject({
      f: number,
      c: number,
      turns: maybe,
      q: maybe,
      qUnloaded: maybe,
      bandwidth: maybe,
      adjacent: maybe,
      sourceR: maybe,
      inputR: maybe,
      gain: maybe,
    }),
  ),
  detector: z.strictObject({ zeroBiasR: number, vf1mA: number, relative: maybe }),
  earphone: z.strictObject({ outputR: maybe, powerShare: maybe, voltageShare: maybe, corner: maybe, level: maybe }),
  findings: z.array(Finding),
});

export type Verdict = z.infer<typeof Verdict>;
export type Finding = z.infer<typeof Finding>;
export type Change = z.infer<typeof Change>;
export type Severity = Finding['severity'];
export type Point = Verdict['points'][number];
