import { revalidatePath } from 'next/cache';
import { headers } from 'next/headers';
import { unstable_rethrow } from 'next/navigation';
import type { Action } from '@/components/forms/action-result';
import type { Actor } from '@/services/access';
import { currentActor } from '@/services/people';
import { problemOf } from './problem-of';
import { refuseForeign } from './own-request';

interface Options {
  /** Pages that show what the deed changed: "/bench", or a pattern such as "/bench/[version]". */
  refresh?: readonly string[];
}

/**
 * Makes a server action of a deed: finds who acts, checks that the request is ours, calls the deed, answers a value or
 * a problem. It does not parse: the deed does, so that every way in meets the same gate.
 */
export function action<Input, Value>(
  deed: (actor: Actor, input: Input) => Promise<Value>,
  { refresh = [] }: Options = {},
): Action<Input, Value> {
  return async (input) => {
    try {
      refuseForeign(await headers());
      const value = await deed(await currentActor(), input);
      for (const path of refresh) {
        if (path.includes('[')) revalidatePath(path, 'page');
        else revalidatePath(path);
      }
      return { ok: true, value };
    } catch (error) {
      unstable_rethrow(error);
      return { ok: false, problem: problemOf(error) };
    }
  };
}
