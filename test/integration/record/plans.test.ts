import { beforeAll, describe, expect, it } from 'vitest';
import { type Actor, systemActor, visitor } from '@/services/access';
import { listOnSale, readKitPage } from '@/services/catalogue';
import { readQueue } from '@/services/check';
import { readToday } from '@/services/desk';
import { newId } from '@/services/ids';
import {
  changeBasket,
  countBasket,
  lapseReservations,
  listMyOrders,
  listOrders,
  placeOrder,
  readOrder,
} from '@/services/orders';
import * as outbox from '@/services/outbox';
import {
  claimBox,
  listBoxes,
  prepareBoxes,
  readBox,
  readDispatch,
  readPickList,
  scan,
  traceBox,
  traceLot,
} from '@/services/packing';
import { listParts } from '@/services/parts';
import { receiveEvent, reconcile } from '@/services/payments';
import { listChanges, listPeople, signInWithPassword } from '@/services/people';
import { reading } from '@/services/record';
import { OrderFilter } from '@/services/orders/schemas';
import { testDatabase } from '../../builders/database';
import { event, session, signatureOf } from '../../builders/events';
import { type BuiltKit, customer, deliveryAndTax, kit, setParts, staff, stockFor } from '../../builders/orders';

// Each statement of the pages and rounds that are asked most looks its rows up: none walks through a table that grows
// with every order, however many there are.
const database = testDatabase();
let of: BuiltKit;
let lotCode: string;
let owner: Actor;
let packer: Actor;
let checker: Actor;
let buyer: Extract<Actor, { kind: 'customer' }>;

beforeAll(async () => {
  owner = await staff('Maud Orrin', 'owner');
  packer = await staff('Pia Lund', 'packer');
  checker = await staff('Walter Tarrow', 'checker');
  buyer = await customer('Ann Tarrant');
  await deliveryAndTax();
  const parts = await setParts();
  of = await kit({ parts });
  await stockFor(packer, parts, 20);
  lotCode = (await reading()('lots').first<{ code: string }>('code')).code;
});

/** Tables that grow with orders, work and visitors for as long as the yard stands. */
const growing = [
  'attempts',
  'balances',
  'basket_lines',
  'baskets',
  'box_lines',
  'box_picks',
  'boxes',
  'changes',
  'invoices',
  'lots',
  'movements',
  'order_lines',
  'order_money',
  'orders',
  'outbox',
  'payment_events',
  'people',
  'reservation_lines',
  'reservations',
  'shipments',
  'sign_in_links',
];

/** Walks in the order that is wanted, of a statement that wants every row of it: they end with their page. */
const endsWithItsPage = [
  /^SCAN orders USING INDEX orders_by_age$/,
  /^SCAN shipments USING INDEX shipments_by_time$/,
  /^SCAN changes$/,
  /^SCAN movements$/,
];

interface Statement {
  sql: string;
  bindings: unknown[];
}

async function statementsOf(work: () => Promise<unknown>): Promise<Statement[]> {
  const asked: Statement[] = [];
  const note = (query: Statement) => asked.push({ sql: query.sql, bindings: query.bindings ?? [] });
  database.sql.on('query', note);
  try {
    await work();
  } finally {
    database.sql.removeListener('query', note);
  }
  return asked.filter(({ sql }) => /^(select|update|delete)/i.test(sql));
}

/** What a statement walks through although it grows. */
async function walksOf({ sql, bindings }: Statement): Promise<string[]> {
  const plan: { detail: string }[] = await reading().raw(`explain query plan ${sql}`, bindings as string[]);
  const aliases = new Map(
    [...sql.matchAll(/`(\w+)` as `(\w+)`/g)].map(([, table, alias]) => [alias ?? '', table ?? '']),
  );
  return plan
    .map(({ detail }) => detail)
    .filter((detail) => {
      const name = /^SCAN (\w+)/.exec(detail)?.[1];
      if (name === undefined || !growing.includes(aliases.get(name) ?? name)) return false;
      return / where /.test(sql) || !endsWithItsPage.some((one) => one.test(detail));
    })
    .map((detail) => `${detail} <- ${sql}`);
}

async function order(actor: Actor): Promise<{ orderId: string }> {
  const basketId = newId();
  await changeBasket(actor, { basketId, versionId: of.versionId, quantity: 1 });
  const address = { line1: '3 Quay Street', town: 'Pellstow', country: 'GB' };
  const { orderId } = await placeOrder(actor, {
    basketId,
    email: 'ann@example.org',
    name: 'Ann Tarrant',
    address,
    deliveryCode: 'parcel',
  });
  const told = event('checkout.session.completed', session({ orderId, amount: 4250 }));
  await receiveEvent(told.body, signatureOf(told.body));
  return { orderId };
}

