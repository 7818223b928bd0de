import { type Actor, type Role, systemActor } from '@/services/access';
import { newId, type PersonId } from '@/services/ids';
import { addPerson } from '@/services/people';
import { setClock } from '@/services/record';
import { days } from '@/services/time';
import { customers, staff } from './people';

/** The demo's clock: the yard's story begins six weeks before it is told. */
const begun = Date.now() - days(42);
let moment = begun;

export function startClock(): void {
  setClock(() => moment);
}
export const endClock = () => setClock(undefined);

/** Moves the story on; never backwards, and never past now. */
export function goTo(day: number, hour = 9, minute = 0): void {
  const next = begun + days(day) + hour * 3_600_000 + minute * 60_000 - (begun % days(1));
  moment = Math.min(Math.max(moment, next), Date.now());
}
export function pass(minutes: number): void {
  moment = Math.min(moment + minutes * 60_000, Date.now());
}

/** Always the same numbers, so that every demo yard is the same. */
export function dice(seed: number): (below: number) => number {
  let state = seed >>> 0;
  return (below) => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) % below;
  };
}

const people = new Map<string, Actor>();

export function as(name: string): Actor {
  const actor = people.get(name);
  if (!actor) throw new Error(`Nobody in the demo yard is called ${name}.`);
  return actor;
}

/** Passwords that nobody knows: the demo signs in through its own page. */
const password = () => `${newId()}-${newId()}`;

export async function hirePeople(): Promise<void> {
  const command = systemActor('command');
  for (const { name, email, roles } of staff) {
    const { personId } = await addPerson(command, { kind: 'staff', name, email, roles, password: password() });
    people.set(name, staffActor(personId, name, email, roles));
  }
  for (const { name, email } of customers) {
    const { personId } = await addPerson(command, { kind: 'customer', name, email, password: password() });
    people.set(name, { kind: 'customer', id: personId, name, email });
  }
}

const staffActor = (id: PersonId, name: string, email: string, roles: Role[]): Actor => ({
  kind: 'staff',
  id,
  name,
  email,
  roles,
});
