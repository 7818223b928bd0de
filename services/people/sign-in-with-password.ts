import { type Actor, must } from '../access';
import type { PersonId } from '../ids';
import { parse, refused } from '../problem';
import { type Tx, reading, record, write } from '../record';
import { clearOldTries, countInWindow, countTry, forgetTries } from './attempts';
import { hashPassword, isWeaker, verifyPassword } from './password';
import * as rows from './rows';
import { allowance } from './rules';
import { Origin, SignIn } from './schemas';
import { stepOf } from './second-factor';
import { blind, knownDevice, unseal } from './secrets';

/** One sentence for an unknown address, a wrong password, a wrong or used code, and somebody who left. */
const doesNotFit = 'That does not fit.';

/**
 * Signs in by address and password, staff with a code of their second factor as well. Refused with the same answer
 * and after the same work whatever did not fit; refused with a wait after some failures in a row.
 */
export async function signInWithPassword(actor: Actor, input: SignIn, origin: Origin): Promise<{ personId: PersonId }> {
  must(actor, 'account.sign-in');
  const { email, password, code } = parse(SignIn, input);
  const from = parse(Origin, origin);
  const found = await rows.findPerson(reading(), { email });
  // A device this person has signed in from has a counter of its own: an attack from elsewhere does not keep it out.
  const device = found ? knownDevice(from.device, found.id) : null;
  const key = device === null ? `account:${blind(email)}` : `device:${blind(device)}`;

  await write(actor, async (tx) => {
    await countInWindow(tx, `sign-in-from:${blind(from.address)}`, allowance.signInFromAddress);
    await countTry(tx, key);
    await clearOldTries(tx);
  });

  const person = found?.disabledAt === null ? found : null;
  const fits = await verifyPassword(person?.passwordHash ?? null, password);
  if (!person || !fits) throw refused(doesNotFit);
  const stronger = person.passwordHash && isWeaker(person.passwordHash) ? await hashPassword(password) : null;

  return write(actor, async (tx) => {
    if (person.kind === 'staff') await useFactor(tx, person, code);
    await forgetTries(tx, key);
    if (stronger && person.passwordHash) await rows.replaceHash(tx.sql, person.id, person.passwordHash, stronger);
    await record({ ...tx, actor: rows.toActor(person) }, 'person.signed-in', {
      subject: { kind: 'person', id: person.id },
      after: { by: 'password' },
    });
    return { personId: person.id };
  });
}

/** Accepts a code of the second factor once; refuses with the sentence of a wrong password otherwise. */
async function useFactor(tx: Tx, person: rows.Person, code: string): Promise<void> {
  if (person.sealedFactor === null || code === '') throw refused(doesNotFit);
  const step = stepOf(unseal(person.sealedFactor, person.id), code, tx.now, person.factorStep);
  if (step === null || !(await rows.useFactorStep(tx.sql, person.id, step))) throw refused(doesNotFit);
}
