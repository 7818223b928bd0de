import { newId } from '@/services/ids';
import { log } from '@/services/log';
import { Problem, type ProblemView } from '@/services/problem';

/** What the reader is told of any error. What is not the reader's doing is logged under a number that both see. */
export function problemOf(error: unknown): ProblemView {
  if (error instanceof Problem) return error.view();
  const id = newId();
  log().error({ errorId: id, error }, 'a deed failed');
  return {
    kind: 'unavailable',
    sentence: 'Something broke on our side. Nothing was changed and what you typed is kept; try again in a moment.',
    id,
  };
}
