import { type Actor, must } from '../access';
import { env } from '../env';
import { PersonId } from '../ids';
import { missing, parse } from '../problem';
import { reading, record, write } from '../record';
import * as rows from './rows';
import { firstScreen } from './rules';
import type { PersonView } from './schemas';

/** In any other installation these doors do not exist. */
function refuseOutsideDemo(): void {
  if (env().COILYARD_DEMO !== '1') throw missing('There is nothing here. Go back to the front of the shop.');
}

/** Signs in as one of the demo's people by a button. Missing unless the installation is a demo. */
export async function signInDemo(actor: Actor, input: { personId: string }): Promise<{ personId: PersonId }> {
  must(actor, 'demo.sign-in');
  refuseOutsideDemo();
  const personId = parse(PersonId, input.personId);
  return write(actor, async (tx) => {
    const person = await rows.getPerson(tx.sql, personId);
    if (person.disabledAt !== null) throw missing('This person has left the yard. Choose another one.');
    await record({ ...tx, actor: rows.toActor(person) }, 'person.signed-in', {
      subject: { kind: 'person', id: person.id },
      after: { by: 'demo' },
    });
    return { personId: person.id };
  });
}

export interface DemoPersonView {
  person: PersonView;
  /** Where the sign-in leads. */
  room: string;
}

/** Everybody the demo can be, staff first. Missing unless the installation is a demo. */
export async function listDemoPeople(actor: Actor): Promise<DemoPersonView[]> {
  must(actor, 'demo.sign-in');
  refuseOutsideDemo();
  const sql = reading();
  const people = [...(await rows.listPersons(sql, 'staff')), ...(await rows.listPersons(sql, 'customer', 8))];
  return people
    .filter((person) => person.disabledAt === null)
    .map((person) => ({ person: rows.toPersonView(person), room: firstScreen(person) }));
}
