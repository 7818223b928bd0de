'use client'; // Drawn whole: parts of a server-drawn picture that stream in later come in an inline style, which the CSP drops.

import { Plate } from '@/components/devices/plate';
import { Empty } from '@/components/ui/empty';
import { TextLink } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { Table } from '@/components/ui/table';
import type { LotTrace } from '@/services/packing/schemas';
import { showDate } from '@/services/time';
import { boxStateWords } from './box-state-words';

/** From a lot to every box that a piece of it stayed in. */
export function LotTraceView({ trace }: { trace: LotTrace }) {
  const count = trace.boxes.length;
  return (
    <section className="grid gap-4">
      <h2 className="font-display text-section">
        Lot <span className="font-figures">{trace.lotCode}</span>, {trace.name}
      </h2>
      <p>
        <span className="font-figures">{trace.partCode}</span> from {trace.supplier}, received{' '}
        {showDate(trace.receivedAt)}. In {count === 1 ? 'one box' : `${count} boxes`}.
      </p>
      {trace.state === 'blocked' && (
        <Notice kind="stops" size="floor" title="This lot is blocked">
          Nobody may use it. Boxes still in the house stay open until its pieces are exchanged.
        </Notice>
      )}
      {count === 0 ? (
        <Empty title="In no box yet">Pieces of this lot lie in the store, or went back to it.</Empty>
      ) : (
        <Table
          caption={`Boxes with pieces of lot ${trace.lotCode}`}
          density="floor"
          rows={trace.boxes}
          rowKey={(box) => box.serial}
          columns={[
            {
              key: 'serial',
              head: 'Box',
              isRowHead: true,
              cell: (box) => (
                <TextLink href={`/packing/trace/${box.serial}`} className="font-figures">
                  {box.serial}
                </TextLink>
              ),
            },
            {
              key: 'plate',
              head: 'Version',
              cell: (box) => <Plate kit={box.plate.kitNumber} version={box.plate.letter} size="row" />,
            },
            { key: 'state', head: 'Where', cell: (box) => boxStateWords[box.state] },
            { key: 'order', head: 'Order', cell: (box) => <span className="font-figures">{box.orderNumber}</span> },
            ...(trace.boxes.some((box) => box.buyer !== null)
              ? [{ key: 'buyer', head: 'Buyer', cell: (box: LotTrace['boxes'][number]) => box.buyer ?? '' }]
              : []),
            { key: 'amount', head: 'Of this lot', figures: true, cell: (box) => box.amount },
          ]}
        />
      )}
    </section>
  );
}
