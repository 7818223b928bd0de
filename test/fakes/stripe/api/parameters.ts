import { z } from 'zod';
import { invalidRequest, type ApiError } from '../errors';
import { nameOf, type FormTree } from './form';

/** Everything arrives as text; these say how each piece is read and what the provider calls a wrong one. */
function checked(holds: (value: string) => boolean, code: string, sentence: (value: string) => string) {
  return z.string().superRefine((value, context) => {
    if (holds(value)) return;
    context.addIssue({ code: 'custom', message: sentence(value), params: { code } });
  });
}

export const text = (longest = 5000) =>
  checked(
    (value) => value !== '',
    'parameter_invalid_empty',
    () => 'An empty text was given. Leave it out instead.',
  ).refine((value) => value.length <= longest, {
    error: `Invalid string: it must be at most ${longest} characters.`,
    params: { code: 'parameter_invalid_string' },
  });
export const integer = checked(
  (value) => /^-?\d{1,15}$/.test(value),
  'parameter_invalid_integer',
  (value) => `Invalid integer: ${value}`,
).transform(Number);
export const positive = integer.refine((value) => value >= 1, {
  error: 'This value must be greater than or equal to 1.',
  params: { code: 'parameter_invalid_integer' },
});
export const amount = integer.refine((value) => value >= 0 && value <= 99_999_999, {
  error: 'This value must be between 0 and 99999999.',
  params: { code: 'parameter_invalid_integer' },
});
export const flag = z.enum(['true', 'false']).transform((value) => value === 'true');
export const address = checked(
  isWebAddress,
  'url_invalid',
  () => 'Not a valid URL. It must begin with http:// or https://.',
);
export const email = checked(
  (value) => /^[^\s@]+@[^\s@]+$/.test(value),
  'email_invalid',
  (value) => `Invalid email address: ${value}`,
);
export const currency = checked(isCurrency, 'currency_invalid', (value) => `Invalid currency: ${value}`).transform(
  (value) => value.toLowerCase(),
);

const emptyOr = <T extends z.ZodType>(schema: T) => z.union([z.literal('').transform(() => undefined), schema]);

/** Numbered keys look like a list once decoded; they are keys like any other. */
const unlisted = (value: unknown) => (Array.isArray(value) ? { ...value } : value);
export const metadata = emptyOr(
  z
    .preprocess(unlisted, z.record(z.string().max(40), z.string().max(500)))
    .refine((all) => Object.keys(all).length <= 50, {
      error: 'Metadata can have up to 50 keys.',
    }),
);

export const expand = z.array(z.string()).max(20).optional();
const range = z.strictObject({
  gt: integer.optional(),
  gte: integer.optional(),
  lt: integer.optional(),
  lte: integer.optional(),
});
export const page = {
  limit: integer.pipe(z.number().min(1).max(100)).optional(),
  starting_after: text().optional(),
  ending_before: text().optional(),
  expand,
};
export const created = z.union([integer, range]).optional();
export const onlyExpand = z.strictObject({ expand });

/** A parameter the provider knows and the stand-in does not play: better refused than quietly ignored. */
export const notPlayed = z
  .unknown()
  .refine((value) => value === undefined, {
    error: 'The provider knows this parameter, its local stand-in does not play it. Leave it out.',
    params: { code: 'parameter_unknown' },
  })
  .optional();

export function readParameters<S extends z.ZodType>(schema: S, tree: FormTree): z.output<S> {
  const read = schema.safeParse(tree);
  if (read.success) return read.data;
  throw refusal(deepest(read.error.issues), tree);
}

/** Inside a choice of shapes the provider speaks of the shape that got furthest. */
function deepest(issues: z.core.$ZodIssue[]): z.core.$ZodIssue | undefined {
  const issue = issues[0];
  if (issue?.code !== 'invalid_union') return issue;
  const inner = issue.errors.map((branch) => deepest(branch)).filter((found) => found !== undefined);
  const best = inner.sort((a, b) => b.path.length - a.path.length)[0];
  return best && { ...best, path: [...issue.path, ...best.path] };
}

function refusal(issue: z.core.$ZodIssue | undefined, tree: FormTree): ApiError {
  if (!issue) return invalidRequest('Invalid parameters.');
  if (issue.code === 'unrecognized_keys') {
    const param = nameOf([...issue.path, issue.keys[0] ?? '']);
    return invalidRequest(`Received unknown parameter: ${param}`, { code: 'parameter_unknown', param });
  }
  const param = nameOf(issue.path);
  if (valueAt(tree, issue.path) === undefined) {
    return invalidRequest(`Missing required param: ${param}.`, { code: 'parameter_missing', param });
  }
  if (issue.code === 'custom') {
    const code = typeof issue.params?.['code'] === 'string' ? issue.params['code'] : undefined;
    return invalidRequest(issue.message, { code, param });
  }
  if (issue.code === 'invalid_value') {
    return invalidRequest(`Invalid ${param}: must be one of ${issue.values.map(String).join(', ')}`, { param });
  }
  return invalidRequest(`Invalid ${param}: ${issue.message}`, { param });
}

function valueAt(tree: FormTree, path: readonly PropertyKey[]): FormTree | undefined {
  let here: FormTree | undefined = tree;
  for (const key of path) {
    if (here === undefined || typeof here === 'string') return undefined;
    here = Array.isArray(here) ? here[Number(key)] : here[String(key)];
  }
  return here;
}

function isWebAddress(value: string): boolean {
  return URL.canParse(value) && /^https?:$/.test(new URL(value).protocol);
}

function isCurrency(value: string): boolean {
  return Intl.supportedValuesOf('currency').includes(value.toUpperCase());
}
