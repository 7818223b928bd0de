import { beforeAll, describe, expect, it } from 'vitest';
import { type Actor, visitor } from '@/services/access';
import { LotId, newId } from '@/services/ids';
import { Problem } from '@/services/problem';
import { now, reading, setClock, write } from '@/services/record';
import {
  allocate,
  availableOf,
  acceptLot,
  buildable,
  giveBack,
  pick,
  putBack,
  readStore,
  receiveLot,
  reserve,
  suggestLots,
} from '@/services/stock';
import { blockLot, placeOrder, changeBasket, readOrder } from '@/services/orders';
import { minutes } from '@/services/time';
import { testDatabase } from '../../builders/database';
import { ledgerFaults } from '../../builders/ledger';
import {
  type BuiltKit,
  type SetParts,
  deliveryAndTax,
  kit,
  lotOf,
  setParts,
  staff,
  stockFor,
} from '../../builders/orders';

testDatabase();
let packer: Actor;
let checker: Actor;

beforeAll(async () => {
  packer = await staff('Pia Lund', 'packer');
  checker = await staff('Walter Tarrow', 'checker');
  await deliveryAndTax();
});

/** A kit with so many boxes' parts in the store. */
async function stocked(boxes: number): Promise<{ parts: SetParts; of: BuiltKit }> {
  const parts = await setParts();
  const of = await kit({ parts });
  await stockFor(packer, parts, boxes);
  return { parts, of };
}

async function order(of: BuiltKit, quantity = 1) {
  const basketId = newId();
  await changeBasket(visitor, { basketId, versionId: of.versionId, quantity });
  return placeOrder(visitor, {
    basketId,
    email: 'ann@example.org',
    name: 'Ann Tarrant',
    address: { line1: '3 Quay Street', town: 'Pellstow', country: 'GB' },
    deliveryCode: 'parcel',
  });
}

const left = async (id: string) => (await availableOf(reading(), [id])).get(id);
const stock = (id: string) => reading()('part_stock').where({ part_id: id }).first('accepted', 'reserved', 'allocated');
const asStripe = <T>(change: Parameters<typeof write<T>>[1]) => write<T>({ kind: 'system', name: 'stripe' }, change);

describe('receiving a lot', () => {
  it('adds stock that can be promised once it is accepted, and a checker alone takes a block off again', async () => {
    const { former } = await setParts();
    const { lotId } = await lotOf(packer, former, 40, { accepted: false });
    expect(await left(former.id)).toBe(0);
    await acceptLot(packer, { lotId, reason: 'Twelve pieces measured' });
    expect(await left(former.id)).toBe(40);
    await blockLot(checker, { lotId, reason: 'Two are cracked' });
    expect(await left(former.id)).toBe(0);
    await expect(acceptLot(packer, { lotId, reason: 'Looks well' })).rejects.toMatchObject({ kind: 'forbidden' });
    await acceptLot(checker, { lotId, reason: 'The cracked ones are out' });
    const part = (await readStore(packer)).parts.find((one) => one.id === former.id);
    expect(part).toMatchObject({ onHand: 40, accepted: 40, available: 40 });
    expect(part?.lots[0]).toMatchObject({ state: 'accepted', onHand: 40 });
  });

  it('is refused to a buyer, and for a lot code that is in use', async () => {
    const { former } = await setParts();
    const receipt = {
      partId: former.id,
      lotCode: 'L-TWICE',
      supplier: 'Pellstow Wireworks',
      binCode: 'A-1',
      quantity: 5,
      unitCostMinor: 10,
      accepted: true,
    };
    await expect(receiveLot(visitor, receipt)).rejects.toMatchObject({ kind: 'forbidden' });
    await receiveLot(packer, receipt);
    await expect(receiveLot(packer, receipt)).rejects.toMatchObject({ kind: 'refused' });
    expect(await left(former.id)).toBe(5);
  });

  it('names the field where a figure is wrong, and changes nothing', async () => {
    const { former } = await setParts();
    const wrong = {
      partId: former.id,
      lotCode: '?',
      supplier: '',
      binCode: 'C14',
      quantity: 0,
      unitCostMinor: -1,
      accepted: true,
    };
    const problem = await receiveLot(packer, wrong).catch((error: unknown) => error);
    expect(problem).toBeInstanceOf(Problem);
    expect(problem).toMatchObject({ kind: 'invalid' });
    expect(Object.keys((problem as Problem).fields ?? {}).sort()).toEqual(
      ['binCode', 'lotCode', 'quantity', 'supplier', 'unitCostMinor'].sort(),
    );
  });
});

