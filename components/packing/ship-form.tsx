'use client';

import type { Action } from '@/components/forms/action-result';
import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { type DispatchView, Ship } from '@/services/packing/schemas';

export interface ShipFormProps {
  order: DispatchView['waiting'][number];
  onShip: Action<Ship, { shipmentId: string }>;
}

/** Carrier and tracking number from the parcel's label; sending tells the buyer. */
export function ShipForm({ order, onShip }: ShipFormProps) {
  const { field, submit, pending, summary, problem, form } = useActionForm<Ship, { shipmentId: string }>({
    schema: Ship,
    action: onShip,
    defaultValues: { orderId: order.orderId, carrier: '', trackingNumber: '' },
  });
  return (
    <form onSubmit={submit} noValidate aria-label={`Send ${order.orderNumber}`} className="grid gap-4">
      <FormErrorSummary summary={summary} problem={problem} />
      <input type="hidden" {...form.register('orderId')} />
      <TextField label="Carrier" size="floor" autoComplete="off" {...field('carrier')} />
      <TextField
        label="Tracking number"
        size="floor"
        autoComplete="off"
        hint="From the carrier's label"
        {...field('trackingNumber')}
      />
      <Button type="submit" variant="primary" size="floor" icon="truck" pending={pending} pendingLabel="Sending">
        Send {order.orderNumber}
      </Button>
    </form>
  );
}
