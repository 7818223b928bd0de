import { type Actor, must } from '../access';
import { listPriced } from '../catalogue';
import { shopCurrency } from '../catalogue/rules';
import { money } from '../money';
import { now, reading } from '../record';
import { days } from '../time';
import { byDay, dayOf, labelOf, lateAfterDays, median } from './rules';
import * as rows from './rows';
import { Today, type Waiting } from './schemas';

/** The business today: what came in, what waits on the owner, what is late, what is on sale. */
export async function readToday(actor: Actor): Promise<Today> {
  must(actor, 'desk.read');
  const sql = reading();
  const at = now();
  const weekAgo = at - days(7);
  const cash = await rows.booked(sql, at - days(15));
  const sent = await rows.sentSince(sql, weekAgo);
  const open = await rows.openOrders(sql);
  const sold = await rows.soldSince(sql, weekAgo);
  const onSale = (await listPriced(actor)).map((kit) => ({ ...kit, sold: sold.get(kit.kitId) ?? 0 }));
  const refunds = cash.filter((row) => row.kind === 'refunded' && row.at >= weekAgo);
  const takings = byDay(cash.filter((row) => row.kind === 'paid'));
  const of = (day: number) => money(takings.get(dayOf(day)) ?? 0, shopCurrency);
  const week = Array.from({ length: 7 }, (_, index) => at - days(6 - index));

  return Today.parse({
    at,
    figures: {
      today: of(at),
      week: money(
        week.reduce((all, day) => all + of(day).minor, 0),
        shopCurrency,
      ),
      boxesSent: sent.reduce((all, order) => all + Number(order.boxes), 0),
      hoursToSend: median(sent.map((order) => (order.shippedAt - order.paidAt) / 3_600_000)),
      refunded: money(
        refunds.reduce((all, row) => all + row.minor, 0),
        shopCurrency,
      ),
      refundedOrders: new Set(refunds.map((row) => row.orderId)).size,
    },
    toSend: { orders: open.length, boxes: await rows.boxesToPack(sql), unpaid: await rows.unpaidOrders(sql) },
    days: week.map((day) => ({ label: labelOf(day), takings: of(day), before: of(day - days(7)) })),
    waiting: await waitingOn(onSale),
    late: open
      .filter((order) => order.paidAt < at - days(lateAfterDays))
      .slice(0, 8)
      .map(({ id, ...order }) => ({ orderId: id, ...order })),
    onSale,
  });
}

async function waitingOn(onSale: Today['onSale']): Promise<Waiting[]> {
  const sql = reading();
  const orders = await rows.ordersToLookAt(sql);
  const held = await rows.heldVersions(sql);
  return Today.shape.waiting.parse([
    ...orders.map(({ id, number, why }) => ({ kind: 'order', orderId: id, number, why })),
    ...held.map(({ id, ...version }) => ({ kind: 'held', versionId: id, ...version })),
    ...onSale.filter((kit) => kit.prices.length === 0).map(({ code, name }) => ({ kind: 'price', code, name })),
    ...onSale
      .filter((kit) => kit.ready === 0 && kit.limitedBy !== null)
      .map(({ code, name, limitedBy }) => ({ kind: 'short', code, name, part: limitedBy })),
  ]);
}