describe('a reservation', () => {
  it('takes all parts of an order or none, and names the part that is short', async () => {
    const { parts } = await stocked(2);
    await lotOf(packer, parts.former, 10);
    const id = (await order(await kit({ parts }))).orderId;
    const before = await stock(parts.former.id);
    const short = asStripe((tx) =>
      reserve(tx, {
        orderId: newId(),
        needs: new Map([
          [parts.former.id, 5],
          [parts.earphone.id, 2],
        ]),
        expiresAt: tx.now + minutes(5),
      }),
    );
    await expect(short).rejects.toThrow(parts.earphone.code);
    expect(await stock(parts.former.id)).toEqual(before);
    expect(id).toBeTruthy();
  });

  it('requests for 3, 3 and 2 against 5 get yes, no and yes', async () => {
    const { of } = await stocked(5);
    const answers = [];
    for (const quantity of [3, 3, 2]) {
      answers.push(
        await order(of, quantity).then(
          () => 'yes',
          () => 'no',
        ),
      );
    }
    expect(answers).toEqual(['yes', 'no', 'yes']);
  });

  it('has no effect after its time, even before the worker has come by', async () => {
    const { of, parts } = await stocked(1);
    await order(of);
    expect(await left(parts.earphone.id)).toBe(0);
    const start = now();
    setClock(() => start + minutes(34));
    expect(await left(parts.earphone.id)).toBe(1);
    expect((await buildable(reading(), of.content)).count).toBe(1);
    await expect(order(of)).resolves.toBeTruthy();
    setClock(undefined);
    expect(await stock(parts.earphone.id)).toMatchObject({ accepted: 1, reserved: 1 });
  });

  it('becomes an allocation once, however often it is asked', async () => {
    const { of, parts } = await stocked(3);
    const { orderId } = await order(of, 2);
    for (let time = 0; time < 3; time++) expect(await asStripe((tx) => allocate(tx, orderId))).toBe('allocated');
    expect(await stock(parts.detector.id)).toEqual({ accepted: 3, reserved: 0, allocated: 2 });
    await asStripe((tx) => giveBack(tx, orderId, 'lapsed'));
    expect(await stock(parts.detector.id)).toMatchObject({ allocated: 2 });
    await asStripe((tx) => giveBack(tx, orderId, 'given-back'));
    await asStripe((tx) => giveBack(tx, orderId, 'given-back'));
    expect(await stock(parts.detector.id)).toEqual({ accepted: 3, reserved: 0, allocated: 0 });
  });
});

