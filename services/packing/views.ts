import type { Knex } from 'knex';
import { type Actor, can, must } from '../access';
import { now, reading } from '../record';
import type { Instant } from '../time';
import { boxView, claimOf, plateOf } from './box-view';
import { prepareBoxes } from './make-boxes';
import { type BoxLineRow, type BoxRow, boxes, linesOf } from './rows';
import { countPieces, dispatchDue, barOf } from './rules';
import type { BoxCard, BoxView } from './schemas';

/** Most boxes that one screen lists; the oldest come first, so the rest waits its turn. */
const mostBoxes = 100;

/** What to pack, oldest paid order first: mine in hand, then free ones, then those that others have. */
export async function listBoxes(
  actor: Actor,
): Promise<{ mine: BoxCard[]; free: BoxCard[]; others: BoxCard[]; closed: BoxCard[] }> {
  must(actor, 'box.list');
  if (can(actor, 'box.prepare')) await prepareBoxes(actor);
  const sql = reading();
  const open = await openBoxes(sql).limit(mostBoxes);
  const closed = await boxes(sql).where('boxes.state', 'closed').orderBy('boxes.closed_at', 'desc').limit(12);
  const cards = await cardsOf(sql, actor, [...open, ...closed], now());
  const isMine = (card: BoxCard) => card.claim?.mine === true;
  const isFree = (card: BoxCard) => card.claim === null || card.claim.lapsed;
  const waiting = cards.slice(0, open.length);
  return {
    mine: waiting.filter(isMine),
    free: waiting.filter((card) => !isMine(card) && isFree(card)),
    others: waiting.filter((card) => !isMine(card) && !isFree(card)),
    closed: cards.slice(open.length),
  };
}

/** Boxes still to be packed of orders that are still wanted, oldest payment first. */
export const openBoxes = (sql: Knex) =>
  boxes(sql)
    .whereIn('boxes.state', ['to-pack', 'packing'])
    .whereIn('orders.fulfilment', ['allocated', 'picking', 'packed'])
    .orderBy(['orders.paid_at', 'boxes.order_id', 'boxes.position']);

export async function cardsOf(sql: Knex, actor: Actor, rows: readonly BoxRow[], at: Instant): Promise<BoxCard[]> {
  const lines = await linesOf(
    sql,
    rows.map((row) => row.id),
  );
  const byBox = new Map<string, BoxLineRow[]>();
  for (const line of lines) byBox.set(line.boxId, [...(byBox.get(line.boxId) ?? []), line]);
  return rows.map((row) => {
    const paidAt = row.paidAt ?? row.placedAt;
    return {
      id: row.id,
      serial: row.serial,
      plate: plateOf(row),
      orderNumber: row.orderNumber,
      buyer: row.buyer,
      position: row.position,
      of: Number(row.of),
      state: row.state,
      pieces: countPieces(byBox.get(row.id) ?? []),
      paidAt,
      dueAt: dispatchDue(paidAt),
      late: row.state !== 'closed' && at > dispatchDue(paidAt),
      claim: claimOf(row, actor, at),
      barred: barOf(row),
    };
  });
}

export async function readBox(actor: Actor, boxId: string): Promise<BoxView> {
  must(actor, 'box.list');
  return boxView(reading(), actor, boxId, now());
}
