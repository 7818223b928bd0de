import { type Actor, must, personIdOf } from '../access';
import { forbidden } from '../problem';
import { record, write } from '../record';
import type { Instant } from '../time';
import { endSessionUntil } from './attempts';
import * as rows from './rows';

/** Signs the person out of every browser, this one too. */
export async function signOutEverywhere(actor: Actor): Promise<{ done: true }> {
  must(actor, 'account.change-own');
  const id = personIdOf(actor);
  if (id === null) throw forbidden('You are signed out already.');
  return write(actor, async (tx) => {
    await rows.changeAndEndSessions(tx.sql, id);
    await record(tx, 'person.signed-out-everywhere', { subject: { kind: 'person', id } });
    return { done: true };
  });
}

/** Ends one session for good: a copy of its cookie opens nothing any more. */
export async function endSession(
  actor: Actor,
  session: { sessionId: string; personId: string; endsAt: Instant },
): Promise<void> {
  must(actor, 'account.sign-in');
  await write(actor, async (tx) => {
    await endSessionUntil(tx, session.sessionId, session.endsAt);
    await record(tx, 'person.signed-out', { subject: { kind: 'person', id: session.personId } });
  });
}
