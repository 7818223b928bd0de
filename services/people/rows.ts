import type { Knex } from 'knex';
import { type Actor, type Role, roles as allRoles } from '../access';
import { PersonId } from '../ids';
import { missing } from '../problem';
import type { Instant } from '../time';
import type { PersonView } from './schemas';

/** A person with what only deeds may see. */
export interface Person extends PersonView {
  passwordHash: string | null;
  sealedFactor: string | null;
  factorStep: number;
  sessionVersion: number;
}

interface PersonRow {
  id: string;
  kind: 'staff' | 'customer';
  email: string;
  name: string;
  password_hash: string | null;
  totp_secret: string | null;
  totp_step: number;
  session_version: number;
  created_at: number;
  disabled_at: number | null;
}

const columns = [
  'id',
  'kind',
  'email',
  'name',
  'password_hash',
  'totp_secret',
  'totp_step',
  'session_version',
  'created_at',
  'disabled_at',
] as const;

const isRole = (text: string): text is Role => allRoles.some((role) => role === text);

async function toPerson(sql: Knex, row: PersonRow): Promise<Person> {
  return {
    id: PersonId.parse(row.id),
    kind: row.kind,
    email: row.email,
    name: row.name,
    roles: row.kind === 'staff' ? await rolesOf(sql, row.id) : [],
    createdAt: row.created_at,
    disabledAt: row.disabled_at,
    passwordHash: row.password_hash,
    sealedFactor: row.totp_secret,
    factorStep: row.totp_step,
    sessionVersion: row.session_version,
  };
}

async function rolesOf(sql: Knex, personId: string): Promise<Role[]> {
  const rows = await sql('person_roles').where({ person_id: personId }).select<{ role: Role }[]>('role');
  return allRoles.filter((role) => rows.some((row) => row.role === role));
}

export async function findPerson(sql: Knex, where: { id: string } | { email: string }): Promise<Person | null> {
  const row = await sql('people')
    .where(where)
    .first<PersonRow>(...columns);
  return row ? toPerson(sql, row) : null;
}

export async function getPerson(sql: Knex, id: string): Promise<Person> {
  const person = await findPerson(sql, { id });
  if (!person) throw missing('Nobody of that kind is here. Go back to the list of people.');
  return person;
}

export async function listPersons(sql: Knex, kind: 'staff' | 'customer', most = 500): Promise<Person[]> {
  const rows = await sql('people')
    .where({ kind })
    .orderBy('name')
    .orderBy('id')
    .limit(most)
    .select<PersonRow[]>(...columns);
  return Promise.all(rows.map((row) => toPerson(sql, row)));
}

export async function insertPerson(
  sql: Knex,
  person: Pick<Person, 'id' | 'kind' | 'email' | 'name' | 'roles' | 'passwordHash' | 'sealedFactor' | 'factorStep'>,
  at: Instant,
): Promise<void> {
  await sql('people').insert({
    id: person.id,
    kind: person.kind,
    email: person.email,
    name: person.name,
    password_hash: person.passwordHash,
    totp_secret: person.sealedFactor,
    totp_step: person.factorStep,
    session_version: 1,
    created_at: at,
    disabled_at: null,
  });
  await replaceRoles(sql, person.id, person.roles);
}

export async function replaceRoles(sql: Knex, personId: string, roles: readonly Role[]): Promise<void> {
  await sql('person_roles').where({ person_id: personId }).delete();
  if (roles.length > 0) await sql('person_roles').insert(roles.map((role) => ({ person_id: personId, role })));
}

/** Ends every session of the person with the same stroke that changes what they rest on. */
export async function changeAndEndSessions(
  sql: Knex,
  personId: string,
  change: { password_hash?: string; totp_secret?: string; totp_step?: number; disabled_at?: Instant | null } = {},
): Promise<void> {
  await sql('people')
    .where({ id: personId })
    .update({ ...change, session_version: sql.raw('session_version + 1') });
}

export async function removePassword(sql: Knex, personId: string): Promise<void> {
  await sql('people')
    .where({ id: personId, kind: 'customer' })
    .update({ password_hash: null, session_version: sql.raw('session_version + 1') });
}

export async function replaceHash(sql: Knex, personId: string, from: string, to: string): Promise<void> {
  await sql('people').where({ id: personId, password_hash: from }).update({ password_hash: to });
}

/** Uses up a step of the second factor; false when somebody was there before with this step or a later one. */
export async function useFactorStep(sql: Knex, personId: string, step: number): Promise<boolean> {
  const changed = await sql('people')
    .where({ id: personId })
    .andWhere('totp_step', '<', step)
    .update({ totp_step: step });
  return changed === 1;
}

export async function countOwners(sql: Knex, without: string): Promise<number> {
  const row = await sql('person_roles')
    .join('people', 'people.id', 'person_roles.person_id')
    .where('person_roles.role', 'owner')
    .whereNull('people.disabled_at')
    .whereNot('people.id', without)
    .count<{ count: number }[]>({ count: '*' });
  return Number(row[0]?.count ?? 0);
}

