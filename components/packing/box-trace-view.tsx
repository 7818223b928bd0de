'use client'; // Drawn whole: parts of a server-drawn picture that stream in later come in an inline style, which the CSP drops.

import { Plate } from '@/components/devices/plate';
import { StatusSign } from '@/components/devices/status-sign';
import { WindingMark } from '@/components/devices/winding-mark';
import { TextLink } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { Table } from '@/components/ui/table';
import { grams } from '@/services/packing/rules';
import type { ReactNode } from 'react';
import type { TraceView } from '@/services/packing/schemas';
import { showDate, showMoment } from '@/services/time';
import { boxStateWords } from './box-state-words';

type Line = TraceView['lines'][number];
interface Row {
  line: Line;
  lot: Line['lots'][number] | null;
}

/** A row a lot; a line of which nothing is in yet keeps its own. */
const rowsOf = (line: Line): Row[] =>
  line.lots.length > 0 ? line.lots.map((lot) => ({ line, lot })) : [{ line, lot: null }];

/** A box back to its version, the signature under it, and the lot of every piece. */
export function BoxTraceView({ trace }: { trace: TraceView }) {
  const name = `${trace.plate.kitNumber} ${trace.plate.letter}`;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-8">
      <section className="grid gap-4">
        <div className="flex flex-wrap items-center gap-4">
          <Plate kit={trace.plate.kitNumber} version={trace.plate.letter} size="floor" />
          <h2 className="font-display text-section">
            {trace.plate.kitName}, box <span className="font-figures">{trace.serial}</span>
          </h2>
          <WindingMark state={trace.versionState} />
        </div>
        {!trace.contentHolds && (
          <Notice kind="stops" size="floor" title="The content no longer has its hash">
            What version {name} holds now is not what was signed. Nothing of it may be packed or printed; tell the
            owner.
          </Notice>
        )}
        <dl className="grid gap-x-8 gap-y-4 sm:grid-cols-2 lg:grid-cols-4">
          <Fact name="Where">
            {boxStateWords[trace.state]}
            {trace.shipment && (
              <span className="block text-body">
                {trace.shipment.carrier} <span className="font-figures">{trace.shipment.trackingNumber}</span>,{' '}
                {showMoment(trace.shipment.at)}
              </span>
            )}
          </Fact>
          <Fact name="Order">
            <span className="font-figures">{trace.orderNumber}</span>
            {trace.buyer && (
              <span className="block text-body">
                {[trace.buyer.name, ...trace.buyer.address].join(', ')}
                <span className="block">{trace.buyer.email}</span>
              </span>
            )}
          </Fact>
          <Fact name="Packed">
            {trace.packedBy ?? 'not yet'}
            {trace.closedAt !== null && <span className="block text-body">closed {showMoment(trace.closedAt)}</span>}
            {trace.massMilligrams !== null && (
              <span className="block text-body">
                <span className="font-figures">{grams(trace.massMilligrams)}</span> g on the scale
              </span>
            )}
          </Fact>
          <Fact name="Signed off">
            {trace.signOff ? (
              <>
                {trace.signOff.by}, {showDate(trace.signOff.at)}
                <span className="block text-body">
                  engine {trace.signOff.engineVersion}, rules {trace.signOff.rulesVersion}
                </span>
                <StatusSign
                  kind={trace.signOff.covers ? 'clears' : 'stops'}
                  word={trace.signOff.covers ? 'Signs this content' : 'Signs other content'}
                />
              </>
            ) : (
              'no signature'
            )}
          </Fact>
        </dl>
        <p className="font-figures text-body break-all">content {trace.contentHash}</p>
      </section>
      <section>
        <h3 className="mb-2 font-display text-panel">Lots in this box</h3>
        <Table<Row>
          caption="Lots in this box"
          density="desk"
          className="text-floor"
          rows={trace.lines.flatMap(rowsOf)}
          rowKey={({ line, lot }) => `${line.reference} ${lot?.lotCode ?? ''} ${lot?.binCode ?? ''}`}
          rowTone={({ lot }) => (lot?.blocked ? 'stops' : undefined)}
          columns={[
            { key: 'line', head: 'Line', cell: ({ line }) => <span className="font-figures">{line.reference}</span> },
            {
              key: 'part',
              head: 'Part',
              isRowHead: true,
              cell: ({ line }) => (
                <>
                  {line.name} <span className="font-figures font-normal text-ink2">{line.partCode}</span>
                </>
              ),
            },
            {
              key: 'amount',
              head: 'In the box',
              cell: ({ line, lot }) => (lot ? `${lot.amount} of ${line.needed}` : `none of ${line.needed}`),
            },
            {
              key: 'lot',
              head: 'Lot',
              cell: ({ lot }) =>
                lot ? (
                  <>
                    <TextLink href={`/packing/trace?code=${encodeURIComponent(lot.lotCode)}`} className="font-figures">
                      {lot.lotCode}
                    </TextLink>
                    {lot.blocked && <b className="text-crimson"> blocked</b>}
                  </>
                ) : (
                  ''
                ),
            },
            {
              key: 'supplier',
              head: 'Supplier',
              cell: ({ lot }) => (lot ? `${lot.supplier}, ${showDate(lot.receivedAt)}` : ''),
            },
            { key: 'bin', head: 'Bin', cell: ({ lot }) => <span className="font-figures">{lot?.binCode ?? ''}</span> },
            { key: 'picked', head: 'Picked', cell: ({ lot }) => (lot ? `${showMoment(lot.at)}, ${lot.by}` : '') },
          ]}
        />
      </section>
    </div>
  );
}

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div className="border-t-2 border-ink pt-2">
      <dt className="text-caption text-ink2">{name}</dt>
      <dd className="font-bold">{children}</dd>
    </div>
  );
}
