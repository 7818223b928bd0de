import type { ZodType } from 'zod';
import { PartValues, type PART_KINDS } from '@/services/parts/schemas';
import { type FieldSentences, Problem, parse } from '@/services/problem';
import type { TypedValues } from './part-field';
import { firstEarphone, firstValues } from './part-fields';

/** What the schema says of what was typed, by field; nothing where it fits. */
export function sentencesOf(schema: ZodType, typed: unknown): FieldSentences {
  try {
    parse(schema, typed);
    return {};
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    return error.fields ?? { form: error.message };
  }
}

/** The id of the field that a path of the schema is typed in. */
export const idOf = (path: string) => `part-${path.split('.').slice(0, 2).join('-').replace('cost-minor', 'cost')}`;

/** What was typed so far as the kind's values; while something is missing, the kind's usual ones, to know the fields. */
export function asValues(values: TypedValues, kind: (typeof PART_KINDS)[number]): PartValues {
  if (kind === 'earphone') return firstEarphone(values['earphoneKind'] === 'ceramic' ? 'ceramic' : 'magnetic');
  return firstValues(kind);
}

/** What the picture beside the values shows: the drawing chosen for hardware, else the kind's own. */
export function pictured(values: TypedValues, kind: (typeof PART_KINDS)[number]): PartValues {
  const typed = PartValues.safeParse(values);
  return typed.success ? typed.data : asValues(values, kind);
}
