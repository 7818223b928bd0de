import { type Actor, must, personIdOf } from '../access';
import { env } from '../env';
import { missing } from '../problem';
import { now, reading } from '../record';
import { needsFreshCode } from './confirm-factor';
import * as rows from './rows';
import * as ways from './way-in-rows';
import type { AccountView, PeopleView, PersonView } from './schemas';
import { hashOf, tokenFor } from './secrets';

/** Staff and open invitations, for the owner. */
export async function listPeople(actor: Actor): Promise<PeopleView> {
  must(actor, 'person.list');
  const sql = reading();
  const staff = await rows.listPersons(sql, 'staff');
  const names = new Map<string, string>(staff.map((person) => [person.id, person.name]));
  const invitations = await ways.listOpenInvitations(sql, now());
  return {
    staff: staff.map(rows.toPersonView),
    invitations: invitations.map(({ id, name, email, roles, invitedBy, expiresAt }) => ({
      id,
      name,
      email,
      roles,
      expiresAt,
      invitedBy: names.get(invitedBy) ?? 'the yard',
    })),
    needsCode: needsFreshCode(),
  };
}

/** One of the staff, for the page that changes roles. */
export async function readStaff(actor: Actor, personId: string): Promise<{ person: PersonView; needsCode: boolean }> {
  must(actor, 'person.list');
  const person = await rows.getPerson(reading(), personId);
  if (person.kind !== 'staff') throw missing('Nobody of the staff is here. Go back to the list of people.');
  return { person: rows.toPersonView(person), needsCode: needsFreshCode() };
}

/** One's own account. */
export async function readAccount(actor: Actor): Promise<AccountView> {
  must(actor, 'account.read-own');
  const id = personIdOf(actor);
  if (id === null) throw missing('Sign in to see your account.');
  const person = await rows.getPerson(reading(), id);
  return { ...rows.toPersonView(person), hasPassword: person.passwordHash !== null };
}

export interface LinkMailView {
  name: string;
  email: string;
  link: string;
}

/** What the mail with a one-time link says; null when the link is over before the mail went out. */
export async function readLinkForMail(actor: Actor, linkId: string): Promise<LinkMailView | null> {
  must(actor, 'mail.send');
  const token = tokenFor('sign-in-link', linkId);
  const link = await ways.findLink(reading(), hashOf(token));
  if (!link || link.expiresAt <= now()) return null;
  const person = await rows.getPerson(reading(), link.personId);
  return { name: person.name, email: person.email, link: address(`/sign-in/link?token=${token}`) };
}

/** What the mail with an invitation says; null when it was used or replaced meanwhile. */
export async function readInvitationForMail(
  actor: Actor,
  invitationId: string,
): Promise<(LinkMailView & { roles: readonly string[] }) | null> {
  must(actor, 'mail.send');
  const invitation = await ways.findInvitation(reading(), { id: invitationId });
  if (!invitation || invitation.acceptedAt !== null || invitation.expiresAt <= now()) return null;
  const { name, email, roles } = invitation;
  return { name, email, roles, link: address(`/invitations/${tokenFor('invitation', invitationId)}`) };
}

/** Whom a mail about an account goes to. */
export async function readPersonForMail(actor: Actor, personId: string): Promise<LinkMailView> {
  must(actor, 'mail.send');
  const person = await rows.getPerson(reading(), personId);
  return { name: person.name, email: person.email, link: address('/sign-in') };
}

const address = (path: string): string => new URL(path, env().COILYARD_URL).toString();
