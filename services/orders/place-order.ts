import { type Actor, must, personIdOf } from '../access';
import { priceFor } from '../catalogue';
import { shopCurrency } from '../catalogue/rules';
import { type OrderId, OrderId as OrderIdSchema, newId } from '../ids';
import { readFrozen } from '../kits';
import { type Money, sum, taxWithin, times } from '../money';
import { countOrder } from '../people';
import { parse, refused } from '../problem';
import { type Tx, record, sha256, write } from '../record';
import { buildable, lapseDue, needsOf, reserve } from '../stock';
import { minutes } from '../time';
import { type BasketRow, basketLines, emptyBasket } from './baskets';
import { orderKey } from './link';
import * as rows from './rows';
import { deliveriesTo } from './rules';
import { PlaceOrder } from './schemas';

/** How long stock is kept while a buyer pays: a little longer than the payment page stays open. */
export const reservedFor = minutes(33);
/** Order numbers begin here; numbers for people, so that the first is no "1". */
const firstNumber = 4001;

/**
 * Makes the basket an order and sets its stock aside, in one write: all of it or none. Refused when a kit is no longer
 * sold, when the store cannot make that many, or when nothing serves the address; with a wait, when too many orders came
 * from one network address.
 */
export async function placeOrder(
  actor: Actor,
  input: PlaceOrder,
  from: string | null = null,
): Promise<{ orderId: OrderId; key: string }> {
  must(actor, 'order.place');
  const order = parse(PlaceOrder, input);

  return write(actor, async (tx) => {
    if (from !== null) await countOrder(tx, from);
    const basket = await basketLines(tx.sql, order.basketId);
    if (basket.length === 0) throw refused('Your basket is empty. Put a kit into it first.');
    const delivery = deliveriesTo(await rows.deliveries(tx.sql), order.address.country).find(
      (method) => method.code === order.deliveryCode,
    );
    if (!delivery) throw refused('This way of sending does not serve that country. Choose another one.');

    await lapseDue(tx);
    const { lines, needs } = await priced(tx, basket);
    const linesTotal = sum(
      lines.map((line) => times(line.unit, line.quantity)),
      shopCurrency,
    );
    const total = sum([linesTotal, delivery.price], shopCurrency);
    const basisPoints = await rows.taxRate(tx.sql, order.address.country);
    const tax = taxWithin(total, basisPoints);
    const orderId = OrderIdSchema.parse(newId());
    const key = orderKey(orderId);
    const number = `Y-${await rows.nextNumber(tx.sql, 'order', firstNumber)}`;

    await tx.sql('orders').insert({
      id: orderId,
      number,
      customer_id: personIdOf(actor),
      email: order.email,
      name: order.name,
      link_hash: sha256(key),
      address: JSON.stringify(order.address),
      delivery_code: delivery.code,
      gift_note: order.giftNote,
      payment: 'awaiting-payment',
      fulfilment: 'placed',
      currency: shopCurrency,
      lines_minor: linesTotal.minor,
      delivery_minor: delivery.price.minor,
      tax_minor: tax.minor,
      tax_basis_points: basisPoints,
      total_minor: total.minor,
      placed_at: tx.now,
      paid_at: null,
      shipped_at: null,
      session_id: null,
      session_attempt: 0,
      look_at_it: '',
    });
    for (const [position, line] of lines.entries()) {
      await tx.sql('order_lines').insert({
        id: newId(),
        order_id: orderId,
        version_id: line.versionId,
        quantity: line.quantity,
        unit_minor: line.unit.minor,
        position: position + 1,
      });
    }
    await reserve(tx, { orderId, needs, expiresAt: tx.now + reservedFor });
    await emptyBasket(tx.sql, order.basketId);
    await record(tx, 'order.placed', {
      subject: { kind: 'order', id: orderId },
      after: { number, total, lines: lines.map(({ versionId, quantity, unit }) => ({ versionId, quantity, unit })) },
    });
    return { orderId, key };
  });
}

interface PricedLine extends BasketRow {
  unit: Money;
}

async function priced(
  tx: Tx,
  basket: readonly BasketRow[],
): Promise<{ lines: PricedLine[]; needs: Map<string, number> }> {
  const lines: PricedLine[] = [];
  const needs = new Map<string, number>();
  for (const { versionId, quantity } of basket) {
    const { content, state, kitId, letter } = await readFrozen(tx.sql, versionId);
    const { name } = content.kit;
    if (state !== 'released') {
      throw refused(`${name} ${letter} is no longer sold. Take it out of the basket and look for a newer version.`);
    }
    const { count } = await buildable(tx.sql, content);
    if (count < quantity) {
      throw refused(
        `${count === 0 ? 'None' : `Only ${count}`} of ${name} can be made just now, and your basket asks for ${quantity}. Somebody was quicker. ${count === 0 ? 'Take it out, or come back after the next delivery.' : 'Take fewer.'}`,
      );
    }
    lines.push({ versionId, quantity, unit: await priceFor(tx.sql, kitId, quantity) });
    for (const [partId, each] of await needsOf(tx.sql, content)) {
      needs.set(partId, (needs.get(partId) ?? 0) + each * quantity);
    }
  }
  return { lines, needs };
}
