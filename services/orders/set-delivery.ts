import { type Actor, must } from '../access';
import { parse } from '../problem';
import { record, write } from '../record';
import * as rows from './rows';
import { SetDelivery, SetTax } from './schemas';

/** Sets how parcels may be sent, where to and for how much. Orders keep what they were placed with. */
export async function setDelivery(actor: Actor, input: SetDelivery): Promise<void> {
  must(actor, 'delivery.set');
  const { methods } = parse(SetDelivery, input);
  await write(actor, async (tx) => {
    const before = await rows.deliveries(tx.sql);
    await tx.sql('delivery_methods').delete();
    for (const [position, method] of methods.entries()) {
      await tx.sql('delivery_methods').insert({
        code: method.code,
        name: method.name,
        promise: method.promise,
        countries: method.countries.join(','),
        price_minor: method.price.minor,
        currency: method.price.currency,
        position: position + 1,
      });
    }
    await record(tx, 'delivery.set', { subject: { kind: 'delivery', id: 'all' }, before, after: methods });
  });
}

/** Sets the tax inside prices by country of delivery; a country that is not named has none. */
export async function setTax(actor: Actor, input: SetTax): Promise<void> {
  must(actor, 'delivery.set');
  const { rates } = parse(SetTax, input);
  await write(actor, async (tx) => {
    const before = await rows.taxRates(tx.sql);
    await tx.sql('tax_rates').delete();
    for (const { country, basisPoints } of rates) {
      await tx.sql('tax_rates').insert({ country, basis_points: basisPoints });
    }
    await record(tx, 'tax.set', { subject: { kind: 'tax', id: 'all' }, before, after: rates });
  });
}
