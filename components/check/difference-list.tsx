import { Panel } from '@/components/ui/panel';
import { Table } from '@/components/ui/table';
import type { Difference } from '@/services/kits/rules';

/** What this version does otherwise than the one it was started from. */
export function DifferenceList({ letter, differences }: { letter: string; differences: readonly Difference[] }) {
  return (
    <Panel title={`Against ${letter}`} ground="open" level={3}>
      {differences.length === 0 ? (
        <p>Nothing differs.</p>
      ) : (
        <Table
          caption={`What differs from ${letter}`}
          density="tight"
          rows={differences}
          rowKey={({ what }) => what}
          columns={[
            {
              key: 'what',
              head: 'What',
              isRowHead: true,
              cell: ({ what }) => what.charAt(0).toLocaleUpperCase('en-GB') + what.slice(1),
            },
            { key: 'from', head: `In ${letter}`, cell: ({ from }) => from ?? 'not there' },
            { key: 'to', head: 'Now', cell: ({ to }) => to ?? 'taken out' },
          ]}
        />
      )}
    </Panel>
  );
}