const boxToPack = async () => {
  await prepareBoxes(packer);
  const row = await reading()('boxes')
    .where({ state: 'to-pack' })
    .first<{ id: string; serial: string }>('id', 'serial');
  return row;
};
const later = `1764000000000-${'a'.repeat(26)}`;
const worker = systemActor('worker');

const asked: Record<string, () => Promise<unknown>> = {
  'the shop’s front': () => listOnSale(visitor),
  'a kit’s page': () => readKitPage(visitor, of.code),
  'the badge of the basket': () => countBasket(visitor, newId()),
  'buying and paying': () => order(buyer),
  'an order’s page': async () => readOrder(buyer, (await order(buyer)) as Parameters<typeof readOrder>[1]),
  'my orders': () => listMyOrders(buyer),
  'my older orders': () => listMyOrders(buyer, { after: later }),
  ...Object.fromEntries(
    OrderFilter.options.flatMap((show) => [
      [`the list of orders, ${show}`, () => listOrders(owner, { show })],
      [`the list of orders, ${show}, older`, () => listOrders(owner, { show, after: later })],
    ]),
  ),
  'the desk': () => readToday(owner),
  'the queue of the check room': () => readQueue(checker),
  'boxes to pack': () => listBoxes(packer),
  'the pick list': () => readPickList(packer),
  dispatch: () => readDispatch(packer),
  'taking, reading and filling a box': async () => {
    const box = await boxToPack();
    await claimBox(packer, { boxId: box.id } as Parameters<typeof claimBox>[1]);
    const view = await readBox(packer, box.id);
    await scan(packer, { boxId: view.id, code: view.places[0]?.suggestion?.lotCode ?? '' });
  },
  'tracing a box': async () => traceBox(packer, (await boxToPack()).serial),
  'tracing a lot': () => traceLot(packer, lotCode),
  'the list of parts': () => listParts(owner, { q: 'coil' }),
  'the record of changes': () => listChanges(owner, {}),
  'older lines of the record': () => listChanges(owner, { before: 50 }),
  'the record of one order': () => listChanges(owner, { subjectKind: 'order', subjectId: newId() }),
  'the staff': () => listPeople(owner),
  'signing in': () =>
    signInWithPassword(
      visitor,
      { email: 'nobody@home.example', password: 'four odd words', code: '' },
      { address: '127.0.0.1', device: null },
    ).catch(() => null),
  'the worker’s mails': () => outbox.claimNext(worker, 'mail'),
  'the worker’s lapses': () => lapseReservations(worker),
  'the worker’s open payments': () => reconcile(worker),
};

describe('rows are looked up, not searched for', () => {
  it.each(Object.keys(asked))('%s', async (what) => {
    const statements = await statementsOf(asked[what] ?? (() => Promise.reject(new Error(what))));
    expect(statements.length).toBeGreaterThan(0);
    const walks = [];
    for (const statement of statements) walks.push(...(await walksOf(statement)));
    expect(walks).toEqual([]);
  });

  it('the figures of the desk and the rounds of the worker read what they count, not all that was ever sold', async () => {
    const rounds = ['the desk', 'the worker’s lapses', 'the worker’s open payments'];
    const lookUps = new Set<string>();
    for (const what of rounds) {
      for (const { sql, bindings } of await statementsOf(asked[what] ?? (() => Promise.reject(new Error(what))))) {
        if (!sql.includes('`orders`')) continue;
        const plan: { detail: string }[] = await reading().raw(`explain query plan ${sql}`, bindings as string[]);
        for (const { detail } of plan)
          if (/^SEARCH orders .*=\?\)$|^SEARCH orders .*>\?/.test(detail)) lookUps.add(detail);
      }
    }
    expect([...lookUps].sort()).toMatchInlineSnapshot(`
      [
        "SEARCH orders USING COVERING INDEX orders_by_payment (payment=?)",
        "SEARCH orders USING COVERING INDEX orders_by_state (fulfilment=?)",
        "SEARCH orders USING INDEX orders_by_fulfilment (fulfilment=?)",
        "SEARCH orders USING INDEX orders_by_paying (payment=? AND paid_at>?)",
        "SEARCH orders USING INDEX orders_by_payment (payment=? AND placed_at>? AND placed_at<?)",
        "SEARCH orders USING INDEX orders_by_shipping (fulfilment=? AND shipped_at>?)",
        "SEARCH orders USING INDEX orders_by_state (fulfilment=? AND payment=?)",
        "SEARCH orders USING INDEX orders_to_look_at (to_look_at=?)",
        "SEARCH orders USING INDEX sqlite_autoindex_orders_1 (id=?)",
      ]
    `);
  });
});
