'use client';

import { useWatch } from 'react-hook-form';
import type { Action } from '@/components/forms/action-result';
import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { TextArea, TextField } from '@/components/ui/field';
import { RadioGroup } from '@/components/ui/radio-group';
import { Select } from '@/components/ui/select';
import { formatMoney, money, sum } from '@/services/money';
import { deliveriesTo, postcodeWarning } from '@/services/orders/rules';
import { type CheckoutView, PlaceOrder, type PlaceOrder as PlaceOrderInput } from '@/services/orders/schemas';
import { CheckoutSum } from './checkout-sum';

/** What the form sends: everything but the basket, which the cookie names. */
export type CheckoutInput = Omit<PlaceOrderInput, 'basketId'>;
const Checkout = PlaceOrder.omit({ basketId: true });

export interface CheckoutFormProps {
  checkout: CheckoutView;
  /** Named on the server: browsers spell some countries otherwise. */
  countries: readonly { code: string; name: string }[];
  onOrder: Action<CheckoutInput, { url: string }>;
}

/** Where it goes, how, and to whom. What was typed stays whatever the answer is. */
export function CheckoutForm({ checkout, countries, onOrder }: CheckoutFormProps) {
  const { basket, deliveries, known } = checkout;
  const { form, field, submit, pending, summary, problem } = useActionForm<CheckoutInput, { url: string }>({
    schema: Checkout,
    action: onOrder,
    defaultValues: {
      email: known?.email ?? '',
      name: known?.name ?? '',
      address: { line1: '', line2: '', town: '', postcode: '', country: firstCountry(countries) },
      deliveryCode: deliveriesTo(deliveries, firstCountry(countries))[0]?.code ?? '',
      giftNote: '',
    },
    onDone: ({ url }) => window.location.assign(url),
  });
  const [country = '', postcode = '', chosen] = useWatch({
    control: form.control,
    name: ['address.country', 'address.postcode', 'deliveryCode'],
  });
  const { onChange: countryChanged } = field('address.country');
  const methods = deliveriesTo(deliveries, country);
  const method = methods.find((one) => one.code === chosen);
  const warning = postcode === '' ? null : postcodeWarning(country, postcode);
  const total = sum(
    [basket.total, ...(method ? [money(method.minor, basket.total.currency)] : [])],
    basket.total.currency,
  );

  function chooseCountry(next: string) {
    const first = deliveriesTo(deliveries, next)[0];
    form.setValue('deliveryCode', first?.code ?? '');
  }

  return (
    <form
      onSubmit={submit}
      noValidate
      className="grid items-start gap-x-11 gap-y-6 md:grid-cols-[minmax(0,1fr)_minmax(0,24rem)]"
    >
      <div className="grid gap-8">
        <FormErrorSummary summary={summary} problem={problem} />
        <fieldset className="grid gap-4">
          <legend className="mb-3 w-full border-b-2 border-ink pb-1.5 font-display text-panel">Who it is for</legend>
          <TextField
            {...field('email')}
            label="E-mail"
            type="email"
            autoComplete="email"
            hint="The confirmation goes there, with a link that opens your order."
          />
          <TextField
            {...field('name')}
            label="Name on the label"
            autoComplete="name"
            hint="A person, a school or a club."
          />
        </fieldset>
        <fieldset className="grid gap-4">
          <legend className="mb-3 w-full border-b-2 border-ink pb-1.5 font-display text-panel">Where it goes</legend>
          <TextField {...field('address.line1')} label="Street and number, or house" autoComplete="address-line1" />
          <TextField {...field('address.line2')} label="Second line" optional autoComplete="address-line2" />
          <div className="grid gap-4 sm:grid-cols-[1fr_12rem]">
            <TextField {...field('address.town')} label="Town" autoComplete="address-level2" />
            <TextField
              {...field('address.postcode')}
              label="Postcode"
              autoComplete="postal-code"
              understood={warning ?? undefined}
            />
          </div>
          <Select
            {...field('address.country')}
            onChange={(event) => {
              void countryChanged(event);
              chooseCountry(event.target.value);
            }}
            label="Country"
            autoComplete="country"
            options={countries.map(({ code, name }) => ({ value: code, label: name }))}
          />
        </fieldset>
        <RadioGroup
          legend={<span className="font-display text-panel">How it is sent</span>}
          name={field('deliveryCode').name}
          error={field('deliveryCode').error}
          value={chosen}
          onChange={(code) => form.setValue('deliveryCode', code)}
          options={methods.map(({ code, name, promise, price }) => ({
            value: code,
            label: name,
            hint: promise,
            aside: <span className="font-figures font-semibold">{price}</span>,
          }))}
        />
        <TextArea
          {...field('giftNote')}
          label="Gift note"
          optional
          rows={3}
          hint="Printed on the packing slip, which never shows prices."
        />
      </div>
      <CheckoutSum basket={basket} method={method} total={formatMoney(total)}>
        <Button
          type="submit"
          variant="primary"
          size="big"
          className="w-full"
          pending={pending}
          pendingLabel="Setting your kits aside"
        >
          Pay {formatMoney(total)}
        </Button>
        <p className="mt-3 text-caption text-ink2">
          You pay on our payment provider’s page. We keep your kits for you for half an hour meanwhile.
        </p>
      </CheckoutSum>
    </form>
  );
}

const firstCountry = (countries: readonly { code: string }[]): string =>
  countries.find(({ code }) => code === 'GB')?.code ?? countries[0]?.code ?? '';
