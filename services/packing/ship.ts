import { type Actor, must, personIdOf } from '../access';
import { newId } from '../ids';
import { queue } from '../mail';
import { parse, refuseIfAny, refused } from '../problem';
import { record, write } from '../record';
import { boxesOf, insertShipment, moveOrder } from './rows';
import { barOf } from './rules';
import { Ship } from './schemas';

/** Hands an order to the carrier: all its boxes closed, one parcel, and the buyer is told in the same transaction. */
export async function ship(actor: Actor, input: Ship): Promise<{ shipmentId: string }> {
  must(actor, 'order.ship');
  const { orderId, carrier, trackingNumber } = parse(Ship, input);

  return write(actor, async (tx) => {
    const packed = await boxesOf(tx.sql, orderId);
    const [first] = packed;
    if (!first) throw refused('This order has no boxes yet. Look for it under Boxes.');
    const open = packed.filter((box) => box.state !== 'closed' && box.state !== 'shipped');
    const bars = new Set(packed.map((box) => barOf(box)).filter((bar) => bar !== ''));
    refuseIfAny([
      ...(open.length > 0 ? [`Not closed yet: ${open.map((box) => box.serial).join(', ')}.`] : []),
      ...bars,
    ]);
    if (!(await moveOrder(tx, orderId, 'packed', 'shipped'))) {
      throw refused(`Order ${first.orderNumber} is ${first.fulfilment}, so it is not sent.`);
    }
    const shipmentId = newId();
    await insertShipment(tx, { id: shipmentId, orderId, carrier, trackingNumber, personId: personIdOf(actor) ?? '' });
    await record(tx, 'order.shipped', {
      subject: { kind: 'order', id: orderId },
      before: { fulfilment: 'packed' },
      after: { fulfilment: 'shipped', shipmentId, carrier, trackingNumber, boxes: packed.map((box) => box.serial) },
    });
    await queue(tx, 'order-shipped', { orderId, shipmentId }, `order-shipped ${shipmentId}`);
    return { shipmentId };
  });
}
