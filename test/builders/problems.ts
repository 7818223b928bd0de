import { Problem } from '@/services/problem';

/** The problem a deed is refused with; a deed that is done, or breaks otherwise, fails the test. */
export async function problemOf(deed: Promise<unknown>): Promise<Problem> {
  const error: unknown = await deed.then(
    () => null,
    (thrown: unknown) => thrown,
  );
  if (error instanceof Problem) return error;
  throw error === null ? new Error('The deed was done, though it should be refused.') : error;
}
