import { type Actor, must } from '../access';
import { newId } from '../ids';
import * as mail from '../mail';
import { parse } from '../problem';
import { type Tx, record, write } from '../record';
import { countInWindow } from './attempts';
import * as rows from './rows';
import * as ways from './way-in-rows';
import { allowance, life } from './rules';
import { AskForLink } from './schemas';
import { blind, hashOf, tokenFor } from './secrets';
import type { Visit } from './visit';

/**
 * Mails a one-time link to a customer. The answer, and the work behind it, are the same for an address nobody has and
 * for staff, who are told by mail why no link comes. Refused with a wait when too many were asked for.
 */
export async function askForLink(actor: Actor, input: AskForLink, visit: Visit): Promise<{ email: string }> {
  must(actor, 'account.sign-in');
  const { email } = parse(AskForLink, input);
  return write(actor, async (tx) => {
    await sendLink(tx, email, visit);
    return { email };
  });
}

/** Step: counts, notes the link's hash and queues the mail that will carry it. */
export async function sendLink(tx: Tx, email: string, visit: Visit): Promise<void> {
  await countInWindow(tx, `link-from:${blind(visit.address)}`, allowance.linkFromAddress);
  await countInWindow(tx, `link-for:${blind(email)}`, allowance.linkForAccount);
  const person = await rows.findPerson(tx.sql, { email });
  const linkId = newId();

  if (person?.kind !== 'customer' || person.disabledAt !== null) {
    const reason = person?.kind === 'staff' ? 'staff' : 'no-account';
    await mail.queue(tx, 'no-link', { email, reason }, linkId);
    return;
  }
  const link = {
    tokenHash: hashOf(tokenFor('sign-in-link', linkId)),
    personId: person.id,
    browserHash: hashOf(visit.browser),
    expiresAt: tx.now + life.link,
  };
  await ways.insertLink(tx.sql, link, tx.now);
  await record(tx, 'link.asked-for', { subject: { kind: 'person', id: person.id } });
  await mail.queue(tx, 'sign-in-link', { linkId }, linkId);
}
