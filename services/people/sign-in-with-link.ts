import { type Actor, must } from '../access';
import type { PersonId } from '../ids';
import { parse, refused } from '../problem';
import { record, write } from '../record';
import { forgetTries } from './attempts';
import * as rows from './rows';
import * as ways from './way-in-rows';
import { UseLink } from './schemas';
import { blind, hashOf } from './secrets';

const worksOnce =
  'This link does not work here. It works once, for ten minutes, in the browser that asked for it. Ask for a new one.';

/**
 * Uses up a one-time link and signs its customer in. Refused when it was used, is older than ten minutes or comes from
 * another browser than the one that asked. A forgotten password can be removed on the way, which ends other sessions.
 */
export async function signInWithLink(actor: Actor, input: UseLink, browser: string): Promise<{ personId: PersonId }> {
  must(actor, 'account.sign-in');
  const { token, forgetPassword } = parse(UseLink, input);
  return write(actor, async (tx) => {
    const link = await ways.findLink(tx.sql, hashOf(token));
    if (!link || !(await ways.useLink(tx.sql, hashOf(token), hashOf(browser), tx.now))) throw refused(worksOnce);
    const person = await rows.getPerson(tx.sql, link.personId);
    if (person.kind !== 'customer' || person.disabledAt !== null) throw refused(worksOnce);

    const subject = { kind: 'person', id: person.id };
    if (forgetPassword && person.passwordHash !== null) {
      await rows.removePassword(tx.sql, person.id);
      await record(tx, 'password.removed', { subject, reason: 'forgotten, shown by a one-time link' });
    }
    await forgetTries(tx, `account:${blind(person.email)}`);
    await record({ ...tx, actor: rows.toActor(person) }, 'person.signed-in', { subject, after: { by: 'link' } });
    return { personId: person.id };
  });
}
