import { type Actor, must } from '../access';
import { log } from '../log';
import { Currency, money } from '../money';
import { bookRefund, owedBack, paymentsOf, pending } from '../orders';
import { now, reading, write } from '../record';
import { days, minutes } from '../time';
import { applySession } from './apply-event';
import { stripe } from './client';
import { payBack } from './pay-back';

/** An order is looked up once its event is this late, and no longer than the provider keeps an unpaid page in mind. */
const lateAfter = minutes(10);
const forgottenAfter = days(3);

/**
 * Looks up at the provider what no event has told us: unpaid orders, and money that has to go back. Run twice it
 * changes nothing more; one order that fails does not keep the others waiting.
 */
export async function reconcile(actor: Actor): Promise<{ looked: number; failed: number }> {
  must(actor, 'payment.reconcile');
  const at = now();
  const unpaid = await pending(reading(), at - forgottenAfter, at - lateAfter);
  const owed = await owedBack(reading());
  const jobs = [
    ...unpaid.map((order) => ({ id: order.id, run: () => lookUp(actor, order.id, order.sessionId) })),
    ...owed.map((order) => ({ id: order.id, run: () => settle(actor, order.id) })),
  ];
  let failed = 0;
  for (const { id, run } of jobs) {
    try {
      await run();
    } catch (error) {
      failed += 1;
      log().warn({ order: id, error: String(error) }, 'an order could not be looked up at the provider');
    }
  }
  return { looked: jobs.length, failed };
}

async function lookUp(actor: Actor, orderId: string, sessionId: string | null): Promise<void> {
  if (sessionId === null) return;
  const session = await stripe().checkout.sessions.retrieve(sessionId);
  await write(actor, (tx) => applySession(tx, session, { orderId }));
}

/** Asks for the refund again and books what the provider says was paid back. */
async function settle(actor: Actor, orderId: string): Promise<void> {
  await payBack(orderId);
  for (const { reference } of await paymentsOf(reading(), orderId)) {
    const intent = await stripe().paymentIntents.retrieve(reference, { expand: ['latest_charge'] });
    const charge = intent.latest_charge;
    if (!charge || typeof charge === 'string') continue;
    const currency = Currency.parse(charge.currency.toUpperCase());
    const total = money(charge.amount_refunded, currency);
    await write(actor, (tx) => bookRefund(tx, { orderId, charge: charge.id, total }));
  }
}
