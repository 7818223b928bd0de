import type { Knex } from 'knex';
import { type Role, roles as allRoles } from '../access';
import type { Instant } from '../time';

const isRole = (text: string): text is Role => allRoles.some((role) => role === text);

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
