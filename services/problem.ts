import type { z } from 'zod';

export type ProblemKind =
  'invalid' | 'refused' | 'forbidden' | 'missing' | 'conflict' | 'too-large' | 'busy' | 'unavailable';

/** Sentences by field path ("lines.0.quantity"), for the form that sent it. */
export type FieldSentences = Record<string, string>;

/** What a problem looks like on the wire: to a form, or inside application/problem+json. */
export interface ProblemView {
  kind: ProblemKind;
  sentence: string;
  fields?: FieldSentences;
  /** The other person's values, when somebody changed the same thing meanwhile. */
  current?: unknown;
  /** Matches a line in the log, when the cause is not the reader's doing. */
  id?: string;
}

const status: Record<ProblemKind, number> = {
  invalid: 400,
  refused: 409,
  forbidden: 403,
  missing: 404,
  conflict: 409,
  'too-large': 413,
  busy: 503,
  unavailable: 503,
};

/** The one error family of the product: a kind and a sentence that tells the reader what to do. */
export class Problem extends Error {
  readonly kind: ProblemKind;
  readonly fields?: FieldSentences;
  readonly current?: unknown;

  constructor(kind: ProblemKind, sentence: string, more: { fields?: FieldSentences; current?: unknown } = {}) {
    super(sentence);
    this.name = 'Problem';
    this.kind = kind;
    if (more.fields) this.fields = more.fields;
    if (more.current !== undefined) this.current = more.current;
  }

  get status(): number {
    return status[this.kind];
  }

  view(): ProblemView {
    return {
      kind: this.kind,
      sentence: this.message,
      ...(this.fields && { fields: this.fields }),
      ...(this.current !== undefined && { current: this.current }),
    };
  }
}

export const invalid = (sentence: string, fields?: FieldSentences) =>
  new Problem('invalid', sentence, fields ? { fields } : {});
export const refused = (sentence: string) => new Problem('refused', sentence);
export const forbidden = (sentence: string) => new Problem('forbidden', sentence);
export const tooLarge = (sentence: string) => new Problem('too-large', sentence);
export const missing = (sentence: string) => new Problem('missing', sentence);
export const conflict = (sentence: string, current: unknown) => new Problem('conflict', sentence, { current });

/** Throws one refusal that carries every reason, or nothing when there is none. */
export function refuseIfAny(reasons: readonly string[]): void {
  if (reasons.length > 0) throw refused(reasons.join(' '));
}

/** Parses with a schema; what does not fit becomes one Problem with a sentence at each field. */
export function parse<S extends z.ZodType>(schema: S, input: unknown): z.output<S> {
  const result = schema.safeParse(input);
  if (result.success) return result.data;
  const fields: FieldSentences = {};
  for (const issue of result.error.issues) {
    const path = issue.path.map(String).join('.') || 'form';
    fields[path] ??= issue.message;
  }
  throw invalid('Some fields need another look. Each says what it asks for.', fields);
}
