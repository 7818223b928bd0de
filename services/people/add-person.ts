import { type Actor, must } from '../access';
import { PersonId, newId } from '../ids';
import { parse, refused } from '../problem';
import { reading, record, write } from '../record';
import { hashPassword } from './password';
import * as rows from './rows';
import { AddPerson } from './schemas';
import { enrolmentUri, newFactor } from './second-factor';
import { seal } from './secrets';

/** What a command prints once for the person it made. */
export interface Added {
  personId: PersonId;
  /** Secret of the second factor; null for customers. */
  secret: string | null;
  uri: string | null;
}

/** Makes a person without a mail. Only commands may: a first owner, the people of the demo. */
export async function addPerson(actor: Actor, input: AddPerson): Promise<Added> {
  must(actor, 'first-owner.create');
  const wanted = parse(AddPerson, input);
  const { kind, name, email } = wanted;
  const id = PersonId.parse(newId());
  const roles = wanted.kind === 'staff' ? wanted.roles : [];
  const secret = wanted.kind === 'staff' ? (wanted.secret ?? newFactor()) : null;
  const passwordHash = wanted.password === undefined ? null : await hashPassword(wanted.password);
  const sealedFactor = secret === null ? null : seal(secret, id);

  await write(actor, async (tx) => {
    const known = await rows.findPerson(tx.sql, { email });
    if (known) throw refused(`${known.name} has this address already. Take another one.`);
    await rows.insertPerson(
      tx.sql,
      { id, kind, name, email, roles, passwordHash, sealedFactor, factorStep: 0 },
      tx.now,
    );
    const after = rows.forRecord({ kind, name, roles, disabledAt: null });
    await record(tx, 'person.added', { subject: { kind: 'person', id }, after });
  });
  return { personId: id, secret, uri: secret === null ? null : enrolmentUri(secret, email) };
}

/** The owner a new installation begins with. Refused once there is one: owners are invited after that. */
export async function createFirstOwner(
  actor: Actor,
  input: { name: string; email: string; password: string },
): Promise<Added> {
  must(actor, 'first-owner.create');
  if ((await rows.countOwners(reading(), '')) > 0) {
    throw refused('The yard has an owner. Sign in as owner and invite others under Desk, People.');
  }
  return addPerson(actor, { kind: 'staff', ...input, roles: ['owner'] });
}
