import { type Actor, must } from '../access';
import { missing, parse, refused } from '../problem';
import { record, write } from '../record';
import { shopCurrency } from './rules';
import * as rows from './rows';
import { SetPrice } from './schemas';

/** Sets what a kit costs, tax included, with its steps. Orders that were placed keep the price they were placed at. */
export async function setPrice(actor: Actor, input: SetPrice): Promise<void> {
  must(actor, 'price.set');
  const { kitId, steps } = parse(SetPrice, input);
  if (steps.some((step) => step.unit.currency !== shopCurrency)) {
    throw refused(`The shop sells in ${shopCurrency} only.`);
  }

  await write(actor, async (tx) => {
    const kit = await tx.sql('kits').where({ id: kitId }).first<{ id: string }>('id');
    if (!kit) throw missing('This kit is not in the list.');
    const before = (await rows.pricesOf(tx.sql, [kitId])).get(kitId);
    await rows.replacePrices(tx.sql, kitId, steps);
    await record(tx, 'price.set', { subject: { kind: 'kit', id: kitId }, before, after: steps });
  });
}
