import { systemActor, type Actor, visitor } from '@/services/access';
import { BoxId, type OrderId, type VersionId, newId } from '@/services/ids';
import * as kits from '@/services/kits';
import type { Money } from '@/services/money';
import * as orders from '@/services/orders';
import * as packing from '@/services/packing';
import { reading, write } from '@/services/record';
import { addresses, customers } from './people';
import { as, dice, goTo, pass } from './yard';

type Fate = 'shipped' | 'packed' | 'picking' | 'allocated' | 'awaiting' | 'lapsed' | 'cancelled';

/** The orders of six weeks, oldest first: most went out, the last ones stand where orders stand on a working day. */
const story: { fate: Fate; count: number; from: number; to: number }[] = [
  { fate: 'shipped', count: 34, from: 12, to: 38 },
  { fate: 'lapsed', count: 3, from: 20, to: 36 },
  { fate: 'cancelled', count: 3, from: 22, to: 37 },
  { fate: 'packed', count: 3, from: 40, to: 41 },
  { fate: 'picking', count: 2, from: 41, to: 41 },
  { fate: 'allocated', count: 14, from: 40, to: 42 },
  { fate: 'awaiting', count: 2, from: 42, to: 42 },
];

const guests = [
  { name: 'Nell Garrow', email: 'nell@garrow.example' },
  { name: 'Kit Harbin', email: 'kit@harbin.example' },
  { name: 'Ines Calder', email: 'ines@calder.example' },
];

export async function setTrade(): Promise<void> {
  const owner = as('Maud Orrin');
  const price = (minor: number) => ({ minor, currency: 'GBP' as const });
  await orders.setDelivery(owner, {
    methods: [
      { code: 'post', name: 'Post', promise: '3 to 5 working days', countries: ['GB'], price: price(390) },
      { code: 'parcel', name: 'Parcel, tracked', promise: '1 to 2 working days', countries: ['GB'], price: price(680) },
      { code: 'abroad', name: 'Parcel abroad', promise: '5 to 10 working days', countries: ['*'], price: price(1480) },
    ],
  });
  await orders.setTax(owner, { rates: [{ country: 'GB', basisPoints: 2000 }] });
}

interface Buyer {
  actor: Actor;
  name: string;
  email: string;
}

function buyerOf(roll: (below: number) => number): Buyer {
  const guest = guests[roll(9)];
  if (guest) return { actor: visitor, ...guest };
  const customer = customers[roll(customers.length)] ?? customers[0];
  if (!customer) throw new Error('The demo has no customers.');
  return { actor: as(customer.name), ...customer };
}

async function order(roll: (below: number) => number, onSale: readonly VersionId[]): Promise<OrderId> {
  const { actor, name, email } = buyerOf(roll);
  const basketId = newId();
  const kinds = roll(6) === 0 ? 2 : 1;
  for (let index = 0; index < kinds; index++) {
    const versionId = onSale[(roll(onSale.length) + index) % onSale.length];
    if (versionId) await orders.changeBasket(actor, { basketId, versionId, quantity: roll(7) === 0 ? 2 : 1 });
  }
  const address = addresses[roll(addresses.length)] ?? addresses[0];
  if (!address) throw new Error('The demo has no addresses.');
  const [first = '', second = ''] = [address.organisation, ...address.lines].filter((line) => line !== undefined);
  const { orderId } = await orders.placeOrder(actor, {
    basketId,
    email,
    name,
    address: { line1: first, line2: second, town: address.town, postcode: address.postcode, country: address.country },
    deliveryCode: roll(3) === 0 ? 'parcel' : 'post',
    giftNote: roll(11) === 0 ? 'For your workbench, and the first evening with it.' : '',
  });
  return orderId;
}

const stripe = systemActor('stripe');

async function totalOf(orderId: OrderId): Promise<Money> {
  const row = await reading()('orders').where({ id: orderId }).first<{ total_minor: number }>('total_minor');
  return { minor: row.total_minor, currency: 'GBP' };
}

async function pay(orderId: OrderId): Promise<void> {
  const amount = await totalOf(orderId);
  await write(stripe, (tx) => orders.markPaid(tx, { orderId, reference: `pi_demo_${orderId}`, amount }));
}

async function payBack(orderId: OrderId): Promise<void> {
  const total = await totalOf(orderId);
  await write(stripe, (tx) => orders.bookRefund(tx, { orderId, charge: `ch_demo_${orderId}`, total }));
}

/** Packs a box as a packer does: fetch what is next until the tray is full, papers, scale, lid. */
async function packBox(packer: Actor, boxId: BoxId, upTo: 'picking' | 'closed'): Promise<void> {
  await packing.claimBox(packer, { boxId });
  for (;;) {
    const box = await packing.readBox(packer, boxId);
    const next = box.places.find((place) => place.lineId === box.nextLineId);
    if (!next?.suggestion || (upTo === 'picking' && box.pieces.packed > 3)) break;
    const pieces = next.unit === 'each' ? next.needed - next.packed : 1;
    const { right, sentence } = await packing.scan(packer, { boxId, code: next.suggestion.lotCode, pieces });
    if (!right) throw new Error(`Box ${box.serial}: ${sentence}`);
  }
  if (upTo === 'picking') return;
  pass(3);
  const full = await packing.readBox(packer, boxId);
  await packing.markPrinted(packer, { boxId, paper: 'slip' });
  await packing.markPrinted(packer, { boxId, paper: 'guide' });
  await packing.scan(packer, { boxId, code: full.guide.code });
  await packing.weigh(packer, { boxId, milligrams: full.mass.expected + 400 });
  await packing.closeBox(packer, { boxId });
}

async function fulfil(orderId: OrderId, fate: Fate, roll: (below: number) => number): Promise<void> {
  const packer = as(roll(3) === 0 ? 'Tilda Marsh' : 'Bryn Orne');
  await packing.prepareBoxes(packer);
  const boxes = await packing.boxesOfOrder(reading(), orderId);
  for (const box of boxes) await packBox(packer, BoxId.parse(box.id), fate === 'picking' ? 'picking' : 'closed');
  if (fate !== 'shipped') return;
  pass(20);
  await packing.ship(packer, {
    orderId,
    carrier: 'Cantred Carriers',
    trackingNumber: `CC${String(100_000_000 + roll(899_999_999))}GB`,
  });
}

export async function fillOrders(): Promise<void> {
  const roll = dice(4127);
  const onSale: VersionId[] = [];
  for (const kit of await kits.listKits(as('Maud Orrin'))) {
    const release = await kits.currentRelease(reading(), kit.id);
    if (release) onSale.push(release.versionId);
  }
  const plan = story
    .flatMap(({ fate, count, from, to }) =>
      Array.from({ length: count }, (_, index) => ({ fate, day: from + ((to - from) * index) / count })),
    )
    .sort((a, b) => a.day - b.day);
  for (const { fate, day } of plan) {
    goTo(Math.floor(day), 8, Math.floor((day % 1) * 560));
    const orderId = await order(roll, onSale);
    if (fate === 'awaiting') continue;
    if (fate === 'lapsed') {
      pass(45);
      await orders.lapseReservations(systemActor('worker'));
      continue;
    }
    pass(4);
    await pay(orderId);
    if (fate === 'cancelled') {
      pass(50);
      await write(as('Maud Orrin'), (tx) => orders.cancel(tx, orderId));
      await payBack(orderId);
      continue;
    }
    if (fate === 'allocated') continue;
    pass(25 + roll(90));
    await fulfil(orderId, fate, roll);
  }
}
