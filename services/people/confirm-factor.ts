import { personIdOf } from '../access';
import { env } from '../env';
import { forbidden, invalid } from '../problem';
import type { Tx } from '../record';
import * as rows from './rows';
import { stepOf } from './second-factor';
import { unseal } from './secrets';

/** The demo signs people in by a button: they hold no authenticator, so none is asked for. */
export const needsFreshCode = (): boolean => env().COILYARD_DEMO !== '1';

/** A step before rights change hands: the one who acts shows a fresh code, whatever the session says. */
export async function confirmFactor(tx: Tx, code: string): Promise<void> {
  if (!needsFreshCode()) return;
  const id = personIdOf(tx.actor);
  const person = id === null ? null : await rows.findPerson(tx.sql, { id });
  if (!person?.sealedFactor) throw forbidden('Only staff with a second factor can do this.');
  const step = stepOf(unseal(person.sealedFactor, person.id), code, tx.now, person.factorStep);
  if (step !== null && (await rows.useFactorStep(tx.sql, person.id, step))) return;
  throw invalid('This needs a fresh code. Nothing was changed.', {
    code: 'Not the code of the moment, or used already. Wait for the next one in your authenticator.',
  });
}
