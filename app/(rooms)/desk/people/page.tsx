import type { Metadata } from 'next';
import { view } from '@/app/view';
import { InviteForm } from '@/components/account/invite-form';
import { InvitationTable } from '@/components/account/invitation-table';
import { PeopleTable } from '@/components/account/people-table';
import { Panel } from '@/components/ui/panel';
import { listPeople } from '@/services/people';
import { inviteStaff } from './actions';

export const metadata: Metadata = { title: 'People' };

export default async function PeoplePage() {
  const { staff, invitations, needsCode } = await view(listPeople);
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-8 sm:px-6">
      <h1 className="font-display text-page">People</h1>
      <div className="mt-6 grid items-start gap-8 lg:grid-cols-[2fr_1fr]">
        <div className="grid gap-8">
          <PeopleTable staff={staff} />
          {invitations.length > 0 && <InvitationTable invitations={invitations} />}
        </div>
        <Panel title="Invite somebody" note="A mail leads them to a password and a second factor of their own.">
          <InviteForm needsCode={needsCode} onInvite={inviteStaff} />
        </Panel>
      </div>
    </main>
  );
}
