'use client';

import { useState } from 'react';
import { Controller, useWatch } from 'react-hook-form';
import { z } from 'zod';
import type { Action } from '@/components/forms/action-result';
import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Combobox } from '@/components/ui/combobox';
import { TextField } from '@/components/ui/field';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { LotId, PartId } from '@/services/ids';
import { parseMoney } from '@/services/money';
import { type Receivable, ReceiveLot } from '@/services/stock/schemas';

/** The form as it is typed: quantity in the part's own unit, cost in pounds. */
const Typed = ReceiveLot.extend({
  partId: PartId.or(z.literal('')).refine((id) => id !== '', 'Choose the part that came.'),
  quantity: z.string().regex(/^\d{1,9}(\.\d{1,3})?$/, 'Give a number, like 120 or 13.8.'),
  unitCostMinor: z.string().refine((text) => parseMoney(text, 'GBP') !== null, 'Give an amount, like 1.20.'),
});
type Typed = z.input<typeof Typed>;

const units = { each: 'pieces', metre: 'm', gram: 'g' };
const one = { each: 'piece', metre: 'metre', gram: 'gram' };

/** Takes a delivery in: which part, from whom, into which bin, how much. */
export function ReceiveForm(props: { parts: readonly Receivable[]; onReceive: Action<ReceiveLot, { lotId: LotId }> }) {
  const { parts, onReceive } = props;
  const [last, setLast] = useState<string | null>(null);
  const partOf = (id: string) => parts.find((part) => part.id === id);
  const { form, field, submit, pending, summary, problem } = useActionForm<Typed, { lotId: LotId }>({
    schema: Typed,
    action: (typed) => onReceive(receiptOf(typed, partOf(typed.partId)?.unit ?? 'each')),
    defaultValues: empty,
    onDone: () => {
      setLast(form.getValues('lotCode').toUpperCase());
      form.reset(empty);
    },
  });
  const chosen = useWatch({ control: form.control, name: 'partId' });
  const part = partOf(chosen);
  const unit = part?.unit ?? 'each';

  return (
    <form onSubmit={submit} noValidate className="grid max-w-160 gap-6">
      {last !== null && (
        <Notice
          kind="clears"
          size="floor"
          live="status"
          title={`Lot ${last} is in the store`}
          actions={<LinkButton href={`/store?q=${last}`}>See it on hand</LinkButton>}
        >
          Write its code on the bin. The form is ready for the next delivery.
        </Notice>
      )}
      <FormErrorSummary summary={summary} problem={problem} />
      <Controller
        control={form.control}
        name="partId"
        render={({ field: { value, onChange } }) => (
          <Combobox
            label="Part"
            size="floor"
            hint="By its code or its name."
            error={field('partId').error}
            value={value === '' ? null : value}
            onChange={(id) => onChange(id ?? '')}
            options={parts.map(({ id, code, name }) => ({ id, text: `${code} ${name}` }))}
            empty="No part has this code or name. A designer adds parts at the bench."
          />
        )}
      />
      <div className="grid gap-6 sm:grid-cols-2">
        <TextField {...field('lotCode')} label="Lot code" size="floor" hint="As on the label, like L-2611-04." />
        <TextField
          {...field('binCode')}
          label="Bin"
          size="floor"
          hint={part && part.bins.length > 0 ? `Its other lots lie in ${part.bins.join(', ')}.` : 'Like C-14.'}
        />
        <TextField
          {...field('quantity')}
          label="How much came"
          size="floor"
          inputMode="decimal"
          figures
          unit={units[unit]}
        />
        <TextField
          {...field('unitCostMinor')}
          label={`Cost of one ${one[unit]}`}
          size="floor"
          inputMode="decimal"
          figures
          unit="£"
        />
      </div>
      <TextField {...field('supplier')} label="Supplier" size="floor" />
      <Checkbox
        {...field('accepted')}
        size="floor"
        label="Inspected and accepted"
        hint="Leave it open, and the lot waits in quarantine: it can be neither promised nor packed."
      />
      <Button type="submit" variant="primary" size="floor" pending={pending} pendingLabel="Receiving it">
        Receive the lot
      </Button>
    </form>
  );
}

const empty: Typed = {
  partId: '',
  lotCode: '',
  supplier: '',
  binCode: '',
  quantity: '',
  unitCostMinor: '',
  accepted: false,
};

/** Base units as the store keeps them: pieces, millimetres, milligrams; pence. */
function receiptOf(typed: Typed, unit: Receivable['unit']): ReceiveLot {
  const { partId, quantity, unitCostMinor, ...rest } = typed;
  const factor = unit === 'each' ? 1 : 1000;
  return {
    ...rest,
    partId: PartId.parse(partId),
    quantity: Number((Number(quantity) * factor).toFixed(unit === 'each' ? 3 : 0)),
    unitCostMinor: parseMoney(unitCostMinor, 'GBP')?.minor ?? -1,
  };
}