describe('picking', () => {
  it('takes from the oldest accepted lot, and its ledger says who, why and for which box', async () => {
    const { of, parts } = await stocked(2);
    const { orderId } = await order(of);
    await asStripe((tx) => allocate(tx, orderId));
    const [first] = await suggestLots(reading(), parts.detector.id, 1);
    expect(first?.quantity).toBe(1);
    const input = {
      orderId,
      partId: parts.detector.id,
      lotId: first?.lotId ?? '',
      binId: first?.binId ?? '',
      quantity: 1,
    };
    await write(packer, (tx) => pick(tx, { ...input, document: 'box EL1A000001' }));
    expect(await stock(parts.detector.id)).toEqual({ accepted: 1, reserved: 0, allocated: 0 });
    const movement = await reading()('movements').where({ part_id: parts.detector.id }).orderBy('seq', 'desc').first();
    expect(movement).toMatchObject({ kind: 'pick', quantity: -1, document: 'box EL1A000001' });
    expect(movement.person_id).not.toBeNull();

    await write(packer, (tx) => putBack(tx, { ...input, document: 'box EL1A000001' }));
    expect(await stock(parts.detector.id)).toEqual({ accepted: 2, reserved: 0, allocated: 1 });
  });

  it('is refused from a blocked lot, a bin with less, and what is promised to others', async () => {
    const { of, parts } = await stocked(2);
    const { orderId } = await order(of, 2);
    await asStripe((tx) => allocate(tx, orderId));
    const [lot] = await suggestLots(reading(), parts.earphone.id, 1);
    const input = {
      orderId: newId(),
      partId: parts.earphone.id,
      lotId: lot?.lotId ?? '',
      binId: lot?.binId ?? '',
      quantity: 1,
      document: 'x',
    };
    await expect(write(packer, (tx) => pick(tx, input))).rejects.toThrow('promised to other orders');
    await expect(write(packer, (tx) => pick(tx, { ...input, quantity: 3 }))).rejects.toThrow('does not hold');
    const other = await lotOf(packer, parts.earphone, 5);
    await blockLot(checker, { lotId: other.lotId, reason: 'Two of five are deaf' });
    await expect(write(packer, (tx) => pick(tx, { ...input, lotId: other.lotId }))).rejects.toThrow('blocked');
    expect(await stock(parts.earphone.id)).toEqual({ accepted: 2, reserved: 0, allocated: 2 });
  });

  it('what is put back into a lot that was blocked meanwhile can be neither promised nor packed', async () => {
    const { of, parts } = await stocked(2);
    const { orderId } = await order(of);
    await asStripe((tx) => allocate(tx, orderId));
    const [lot] = await suggestLots(reading(), parts.detector.id, 1);
    const { lotId = '', binId = '' } = lot ?? {};
    const input = { orderId, partId: parts.detector.id, lotId, binId, quantity: 1, document: 'box' };
    await write(packer, (tx) => pick(tx, input));
    await blockLot(checker, { lotId: LotId.parse(lotId), reason: 'Leaky' });
    await write(packer, (tx) => putBack(tx, input));
    expect(await stock(parts.detector.id)).toEqual({ accepted: 0, reserved: 0, allocated: 0 });
    expect(await ledgerFaults(reading())).toEqual([]);
    await lotOf(packer, parts.detector, 1);
    const [fresh] = await suggestLots(reading(), parts.detector.id, 1);
    await write(packer, (tx) => pick(tx, { ...input, lotId: fresh?.lotId ?? '', binId: fresh?.binId ?? '' }));
    expect(await stock(parts.detector.id)).toEqual({ accepted: 0, reserved: 0, allocated: 0 });
    expect(await ledgerFaults(reading())).toEqual([]);
  });

  it('what is put back stays set aside, also for an order that lost its stock once and got it again', async () => {
    const { of, parts } = await stocked(1);
    const { orderId } = await order(of);
    await asStripe((tx) => allocate(tx, orderId));
    await reading()('orders')
      .where({ id: orderId })
      .update({ payment: 'paid', fulfilment: 'allocated', paid_at: now() });
    const [deaf] = await suggestLots(reading(), parts.earphone.id, 1);
    await blockLot(checker, { lotId: LotId.parse(deaf?.lotId), reason: 'Deaf' });
    await lotOf(packer, parts.earphone, 1);
    expect(await asStripe((tx) => allocate(tx, orderId))).toBe('allocated');

    const takes = [];
    for (const part of Object.values(parts)) {
      const quantity = part.values.kind === 'wire' ? 16_000 : 1;
      const [lot] = await suggestLots(reading(), part.id, quantity);
      const { lotId = '', binId = '' } = lot ?? {};
      takes.push({ orderId, partId: part.id, lotId, binId, quantity, document: 'box' });
    }
    for (const take of takes) await write(packer, (tx) => pick(tx, take));
    for (const take of takes) await write(packer, (tx) => putBack(tx, take));
    expect(await stock(parts.detector.id)).toEqual({ accepted: 1, reserved: 0, allocated: 1 });
    expect(await ledgerFaults(reading())).toEqual([]);
  });

  it('a cut length comes from one reel that holds all of it', async () => {
    const { wire } = await setParts();
    await lotOf(packer, wire, 9_000);
    const second = await lotOf(packer, wire, 40_000);
    const suggested = await suggestLots(reading(), wire.id, 16_000);
    expect(suggested).toMatchObject([{ lotId: second.lotId, quantity: 16_000 }]);
  });
});

describe('blocking a lot', () => {
  it('makes the youngest orders wait for stock again, and tells their buyers and the owner', async () => {
    const { of, parts } = await stocked(2);
    const start = now();
    setClock(() => start + 1);
    const older = await order(of);
    setClock(() => start + 2);
    const younger = await order(of);
    setClock(undefined);
    for (const one of [older, younger]) {
      await asStripe((tx) => allocate(tx, one.orderId));
      await reading()('orders')
        .where({ id: one.orderId })
        .update({ payment: 'paid', fulfilment: 'allocated', paid_at: start });
    }
    await lotOf(packer, parts.detector, 1);
    const store = await readStore(checker);
    const lot = store.parts.find((part) => part.id === parts.detector.id)?.lots.find((one) => one.onHand === 2);
    await expect(blockLot(packer, { lotId: lot!.id, reason: 'Leaky' })).rejects.toMatchObject({ kind: 'forbidden' });
    expect(await blockLot(checker, { lotId: lot!.id, reason: 'Leaky' })).toEqual({ waiting: 1 });
    expect((await readOrder(visitor, younger)).fulfilment).toBe('backordered');
    expect((await readOrder(visitor, older)).fulfilment).toBe('allocated');
    expect(await stock(parts.detector.id)).toEqual({ accepted: 1, reserved: 0, allocated: 1 });
    const line = await reading()('changes').where({ subject_id: younger.orderId, action: 'order.backordered' }).first();
    expect(line).toMatchObject({ actor_name: 'Walter Tarrow', before: '{"fulfilment":"allocated"}' });
    const mails = await reading()('outbox').where('key', 'like', `%${younger.orderId}%`).pluck('key');
    expect(mails).toEqual([`order-backordered:${younger.orderId}`]);
  });
});
