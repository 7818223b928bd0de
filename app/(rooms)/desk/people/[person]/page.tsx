import type { Metadata } from 'next';
import { cache } from 'react';
import { view } from '@/app/view';
import { NewWayInForm } from '@/components/account/new-way-in-form';
import { RolesForm } from '@/components/account/roles-form';
import { Breadcrumbs } from '@/components/ui/breadcrumbs';
import { TextLink } from '@/components/ui/link-button';
import { Panel } from '@/components/ui/panel';
import { readStaff } from '@/services/people';
import { changeRoles, sendNewWayIn } from '../actions';

interface Props {
  params: Promise<{ person: string }>;
}

/** Once a request, for the title and the page. */
const load = cache((personId: string) => view((actor) => readStaff(actor, personId)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { person } = await load((await params).person);
  return { title: `${person.name}, people` };
}

export default async function PersonPage({ params }: Props) {
  const { person, needsCode } = await load((await params).person);
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-8 sm:px-6">
      <Breadcrumbs trail={[{ label: 'People', href: '/desk/people' }]} here={person.name} />
      <h1 className="mt-2 font-display text-page">{person.name}</h1>
      <p className="mt-1 break-all text-ink2">{person.email}</p>
      <div className="mt-6 grid items-start gap-6 md:grid-cols-2">
        <Panel title="What they may do" note="Counts from their next click; they sign in again.">
          <RolesForm person={person} needsCode={needsCode} onChange={changeRoles} />
        </Panel>
        <Panel title="Lost password or authenticator" note="An invitation that sets both anew.">
          <NewWayInForm personId={person.id} needsCode={needsCode} onSend={sendNewWayIn} />
        </Panel>
      </div>
      <p className="mt-6">
        <TextLink href={`/desk/changes?kind=person&id=${person.id}`}>What was changed about {person.name}</TextLink>
      </p>
    </main>
  );
}
