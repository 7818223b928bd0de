import { execFile } from 'node:child_process';
import { promisify } from 'node:util';
import fc from 'fast-check';
import { beforeAll, expect, it } from 'vitest';
import type { Actor } from '@/services/access';
import { BoxId } from '@/services/ids';
import { blockLot } from '@/services/orders';
import {
  claimBox,
  closeBox,
  listBoxes,
  markPrinted,
  prepareBoxes,
  putBack,
  readBox,
  scan,
  ship,
  tellEmpty,
  traceBox,
  traceLot,
  weigh,
} from '@/services/packing';
import { Problem } from '@/services/problem';
import { reading, setClock } from '@/services/record';
import { minutes } from '@/services/time';
import { type Millrace, millrace, paidOrder, stocked } from '../builders/boxes';
import { crashAfter, stopCrashing } from '../builders/crashes';
import { testDatabase } from '../builders/database';
import { ledgerFaults } from '../builders/ledger';
import { lotOf, staff } from '../builders/orders';

const run = promisify(execFile);
const database = testDatabase();
type Staff = Extract<Actor, { kind: 'staff' }>;
let packers: [Staff, Staff];
let checker: Staff;
let kit: Millrace;

beforeAll(async () => {
  packers = [await staff('Bo Orne', 'packer'), await staff('Ann Weir', 'packer')];
  checker = await staff('Walter Tarrow', 'checker');
  kit = await millrace();
  await stocked(packers[0], kit, 400);
  // A second lot of each part, so that a box may hold pieces of two.
  await stocked(packers[0], kit, 400);
});

/** What does not agree between boxes, lots and the ledger; an empty list is what every test wants. */
async function traceFaults(): Promise<string[]> {
  const faults: string[] = [];
  const boxes = await reading()('boxes').select<{ id: string; serial: string; state: string }[]>(
    'id',
    'serial',
    'state',
  );
  for (const box of boxes) {
    const trace = await traceBox(packers[0], box.serial);
    const booked: { code: string; quantity: number }[] = await reading()('movements')
      .join('lots', 'lots.id', 'movements.lot_id')
      .where({ document: box.serial })
      .groupBy('lots.code')
      .select({ code: 'lots.code' })
      .sum({ quantity: 'movements.quantity' });
    const left = new Map(booked.map((row) => [row.code, -Number(row.quantity)]));
    const listed = new Set(trace.lines.flatMap((line) => line.lots.map((lot) => lot.lotCode)));
    for (const [code, quantity] of left) {
      if (quantity > 0 !== listed.has(code)) faults.push(`${box.serial}: the ledger says ${quantity} of ${code}`);
    }
    for (const code of listed) {
      if (!left.has(code)) faults.push(`${box.serial} lists ${code}, which never left the store for it`);
      const lot = await traceLot(packers[0], code);
      if (!lot.boxes.some((one) => one.serial === box.serial)) faults.push(`${code} does not list ${box.serial}`);
    }
    if (box.state === 'closed' || box.state === 'shipped') {
      for (const line of trace.lines)
        if (line.lots.length === 0) faults.push(`${box.serial} is closed without ${line.reference}`);
    }
  }
  const lines: { id: string; packed: number; picked: number | null }[] = await reading()('box_lines')
    .leftJoin('box_picks', 'box_picks.box_line_id', 'box_lines.id')
    .groupBy('box_lines.id', 'box_lines.packed')
    .select({ id: 'box_lines.id', packed: 'box_lines.packed' })
    .sum({ picked: 'box_picks.quantity' });
  for (const line of lines)
    if (line.packed !== Number(line.picked ?? 0))
      faults.push(`line ${line.id} says ${line.packed}, its picks ${line.picked}`);
  return faults;
}

/** What two packers and a checker do, one deed each; a refusal is an answer like any other. */
class Floor {
  clock = Date.now();