export interface Invitation {
  id: string;
  email: string;
  name: string;
  roles: readonly Role[];
  invitedBy: string;
  expiresAt: Instant;
  acceptedAt: Instant | null;
}

interface InvitationRow {
  id: string;
  email: string;
  name: string;
  roles: string;
  invited_by: string;
  expires_at: number;
  accepted_at: number | null;
}

const invitationColumns = ['id', 'email', 'name', 'roles', 'invited_by', 'expires_at', 'accepted_at'] as const;

const toInvitation = (row: InvitationRow): Invitation => ({
  id: row.id,
  email: row.email,
  name: row.name,
  roles: row.roles.split(',').filter(isRole),
  invitedBy: row.invited_by,
  expiresAt: row.expires_at,
  acceptedAt: row.accepted_at,
});

export async function insertInvitation(
  sql: Knex,
  invitation: Omit<Invitation, 'acceptedAt'> & { tokenHash: string },
  at: Instant,
): Promise<void> {
  // A newer invitation takes the place of an older one to the same address.
  await sql('invitations')
    .where({ email: invitation.email, accepted_at: null })
    .andWhere('expires_at', '>', at)
    .update({ expires_at: at });
  await sql('invitations').insert({
    id: invitation.id,
    email: invitation.email,
    name: invitation.name,
    roles: invitation.roles.join(','),
    token_hash: invitation.tokenHash,
    invited_by: invitation.invitedBy,
    created_at: at,
    expires_at: invitation.expiresAt,
    accepted_at: null,
  });
}

export async function findInvitation(
  sql: Knex,
  where: { id: string } | { token_hash: string },
): Promise<Invitation | null> {
  const row = await sql('invitations')
    .where(where)
    .first<InvitationRow>(...invitationColumns);
  return row ? toInvitation(row) : null;
}

export async function listOpenInvitations(sql: Knex, at: Instant): Promise<Invitation[]> {
  const rows = await sql('invitations')
    .whereNull('accepted_at')
    .andWhere('expires_at', '>', at)
    .orderBy('created_at')
    .orderBy('id')
    .limit(200)
    .select<InvitationRow[]>(...invitationColumns);
  return rows.map(toInvitation);
}

/** True for the one who accepts first, in time. */
export async function markAccepted(sql: Knex, id: string, at: Instant): Promise<boolean> {
  const changed = await sql('invitations')
    .where({ id, accepted_at: null })
    .andWhere('expires_at', '>', at)
    .update({ accepted_at: at });
  return changed === 1;
}

export async function insertLink(
  sql: Knex,
  link: { tokenHash: string; personId: string; browserHash: string; expiresAt: Instant },
  at: Instant,
): Promise<void> {
  await sql('sign_in_links').insert({
    token_hash: link.tokenHash,
    person_id: link.personId,
    browser_hash: link.browserHash,
    created_at: at,
    expires_at: link.expiresAt,
    used_at: null,
  });
}

export interface Link {
  personId: string;
  expiresAt: Instant;
}

export async function findLink(sql: Knex, tokenHash: string): Promise<Link | null> {
  const row = await sql('sign_in_links')
    .where({ token_hash: tokenHash })
    .first<{ person_id: string; expires_at: number }>('person_id', 'expires_at');
  return row ? { personId: row.person_id, expiresAt: row.expires_at } : null;
}

/** True for the first use, in time and in the browser that asked. */
export async function useLink(sql: Knex, tokenHash: string, browserHash: string, at: Instant): Promise<boolean> {
  const changed = await sql('sign_in_links')
    .where({ token_hash: tokenHash, browser_hash: browserHash, used_at: null })
    .andWhere('expires_at', '>', at)
    .update({ used_at: at });
  return changed === 1;
}

/** What a page knows of the person who asks: no secrets in it. */
export function toActor(person: Person): Actor {
  const { id, name, email } = person;
  return person.kind === 'staff'
    ? { kind: 'staff', id, name, email, roles: person.roles }
    : { kind: 'customer', id, name, email };
}

export const toPersonView = (person: Person): PersonView => ({
  id: person.id,
  kind: person.kind,
  name: person.name,
  email: person.email,
  roles: person.roles,
  createdAt: person.createdAt,
  disabledAt: person.disabledAt,
});

/** How the record of changes writes a person down: who and what they may, no hash, no address. */
export const forRecord = (person: Pick<Person, 'name' | 'kind' | 'roles' | 'disabledAt'>) => ({
  name: person.name,
  kind: person.kind,
  roles: [...person.roles],
  disabledAt: person.disabledAt,
});

/** The key (a session that was ended, say) is refused until its moment has passed. */
export async function isRefused(sql: Knex, key: string, at: Instant): Promise<boolean> {
  const row = await sql('attempts')
    .where({ key })
    .andWhere('not_before', '>', at)
    .first<{ key: string } | undefined>('key');
  return row !== undefined;
}
