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
  await sql('people').where({ id: personId }).update(change).increment('session_version', 1);
}

export async function removePassword(sql: Knex, personId: string): Promise<void> {
  await sql('people')
    .where({ id: personId, kind: 'customer' })
    .update({ password_hash: null })
    .increment('session_version', 1);
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