  private async someBox(n: number): Promise<BoxId | null> {
    const { mine, free, others } = await listBoxes(this.packer(n));
    const all = [...mine, ...mine, ...mine, ...free, ...others];
    return all[n % Math.max(1, all.length)]?.id ?? null;
  }

  private packer = (n: number): Staff => packers[n % 2 === 0 ? 0 : 1];

  readonly deeds: ((n: number) => Promise<unknown>)[] = [
    () => paidOrder(kit, 1),
    async (n) => {
      const boxId = await this.someBox(n);
      return boxId && claimBox(this.packer(n), { boxId });
    },
    (n) => this.scanNext(n, 1),
    (n) => this.scanNext(n, 3),
    (n) => this.fillBox(n),
    async (n) => {
      const boxId = await this.someBox(n);
      if (!boxId) return;
      const { places } = await readBox(this.packer(n), boxId);
      const place = places[n % places.length];
      return place && putBack(this.packer(n), { boxId, lineId: place.lineId });
    },
    async (n) => {
      const boxId = await this.someBox(n);
      if (!boxId) return;
      const { nextLineId } = await readBox(this.packer(n), boxId);
      return nextLineId && tellEmpty(this.packer(n), { boxId, lineId: nextLineId });
    },
    (n) => this.finish(n),
    async (n) => {
      const boxId = await this.someBox(n);
      return boxId && closeBox(this.packer(n), { boxId });
    },
    async (n) => {
      const order = await reading()('orders')
        .where('fulfilment', n % 3 === 0 ? 'picking' : 'packed')
        .first<{ id: string }>('id');
      return (
        order && ship(packers[0], { orderId: order.id, carrier: 'Fell Carriers', trackingNumber: `FC ${1000 + n}` })
      );
    },
    async (n) => {
      const part = [...kit.parts.values()].filter((one) => one.values.kind !== 'print')[n % 13];
      if (!part) return;
      const { lotId } = await lotOf(packers[0], part, 50_000);
      if (n % 4 === 0) await blockLot(checker, { lotId, reason: 'cracked in transit' });
    },
    async (n) => setClock(() => (this.clock += minutes(n % 20))),
    (n) => this.packWhole(n),
  ];

  private async scanNext(n: number, pieces: number) {
    const boxId = await this.someBox(n);
    if (!boxId) return;
    const { places } = await readBox(this.packer(n), boxId);
    const place = places[n % places.length];
    if (place?.suggestion) await scan(this.packer(n), { boxId, code: place.suggestion.lotCode, pieces });
  }

  private async fillBox(n: number, which?: BoxId) {
    const boxId = which ?? (await this.someBox(n));
    if (!boxId) return;
    const packer = this.packer(n);
    for (const place of (await readBox(packer, boxId)).places) {
      if (!place.suggestion || place.state === 'in') continue;
      const pieces = place.unit === 'each' ? place.needed - place.packed : 1;
      await scan(packer, { boxId, code: place.suggestion.lotCode, pieces });
    }
  }

  private async packWhole(n: number) {
    const packer = this.packer(n);
    const { mine, free } = await listBoxes(packer);
    const boxId = [...mine, ...free][0]?.id;
    if (!boxId) return;
    await claimBox(packer, { boxId });
    await this.fillBox(n, boxId);
    await this.finish(n, boxId);
    await closeBox(packer, { boxId });
  }

  private async finish(n: number, which?: BoxId) {
    const boxId = which ?? (await this.someBox(n));
    if (!boxId) return;
    const packer = this.packer(n);
    const box = await readBox(packer, boxId);
    await scan(packer, { boxId, code: box.guide.code });
    await weigh(packer, { boxId, milligrams: box.mass.expected });
    await markPrinted(packer, { boxId, paper: 'slip' });
  }
}

async function orRefused(deed: Promise<unknown>): Promise<void> {
  try {
    await deed;
  } catch (error) {
    if (!(error instanceof Problem) && !String(error).includes('died here')) throw error;
  }
}

