'use client';

import { signOut } from 'next-auth/react';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorPanel } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import type { PersonView } from '@/services/people/schemas';
import { enter, goOn, loadAnew } from './enter';

export interface DemoPerson {
  person: PersonView;
  room: string;
}

/** A button for everybody the demo can be, and one for somebody nobody knows yet. */
export function DemoPeople({ staff, customers }: { staff: readonly DemoPerson[]; customers: readonly DemoPerson[] }) {
  const [going, setGoing] = useState<string | null>(null);
  const [fault, setFault] = useState<string | null>(null);

  async function signInAs({ person, room }: DemoPerson): Promise<void> {
    setGoing(person.id);
    setFault(null);
    const answer = await enter('demo', { personId: person.id });
    if (answer.ok) return goOn(room);
    setFault(answer.problem.sentence);
    setGoing(null);
  }

  async function comeAsGuest(): Promise<void> {
    setGoing('guest');
    await signOut({ redirect: false });
    loadAnew('/');
  }

  const button = (one: DemoPerson) => (
    <li key={one.person.id}>
      <Button
        className="w-full justify-start! py-2 text-left"
        pending={going === one.person.id}
        onClick={() => void signInAs(one)}
      >
        {`Sign in as ${one.person.name}, ${workOf(one.person)}`}
      </Button>
    </li>
  );
  return (
    <div className="grid gap-6">
      {fault !== null && <ErrorPanel title="Not signed in">{fault}</ErrorPanel>}
      <div className="grid items-start gap-6 md:grid-cols-2">
        <Panel title="The yard" note="Each goes to the room of their work.">
          <ul className="grid gap-3">{staff.map(button)}</ul>
        </Panel>
        <Panel title="Buyers" note="They see the shop and their own orders.">
          <ul className="grid gap-3">
            {customers.map(button)}
            <li>
              <Button className="w-full justify-start!" pending={going === 'guest'} onClick={() => void comeAsGuest()}>
                Come in as a new guest
              </Button>
            </li>
          </ul>
        </Panel>
      </div>
    </div>
  );
}

const workOf = (person: PersonView) => (person.kind === 'customer' ? 'customer' : person.roles.join(' and '));
