import { z } from 'zod';
import { type Actor, must } from '../access';
import { invalid, parse } from '../problem';
import { InvalidInput, Verdict, evaluate } from '../receiver';

/** What `POST /api/v1/evaluations` takes beside the design, in the query. */
export const EvaluationQuery = z.strictObject({
  seed: z.coerce.number().int().min(0).max(4_294_967_295).default(1),
  boxes: z.coerce
    .number()
    .int()
    .min(400, 'Try 400 to 20000 boxes.')
    .max(20_000, 'Try 400 to 20000 boxes.')
    .default(2_000),
});

export interface EvaluationRequest {
  design: unknown;
  query: unknown;
}

/** The verdict on a design file; what the file cannot be evaluated for is one problem with a sentence for each path. */
export async function evaluateDesign(actor: Actor, { design, query }: EvaluationRequest): Promise<Verdict> {
  must(actor, 'evaluation.run');
  const { seed, boxes } = parse(EvaluationQuery, query);
  try {
    return evaluate(design, { seed, boxes });
  } catch (error) {
    if (!(error instanceof InvalidInput)) throw error;
    const fields: Record<string, string> = {};
    for (const { path, message } of error.issues) fields[path || 'design'] ??= message;
    throw invalid('The design cannot be evaluated. Each path says what it asks for.', fields);
  }
}
