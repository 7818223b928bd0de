import { DownloadDesign } from '@/components/bench/download-design';
import { partWords } from '@/components/bench/part-words';
import { Disclosure } from '@/components/ui/disclosure';
import { Facts } from '@/components/ui/figure-text';
import { Panel } from '@/components/ui/panel';
import { Table } from '@/components/ui/table';
import type { Sheet } from '@/services/check/schemas';
import { quantityWords } from '@/services/kits/rules';
import { grouped, showQuantity } from '@/services/quantity';

/** What the verdict was worked out from, and how to work it out again. */
export function SheetFacts({ sheet }: { sheet: Sheet }) {
  const { verdict, content } = sheet;
  const { circuit, lines } = content;
  const { winding } = circuit;
  return (
    <Panel title="What was judged" ground="open" level={3} className="border-t-0! pt-0!">
      <Facts
        facts={[
          {
            term: 'Winding',
            value: `${winding.turns} turns, ${winding.pitch === null ? 'close' : showQuantity(winding.pitch, 'mm')}, ${showQuantity(verdict.coil.l, 'μH')}`,
          },
          { term: 'Aerial', value: `${circuit.aerial.vertical} m up, ${circuit.aerial.horizontal} m along` },
          {
            term: 'Earth',
            value: circuit.earth.kind === 'none' ? 'none' : showQuantity(circuit.earth.r.nominal, 'Ω'),
          },
          { term: 'Boxes tried', value: `${grouped(verdict.boxes)}, seed ${verdict.seed}` },
          { term: 'Engine', value: `${verdict.engine}, rules ${verdict.rules.version}` },
          {
            term: 'Content',
            value: <span className="font-figures">{sheet.contentHash.slice(0, 8).toUpperCase()}</span>,
          },
        ]}
      />
      <p className="mt-2">
        <DownloadDesign content={content} />
      </p>
      <Disclosure summary={`Its ${lines.length} lines`} className="mt-2">
        <Table
          caption="Lines of the version as they were sent"
          density="tight"
          rows={lines}
          rowKey={({ reference }) => reference}
          columns={[
            { key: 'reference', head: 'Line', isRowHead: true, cell: ({ reference }) => reference },
            { key: 'part', head: 'Part', cell: ({ part }) => (part ? `${part.code} ${part.name}` : 'none') },
            {
              key: 'value',
              head: 'Value',
              cell: ({ part }) => {
                const words = part && partWords(part.values);
                return words?.value === undefined ? '' : `${words.value} ${words.unit ?? ''}`;
              },
            },
            {
              key: 'quantity',
              head: 'In the box',
              figures: true,
              cell: ({ part, quantity }) => quantityWords(quantity, part?.unit ?? 'each'),
            },
          ]}
        />
      </Disclosure>
    </Panel>
  );
}
