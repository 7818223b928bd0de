'use client'; // Drawn whole: parts of a server-drawn picture that stream in later come in an inline style, which the CSP drops.

import type { Action } from '@/components/forms/action-result';
import { Plate } from '@/components/devices/plate';
import { Empty } from '@/components/ui/empty';
import { LinkButton, TextLink } from '@/components/ui/link-button';
import { Table } from '@/components/ui/table';
import type { DispatchView, Ship } from '@/services/packing/schemas';
import { showMoment } from '@/services/time';
import { PartPicture } from './part-picture';
import { ShipForm } from './ship-form';

export interface DispatchListProps {
  dispatch: DispatchView;
  mayShip: boolean;
  onShip: Action<Ship, { shipmentId: string }>;
}

/** Packed orders waiting for the carrier, each with its label and the form that sends it; then what has left. */
export function DispatchList({ dispatch, mayShip, onShip }: DispatchListProps) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-8">
      <div className="flex flex-wrap items-end gap-x-6">
        <h1 className="font-display text-page">Dispatch</h1>
        <p className="pb-2">
          {dispatch.waiting.length === 0
            ? 'Nothing waits for the carrier.'
            : `${dispatch.waiting.length === 1 ? 'One order waits' : `${dispatch.waiting.length} orders wait`} for the carrier.`}
        </p>
      </div>
      {dispatch.waiting.length === 0 && (
        <Empty drawing={<PartPicture family="box" width={110} />} title="Nothing to send">
          An order lands here when the lid of its last box is on.
        </Empty>
      )}
      <ul className="grid gap-6">
        {dispatch.waiting.map((order) => (
          <Parcel key={order.orderId} order={order} mayShip={mayShip} onShip={onShip} />
        ))}
      </ul>
      {dispatch.sent.length > 0 && (
        <section>
          <h2 className="mb-2 font-display text-section">Sent</h2>
          <Table
            caption="Parcels handed over last"
            density="floor"
            rows={dispatch.sent}
            rowKey={(parcel) => parcel.orderId}
            columns={[
              {
                key: 'order',
                head: 'Order',
                isRowHead: true,
                cell: (parcel) => <span className="font-figures">{parcel.orderNumber}</span>,
              },
              { key: 'buyer', head: 'Buyer', cell: (parcel) => parcel.buyer },
              { key: 'carrier', head: 'Carrier', cell: (parcel) => parcel.carrier },
              {
                key: 'tracking',
                head: 'Tracking number',
                cell: (parcel) => <span className="font-figures">{parcel.trackingNumber}</span>,
              },
              {
                key: 'boxes',
                head: 'Boxes',
                cell: (parcel) => (
                  <span className="flex flex-wrap gap-x-4">
                    {parcel.serials.map((serial) => (
                      <TextLink key={serial} href={`/packing/trace/${serial}`} className="font-figures">
                        {serial}
                      </TextLink>
                    ))}
                  </span>
                ),
              },
              { key: 'at', head: 'When', cell: (parcel) => `${showMoment(parcel.at)}, ${parcel.by}` },
            ]}
          />
        </section>
      )}
    </div>
  );
}

type Waiting = DispatchView['waiting'][number];

function Parcel({ order, mayShip, onShip }: Pick<DispatchListProps, 'mayShip' | 'onShip'> & { order: Waiting }) {
  const kilograms = order.boxes.reduce((sum, box) => sum + box.massMilligrams, 0) / 1_000_000;
  return (
    <li className="grid gap-6 rounded-panel border-2 border-ink bg-card p-5 lg:grid-cols-[minmax(0,1fr)_minmax(0,1.1fr)_minmax(0,1fr)]">
      <div>
        <h2 className="font-figures text-[28px] leading-9 font-semibold">{order.orderNumber}</h2>
        <address className="not-italic">
          {[order.buyer, ...order.address].map((line, index) => (
            <span key={index} className="block">
              {line}
            </span>
          ))}
        </address>
        <p className="mt-2">
          {order.delivery}, <span className="font-figures">{kilograms.toFixed(2)}</span> kg
        </p>
      </div>
      <ul className="grid content-start gap-3">
        {order.boxes.map((box) => (
          <li key={box.id} className="flex flex-wrap items-center gap-3">
            <Plate kit={box.plate.kitNumber} version={box.plate.letter} />
            <span className="font-figures">{box.serial}</span>
            <LinkButton
              href={`/papers/label/${box.id}`}
              target="_blank"
              prefetch={false}
              size="floor"
              icon="print"
              className="ml-auto"
            >
              Label
            </LinkButton>
          </li>
        ))}
      </ul>
      {mayShip ? <ShipForm order={order} onShip={onShip} /> : <p>Only a packer hands parcels to the carrier.</p>}
    </li>
  );
}
