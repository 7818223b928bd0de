import { type Actor, type Role, must, personIdOf } from '../access';
import { newId } from '../ids';
import * as mail from '../mail';
import { forbidden, parse, refused } from '../problem';
import { type Tx, record, write } from '../record';
import { confirmFactor } from './confirm-factor';
import * as rows from './rows';
import * as ways from './way-in-rows';
import { life } from './rules';
import { InviteStaff, SendNewWayIn } from './schemas';
import { hashOf, tokenFor } from './secrets';

/** Invites somebody to the staff by mail, with roles. Refused for an address that has an account. */
export async function inviteStaff(actor: Actor, input: InviteStaff): Promise<{ email: string }> {
  must(actor, 'person.invite');
  const { name, email, roles, code } = parse(InviteStaff, input);
  return write(actor, async (tx) => {
    await confirmFactor(tx, code);
    const known = await rows.findPerson(tx.sql, { email });
    if (known?.kind === 'staff') throw refused(`${known.name} is on the staff already. Change the roles in the list.`);
    if (known) throw refused('A customer uses this address. Staff need one of their own; ask for another one.');
    await invite(tx, { name, email, roles });
    return { email };
  });
}

/** Mails a staff member who lost password or authenticator an invitation that sets both anew. */
export async function sendNewWayIn(actor: Actor, input: SendNewWayIn): Promise<{ email: string }> {
  must(actor, 'person.invite');
  const { personId, code } = parse(SendNewWayIn, input);
  return write(actor, async (tx) => {
    await confirmFactor(tx, code);
    const person = await rows.getPerson(tx.sql, personId);
    if (person.kind !== 'staff') throw refused('Customers ask for a one-time link on the sign-in page themselves.');
    if (person.disabledAt !== null) throw refused(`Signing in is off for ${person.name}. Turn it on first.`);
    await invite(tx, person);
    return { email: person.email };
  });
}

async function invite(tx: Tx, to: { name: string; email: string; roles: readonly Role[] }): Promise<void> {
  const invitedBy = personIdOf(tx.actor);
  if (invitedBy === null) throw forbidden('Only a person can invite somebody.');
  const { name, email, roles } = to;
  const id = newId();
  const tokenHash = hashOf(tokenFor('invitation', id));
  await ways.insertInvitation(
    tx.sql,
    { id, name, email, roles, invitedBy, expiresAt: tx.now + life.invitation, tokenHash },
    tx.now,
  );
  await record(tx, 'staff.invited', { subject: { kind: 'invitation', id }, after: { name, roles: [...roles] } });
  await mail.queue(tx, 'invitation', { invitationId: id }, id);
}
