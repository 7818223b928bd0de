import { type Actor, must } from '../access';
import { refused } from '../problem';
import { reading } from '../record';
import * as rows from './rows';

/** The owner who has been here longest: in whose name a command sets what only an owner may set. */
export async function ownerOfYard(actor: Actor): Promise<Actor> {
  must(actor, 'first-owner.create');
  const staff = await rows.listPersons(reading(), 'staff');
  const owners = staff.filter((person) => person.roles.includes('owner') && person.disabledAt === null);
  const [first] = owners.sort((a, b) => a.createdAt - b.createdAt);
  if (!first) throw refused('The yard has no owner yet. Run npm run first-owner first.');
  return rows.toActor(first);
}
