import { execFile } from 'node:child_process';
import { promisify } from 'node:util';
import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { type Actor, systemActor, visitor } from '@/services/access';
import { newId } from '@/services/ids';
import { blockLot, cancel, changeBasket, lapseReservations, markPaid, placeOrder } from '@/services/orders';
import { Problem } from '@/services/problem';
import { money } from '@/services/money';
import { reading, setClock, write } from '@/services/record';
import { pick, putBack, readStore, suggestLots } from '@/services/stock';
import { minutes } from '@/services/time';
import { testDatabase } from '../builders/database';
import { crashAfter, stopCrashing } from '../builders/crashes';
import { ledgerFaults } from '../builders/ledger';
import {
  type BuiltKit,
  type SetParts,
  deliveryAndTax,
  kit,
  lotOf,
  setParts,
  staff,
  stockFor,
} from '../builders/orders';

const run = promisify(execFile);
const database = testDatabase();
let packer: Actor;
let checker: Actor;

beforeAll(async () => {
  packer = await staff('Pia Lund', 'packer');
  checker = await staff('Walter Tarrow', 'checker');
  await deliveryAndTax();
});

async function order(of: BuiltKit, quantity = 1): Promise<string> {
  const basketId = newId();
  await changeBasket(visitor, { basketId, versionId: of.versionId, quantity });
  const placed = await placeOrder(visitor, {
    basketId,
    email: 'ann@example.org',
    name: 'Ann Tarrant',
    address: { line1: '3 Quay Street', town: 'Pellstow', country: 'GB' },
    deliveryCode: 'parcel',
  });
  return placed.orderId;
}

/** What the yard's people and machines do to the stock, one deed each; a refusal is an answer like any other. */
class Yard {
  readonly orders: string[] = [];
  readonly picks: Parameters<typeof pick>[1][] = [];
  clock = 1_764_000_000_000;

  constructor(
    readonly of: BuiltKit,
    readonly parts: SetParts,
  ) {}

  private any<T>(list: readonly T[], at: number): T | undefined {
    return list[at % Math.max(1, list.length)];
  }

  readonly deeds: ((n: number) => Promise<unknown>)[] = [
    async (n) => this.orders.push(await order(this.of, 1 + (n % 3))),
    async (n) => {
      const orderId = this.any(this.orders, n);
      if (!orderId) return;
      const row = await reading()('orders').where({ id: orderId }).first('total_minor');
      const amount = money(row.total_minor, 'GBP');
      await write(systemActor('stripe'), (tx) => markPaid(tx, { orderId, reference: `pi_${orderId}`, amount }));
    },
    async (n) => {
      const orderId = this.any(this.orders, n);
      if (orderId) await write(visitor, (tx) => cancel(tx, orderId));
    },
    async (n) => {
      this.clock += minutes(n % 50);
      await lapseReservations(systemActor('worker'));
    },
    async (n) => lotOf(packer, this.any(Object.values(this.parts), n)!, 1 + (n % 40_000)),
    async (n) => {
      const part = this.any(Object.values(this.parts), n)!;
      const lots = (await readStore(checker)).parts.find((one) => one.id === part.id)?.lots ?? [];
      const lot = this.any(lots, n);
      if (lot) await blockLot(checker, { lotId: lot.id, reason: 'Looks odd' });
    },
    async (n) => {
      const orderId = this.any(this.orders, n);
      const part = this.any(Object.values(this.parts), n)!;
      const [lot] = await suggestLots(reading(), part.id, 1 + (n % 2));
      if (!orderId || !lot) return;
      const input = {
        orderId,
        partId: part.id,
        lotId: lot.lotId,
        binId: lot.binId,
        quantity: lot.quantity,
        document: 'box',
      };
      await write(packer, (tx) => pick(tx, input));
      this.picks.push(input);
    },
    async (n) => {
      const back = this.picks.splice(n % Math.max(1, this.picks.length), 1)[0];
      if (back) await write(packer, (tx) => putBack(tx, back));
    },
  ];
}

describe('the books of the store', () => {
  it('agree after any order of buyers, payments, packers, checkers, lapses and crashes', async () => {
    let refusals = 0;
    const step = fc.record({
      deed: fc.nat({ max: 7 }),
      n: fc.nat({ max: 1_000_000 }),
      crash: fc.option(fc.integer({ min: 1, max: 30 }), { freq: 5 }),
    });
    await fc.assert(
      fc.asyncProperty(fc.array(step, { minLength: 10, maxLength: 30 }), async (steps) => {
        const parts = await setParts();
        const yard = new Yard(await kit({ parts }), parts);
        await stockFor(packer, parts, 4);
        setClock(() => yard.clock);
        for (const { deed, n, crash } of steps) {
          if (crash !== null) crashAfter(database.sql, crash);
          await yard.deeds[deed]?.(n).catch((error: unknown) => {
            if (error instanceof Problem) refusals++;
            else if (crash === null) throw error;
          });
          stopCrashing(database.sql);
          expect(await ledgerFaults(reading())).toEqual([]);
        }
        setClock(undefined);
      }),
      { numRuns: Number(process.env['YARDS'] ?? 40) },
    );
    expect(refusals).toBeGreaterThan(10);
  });

  it('cannot be edited: a movement is neither changed nor removed, a balance never below zero', async () => {
    const parts = await setParts();
    await stockFor(packer, parts, 2);
    const sql = reading();
    await expect(sql('movements').update({ quantity: 99 })).rejects.toThrow('append-only');
    await expect(sql('movements').delete()).rejects.toThrow('append-only');
    await expect(sql('balances').where({ part_id: parts.former.id }).update({ on_hand: -1 })).rejects.toThrow(
      'balance_not_negative',
    );
    const twice = sql('part_stock').where({ part_id: parts.former.id }).update({ reserved: 2, allocated: 1 });
    await expect(twice).rejects.toThrow('stock_not_oversold');
  });
});

describe('the last kits', () => {
  it('three go to exactly three of fifty buyers at once, and the others are told', async () => {
    const parts = await setParts();
    const of = await kit({ parts });
    await stockFor(packer, parts, 3);
    const answers = await Promise.all(
      Array.from({ length: 50 }, () =>
        order(of).then(
          () => 'got it',
          (error: unknown) => (error instanceof Problem ? error.message : Promise.reject(error as Error)),
        ),
      ),
    );
    expect(answers.filter((answer) => answer === 'got it')).toHaveLength(3);
    expect(new Set(answers).size).toBe(2);
    expect(answers.find((answer) => answer !== 'got it')).toMatch(/^None of .* can be made just now/);
    expect(await ledgerFaults(reading())).toEqual([]);
  });

  it('one goes to exactly one of two processes', async () => {
    const parts = await setParts();
    const of = await kit({ parts });
    await stockFor(packer, parts, 1);
    const script = ['--import', 'tsx', 'test/builders/buyer-process.ts', database.filename, of.versionId, '5'];
    const buyers = await Promise.all([run(process.execPath, script), run(process.execPath, script)]);
    const answers = buyers.flatMap(({ stdout }) => JSON.parse(stdout.trim().split('\n').at(-1) ?? '[]') as string[]); // printed by our own script
    expect(answers).toHaveLength(10);
    expect(answers.filter((answer) => answer === 'got it')).toHaveLength(1);
    expect(await ledgerFaults(reading())).toEqual([]);
  });
});
