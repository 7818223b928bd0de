import { Table } from '@/components/ui/table';
import type { InvitationView } from '@/services/people/schemas';
import { showMoment } from '@/services/time';

export function InvitationTable({ invitations }: { invitations: readonly InvitationView[] }) {
  return (
    <Table
      caption="Invited, not here yet"
      captionShown
      rows={invitations}
      rowKey={(invitation) => invitation.id}
      columns={[
        { key: 'name', head: 'Name', isRowHead: true, cell: (invitation) => invitation.name },
        { key: 'email', head: 'E-mail', cell: (invitation) => invitation.email, className: 'break-all' },
        { key: 'roles', head: 'Roles', cell: (invitation) => invitation.roles.join(', ') },
        { key: 'by', head: 'Invited by', cell: (invitation) => invitation.invitedBy },
        { key: 'until', head: 'Works until', cell: (invitation) => showMoment(invitation.expiresAt) },
      ]}
    />
  );
}
