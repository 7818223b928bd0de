'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useId, useState } from 'react';
import {
  type DefaultValues,
  type FieldErrors,
  type FieldValues,
  type Path,
  type UseFormRegisterReturn,
  useForm,
} from 'react-hook-form';
import type { z } from 'zod';
import type { ProblemView } from '@/services/problem';
import type { Action } from './action-result';

export interface ActionFormOptions<Input extends FieldValues, Value> {
  /** The domain's own schema of the deed: what the server will say is said here first. */
  schema: z.ZodType<unknown, Input>;
  action: Action<Input, Value>;
  defaultValues: DefaultValues<Input>;
  /** What follows a deed that was done: go somewhere, say it, empty the form. */
  onDone?: (value: Value) => void;
}

export interface SummaryLine {
  fieldId?: string | undefined;
  sentence: string;
}

/**
 * A form that sends a deed: checks each field when it is left, shows the server's sentences by their fields and moves
 * to the summary, and keeps everything typed whatever the answer is.
 */
export function useActionForm<Input extends FieldValues, Value>(options: ActionFormOptions<Input, Value>) {
  const { schema, action, defaultValues, onDone } = options;
  const formId = useId();
  const [attempt, setAttempt] = useState(0);
  const [problem, setProblem] = useState<ProblemView | null>(null);
  const [done, setDone] = useState(0);
  const form = useForm<Input>({
    // Raw: the deed gets what was typed and parses it itself.
    resolver: zodResolver<Input, unknown, unknown>(schema, undefined, { raw: true }),
    defaultValues,
    mode: 'onBlur',
    reValidateMode: 'onBlur',
    shouldFocusError: false,
  });
  const { errors, isSubmitting } = form.formState;

  const send = async (values: Input): Promise<void> => {
    setProblem(null);
    const answer = await action(values);
    if (answer.ok) {
      setDone((count) => count + 1);
      onDone?.(answer.value);
      return;
    }
    for (const [path, message] of Object.entries(answer.problem.fields ?? {})) {
      form.setError(path as Path<Input>, { type: 'server', message }); // a path of the schema that the server parsed with
    }
    setProblem(answer.problem);
    setAttempt((count) => count + 1);
  };

  const fieldId = (name: string) => `${formId}-${name}`;
  const lines: SummaryLine[] = sentencesOf(errors).map(({ path, sentence }) => ({ fieldId: fieldId(path), sentence }));
  if (problem && lines.length === 0) lines.push({ sentence: problem.sentence });

  return {
    form,
    /** Props of a field: name, handlers, id and its error. */
    field: (name: Path<Input>) => ({
      ...withoutEmptyBlur(form.register(name), attempt),
      id: fieldId(name),
      error: sentencesOf(errors).find(({ path }) => path === name)?.sentence,
    }),
    submit: form.handleSubmit(send, () => setAttempt((count) => count + 1)),
    pending: isSubmitting,
    /** For the error summary at the head of the form: nothing before the first attempt to send it. */
    summary: { attempt, errors: attempt === 0 ? [] : lines },
    problem,
    /** How often the deed was done; above zero the page can say so. */
    done,
  };
}

/** A field passed by and left empty is not told so before the form was sent once. */
const withoutEmptyBlur = <R extends UseFormRegisterReturn>(registered: R, attempt: number): R => ({
  ...registered,
  onBlur: (event: Parameters<R['onBlur']>[0]) =>
    attempt === 0 && event.target.value === '' ? Promise.resolve() : registered.onBlur(event),
});

/** Every sentence with the path of its field, in the order of the form. */
function sentencesOf(errors: FieldErrors, prefix = ''): { path: string; sentence: string }[] {
  return Object.entries(errors).flatMap(([name, error]) => {
    const path = prefix === '' ? name : `${prefix}.${name}`;
    if (typeof error !== 'object' || error === null) return [];
    const message: unknown = 'message' in error ? error.message : undefined;
    if (typeof message === 'string' && message !== '')
      return [{ path: path.replace(/\.root$/, ''), sentence: message }];
    return 'type' in error ? [] : sentencesOf(error as FieldErrors, path); // a group of fields nests the same shape
  });
}
