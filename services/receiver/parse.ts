import type { z } from 'zod';
import { Design } from './design';
import { InvalidInput, type Issue } from './invalid-input';

type ZodIssue = z.core.$ZodIssue;

/** Reads a design; throws `InvalidInput` with every issue found, each at its dotted path. */
export function parseDesign(input: unknown): Design {
  const parsed = Design.safeParse(input);
  if (parsed.success) return parsed.data;
  throw new InvalidInput(issuesOf(parsed.error.issues));
}

/** Zod's issues as path and sentence: unions resolved to the branch that was meant, unknown keys one by one. */
export function issuesOf(found: readonly ZodIssue[], prefix: readonly PropertyKey[] = []): Issue[] {
  const issues: Issue[] = [];
  const seen = new Set<string>();
  const say = (path: readonly PropertyKey[], message: string): void => {
    const dotted = path.map(String).join('.');
    if (seen.has(dotted)) return;
    seen.add(dotted);
    issues.push({ path: dotted, message });
  };
  for (const issue of found) {
    const path = [...prefix, ...issue.path];
    if (issue.code === 'unrecognized_keys') {
      for (const key of issue.keys) say([...path, key], 'This key is not part of the form: take it out.');
    } else if (issue.code === 'invalid_union' && issue.errors.length > 0) {
      for (const inner of issuesOf(meant(issue.errors), path)) say(inner.path.split('.'), inner.message);
    } else if (issue.code === 'invalid_union') {
      // A discriminator of no branch; the schema's own sentence lists the kinds.
      say(
        path,
        issue.message.startsWith('Invalid') ? 'This kind does not exist here: choose one of the form.' : issue.message,
      );
    } else if (issue.message.startsWith('Invalid input')) {
      say(
        path,
        issue.code === 'invalid_type' ? `Give ${kindWord(issue.expected)} here.` : 'This value does not belong here.',
      );
    } else {
      say(path, issue.message);
    }
  }
  return issues;
}

/** The branch of a union that fits best: one whose own kind matched, so that its issues lie deeper or are of range. */
function meant(branches: readonly (readonly ZodIssue[])[]): readonly ZodIssue[] {
  const close = branches.find(
    (branch) => !branch.some((issue) => issue.code === 'invalid_type' && issue.path.length === 0),
  );
  return close ?? branches[0] ?? [];
}

function kindWord(expected: string): string {
  if (expected === 'object' || expected === 'record') return 'an object';
  if (expected === 'array' || expected === 'tuple') return 'a list';
  return expected === 'string' ? 'a text' : `a ${expected}`;
}
