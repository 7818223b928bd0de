import type { z } from 'zod';
import type { ProblemView } from '@/services/problem';

export type { ProblemView };

/** A price step as it is typed. */
export interface TypedStep {
  from: string;
  price: string;
}

/** A failed check in the browser, in the form that the server's answer has. */
export function fieldsOf(error: z.ZodError): ProblemView {
  const fields: Record<string, string> = {};
  for (const issue of error.issues) {
    const path = issue.path.map(String).join('.');
    // Text where money is asked for: the schema's own words would speak of objects.
    fields[path] ??=
      /\.unit$/.test(path) && issue.code === 'invalid_type' ? 'Give an amount, like 38.00.' : sentenceOf(issue);
  }
  return { kind: 'invalid', sentence: 'Some fields need another look.', fields };
}

const sentenceOf = (issue: { code: string; message: string }) =>
  issue.code === 'invalid_type' ? 'Give a whole number.' : issue.message;