it('boxes, lots and the ledger tell the same story, whatever two packers do and wherever a process dies', async () => {
  await fc.assert(
    fc.asyncProperty(
      fc.array(
        fc.record({
          // Half of what happens is a packer going on with a box.
          deed: fc.oneof(fc.nat(12), fc.constantFrom(1, 4, 7, 8, 12, 12)),
          n: fc.nat(97),
          dies: fc.oneof(
            { weight: 9, arbitrary: fc.constant(null) },
            { weight: 1, arbitrary: fc.integer({ min: 2, max: 60 }) },
          ),
        }),
        { minLength: 20, maxLength: 50, size: 'max' },
      ),
      async (schedule) => {
        const floor = new Floor();
        try {
          for (const { deed, n, dies } of schedule) {
            if (dies !== null) crashAfter(database.sql, dies);
            await orRefused(floor.deeds[deed]?.(n) ?? Promise.resolve());
            stopCrashing(database.sql);
          }
        } finally {
          stopCrashing(database.sql);
          setClock(undefined);
        }
        expect(await traceFaults()).toEqual([]);
        expect(await ledgerFaults(reading())).toEqual([]);
      },
    ),
    { numRuns: 20 },
  );
  const closed = await reading()('boxes').whereIn('state', ['closed', 'shipped']).select('id');
  expect(closed.length).toBeGreaterThan(3);
});

it('a whole walk leaves every piece of a closed box on exactly one lot, and that lot on that box', async () => {
  await paidOrder(kit, 1);
  await prepareBoxes(packers[0]);
  const free = (await listBoxes(packers[0])).free[0];
  if (!free) throw new Error('no box waits');
  const boxId = free.id;
  await claimBox(packers[0], { boxId });
  for (;;) {
    const { places, nextLineId } = await readBox(packers[0], boxId);
    const next = places.find((place) => place.lineId === nextLineId);
    if (!next?.suggestion) break;
    await scan(packers[0], { boxId, code: next.suggestion.lotCode });
  }
  const { serial, pieces } = await readBox(packers[0], boxId);
  expect(pieces.packed).toBe(pieces.needed);
  const trace = await traceBox(packers[0], serial);
  for (const line of trace.lines) {
    const total = line.lots.reduce((sum, lot) => sum + Number.parseFloat(lot.amount), 0);
    expect(total).toBe(Number.parseFloat(line.needed));
  }
  expect(await traceFaults()).toEqual([]);
});

it('two packers in two processes never get the same box, and every box goes to one of them', async () => {
  for (let order = 0; order < 20; order++) await paidOrder(kit, 2);
  await prepareBoxes(packers[0]);
  const free = await reading()('boxes').where('state', 'to-pack').orderBy('serial', 'desc').limit(40).pluck('id');
  expect(free).toHaveLength(40);
  const begin = String(Date.now() + 4000);
  const answers = await Promise.all(
    packers.map(async (packer) => {
      const script = [
        '--import',
        'tsx',
        'test/builders/packer-process.ts',
        database.filename,
        packer.id,
        begin,
        free.join(','),
      ];
      const { stdout } = await run(process.execPath, script);
      return JSON.parse(stdout.trim().split('\n').at(-1) ?? '{}') as { got: string[]; refusals: string[] }; // printed by our own script
    }),
  );
  const [first, second] = answers;
  const both = [...(first?.got ?? []), ...(second?.got ?? [])];
  expect([...both].sort()).toEqual([...free].sort());
  for (const [index, answer] of answers.entries()) {
    for (const boxId of answer.got) {
      const row = await reading()('boxes').where('id', boxId).first<{ claimed_by: string }>('claimed_by');
      expect(row?.claimed_by).toBe(packers[index]?.id);
    }
    for (const sentence of answer.refusals) expect(sentence).toMatch(/has box MW4F\d{6}. since/);
  }
});
