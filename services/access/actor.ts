import type { PersonId } from '../ids';

export const roles = ['designer', 'checker', 'packer', 'owner'] as const;
export type Role = (typeof roles)[number];

/** Who asks. Built in one place (`people.currentActor`, or a worker's `systemActor`) and handed to every deed and read. */
export type Actor =
  | { kind: 'visitor' }
  | { kind: 'customer'; id: PersonId; name: string; email: string }
  | { kind: 'staff'; id: PersonId; name: string; email: string; roles: readonly Role[] }
  | { kind: 'system'; name: SystemName };

export type SystemName = 'stripe' | 'worker' | 'command';

export const visitor: Actor = { kind: 'visitor' };
export const systemActor = (name: SystemName): Actor => ({ kind: 'system', name });

export const hasRole = (actor: Actor, role: Role) => actor.kind === 'staff' && actor.roles.includes(role);

/** The person's id, or null for a visitor or a system actor. */
export const personIdOf = (actor: Actor): PersonId | null => ('id' in actor ? actor.id : null);

/** How the record of changes names somebody: "Isolde Hark", "visitor", "stripe". */
export const nameOf = (actor: Actor) => ('name' in actor ? actor.name : 'visitor');
