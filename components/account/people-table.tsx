import { TextLink } from '@/components/ui/link-button';
import { Table } from '@/components/ui/table';
import { Tag } from '@/components/ui/tag';
import type { PersonView } from '@/services/people/schemas';
import { showDate } from '@/services/time';

export function PeopleTable({ staff }: { staff: readonly PersonView[] }) {
  return (
    <Table
      caption="Staff"
      captionShown
      rows={staff}
      rowKey={(person) => person.id}
      columns={[
        {
          key: 'name',
          head: 'Name',
          isRowHead: true,
          cell: (person) => <TextLink href={`/desk/people/${person.id}`}>{person.name}</TextLink>,
        },
        { key: 'email', head: 'E-mail', cell: (person) => person.email, className: 'break-all' },
        { key: 'roles', head: 'Roles', cell: (person) => person.roles.join(', ') },
        { key: 'since', head: 'Here since', cell: (person) => showDate(person.createdAt) },
        {
          key: 'in',
          head: 'Signing in',
          cell: (person) => (person.disabledAt === null ? 'On' : <Tag tone="dashed">Off</Tag>),
        },
      ]}
    />
  );
}
