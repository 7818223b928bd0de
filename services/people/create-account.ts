import { type Actor, must } from '../access';
import { PersonId, newId } from '../ids';
import { parse } from '../problem';
import { record, write } from '../record';
import { sendLink } from './ask-for-link';
import * as rows from './rows';
import { CreateAccount } from './schemas';
import type { Visit } from './visit';

/**
 * Opens a customer's account and mails the first one-time link. The account has no password until its holder, who has
 * shown to read that mail, chooses one. The answer is the same for an address that has an account already.
 */
export async function createAccount(actor: Actor, input: CreateAccount, visit: Visit): Promise<{ email: string }> {
  must(actor, 'account.create');
  const { name, email } = parse(CreateAccount, input);
  return write(actor, async (tx) => {
    const known = await rows.findPerson(tx.sql, { email });
    if (!known) {
      const id = PersonId.parse(newId());
      const person = {
        id,
        kind: 'customer',
        name,
        email,
        roles: [],
        passwordHash: null,
        sealedFactor: null,
        factorStep: 0,
      } as const;
      await rows.insertPerson(tx.sql, person, tx.now);
      await record(tx, 'account.created', {
        subject: { kind: 'person', id },
        after: rows.forRecord({ ...person, disabledAt: null }),
      });
    }
    await sendLink(tx, email, visit);
    return { email };
  });
}
