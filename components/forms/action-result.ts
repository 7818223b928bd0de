import type { ProblemView } from '@/services/problem';

/** What a server action answers: the deed's value, or the problem in words. It never throws at the browser. */
export type ActionResult<Value> = { ok: true; value: Value } | { ok: false; problem: ProblemView };

export type Action<Input, Value> = (input: Input) => Promise<ActionResult<Value>>;
