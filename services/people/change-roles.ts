import { type Actor, must, personIdOf } from '../access';
import * as mail from '../mail';
import { parse, refuseIfAny, refused } from '../problem';
import { record, write } from '../record';
import { confirmFactor } from './confirm-factor';
import * as rows from './rows';
import { rolesBlockers } from './rules';
import { ChangeRoles, type PersonView } from './schemas';

/**
 * Gives a staff member other roles, or turns signing in off or on. What the person has open ends at once. Refused when
 * the yard would be left without an owner, and for taking the owner role from oneself.
 */
export async function changeRoles(actor: Actor, input: ChangeRoles): Promise<PersonView> {
  must(actor, 'person.change-roles');
  const { personId, roles, disabled, code } = parse(ChangeRoles, input);
  return write(actor, async (tx) => {
    await confirmFactor(tx, code);
    const person = await rows.getPerson(tx.sql, personId);
    if (person.kind !== 'staff') throw refused('Only staff have roles. Invite this person under another address.');
    const ownersLeft = await rows.countOwners(tx.sql, personId);
    const isSelf = personIdOf(actor) === personId;
    refuseIfAny(rolesBlockers({ isSelf, before: person.roles, after: disabled ? [] : roles, ownersLeft }));

    await rows.replaceRoles(tx.sql, personId, roles);
    const disabledAt = disabled ? (person.disabledAt ?? tx.now) : null;
    await rows.changeAndEndSessions(tx.sql, personId, { disabled_at: disabledAt });
    const after = await rows.getPerson(tx.sql, personId);
    const change = { before: rows.forRecord(person), after: rows.forRecord(after) };
    await record(tx, 'person.roles-changed', { subject: { kind: 'person', id: personId }, ...change });
    await mail.queue(tx, 'account-changed', { personId, change: 'roles' }, `roles:${personId}:${after.sessionVersion}`);
    return rows.toPersonView(after);
  });
}
