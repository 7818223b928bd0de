import { type Actor, type Role, systemActor, visitor } from '@/services/access';
import { PersonId } from '@/services/ids';
import * as people from '@/services/people';
import { codeAt } from '@/services/people/second-factor';
import { now } from '@/services/record';

export const command = systemActor('command');
export const origin = (address = '192.0.2.7', device: string | null = null) => ({ address, device });
export const visit = (browser = 'a browser of its own', address = '192.0.2.7') => ({ browser, address });

export const passwords = { staff: 'osk-4-light', customer: 'quay horse lantern' };

export interface Known {
  id: PersonId;
  email: string;
  actor: Actor;
  secret: string;
}

let count = 0;

/** A staff member with password and second factor, as a command makes one. */
export async function aStaffMember(name: string, roles: Role[]): Promise<Known> {
  const email = `${name.split(' ')[0]?.toLowerCase() ?? 'staff'}-${++count}@yard.example`;
  const added = await people.addPerson(command, { kind: 'staff', name, email, roles, password: passwords.staff });
  const actor: Actor = { kind: 'staff', id: added.personId, name, email, roles };
  return { id: added.personId, email, actor, secret: added.secret ?? '' };
}

export async function aCustomer(name: string, password: string | undefined = passwords.customer): Promise<Known> {
  const email = `${name.split(' ')[0]?.toLowerCase() ?? 'customer'}-${++count}@home.example`;
  const added = await people.addPerson(command, { kind: 'customer', name, email, ...(password && { password }) });
  return { id: added.personId, email, actor: { kind: 'customer', id: added.personId, name, email }, secret: '' };
}

export const signIn = (email: string, password: string, code = '', from = origin()) =>
  people.signInWithPassword(visitor, { email, password, code }, from);

export const codeOf = (person: Known, at = now()) => codeAt(person.secret, at);
