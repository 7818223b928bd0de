import type { Knex } from 'knex';
import { type Actor, must } from '../access';
import { partsOfBox } from '../kits/rules';
import type { VersionContent } from '../kits/schemas';
import { PartValues, silhouetteOf } from '../parts/schemas';
import { now, reading } from '../record';
import { type Buildable, availableFrom, buildableFrom } from './rules';
import * as rows from './rows';
import { type Receivable, type StoreView, StoreView as StoreViewSchema } from './schemas';

/** What can be promised of each part now. A reservation past its time no longer counts. */
export async function availableOf(sql: Knex, partIds: readonly string[]): Promise<Map<string, number>> {
  const available = await rows.availableRows(sql, partIds);
  const due = await rows.heldByDue(sql, now());
  return new Map([...available].map(([id, quantity]) => [id, quantity + (due.get(id) ?? 0)]));
}

/** The parts of one box by their rows' ids, with base units; the codes are those of the frozen content. */
export async function needsOf(sql: Knex, content: Pick<VersionContent, 'lines'>): Promise<Map<string, number>> {
  const needs = partsOfBox(content);
  const ids = await idsByCode(sql, [...needs.keys()]);
  const byId = new Map<string, number>();
  for (const [code, quantity] of needs) {
    const id = ids.get(code);
    if (id === undefined) throw new Error(`Part ${code} of a frozen version is not in the list of parts.`);
    byId.set(id, quantity);
  }
  return byId;
}

/** How many boxes the store makes now, if only this kit is built, and what runs out first. */
export async function buildable(sql: Knex, content: Pick<VersionContent, 'lines'>): Promise<Buildable> {
  const needs = partsOfBox(content);
  const ids = await idsByCode(sql, [...needs.keys()]);
  const available = await availableOf(sql, [...ids.values()]);
  return buildableFrom(needs, (code) => available.get(ids.get(code) ?? '') ?? 0);
}

async function idsByCode(sql: Knex, codes: readonly string[]): Promise<Map<string, string>> {
  const found = await sql('parts')
    .whereIn('code', [...codes])
    .select<{ id: string; code: string }[]>('id', 'code');
  return new Map(found.map((part) => [part.code, part.id]));
}

export interface SuggestedLot {
  lotId: string;
  lotCode: string;
  binId: string;
  binCode: string;
  quantity: number;
}

/**
 * Where to fetch a quantity: accepted lots, oldest receipt first. A cut length comes from one reel, so that the oldest
 * reel which still holds all of it is named where there is one.
 */
export async function suggestLots(sql: Knex, partId: string, quantity: number): Promise<SuggestedLot[]> {
  const part = await rows.findPart(sql, partId);
  const balances = await rows.acceptedBalances(sql, partId);
  const whole = part?.unit === 'metre' ? balances.find((balance) => balance.onHand >= quantity) : undefined;
  const suggested: SuggestedLot[] = [];
  let open = quantity;
  for (const { onHand, ...place } of whole ? [whole] : balances) {
    if (open <= 0) break;
    const taken = Math.min(open, onHand);
    suggested.push({ ...place, quantity: taken });
    open -= taken;
  }
  return suggested;
}

/** On hand by part, lot and bin. */
export async function readStore(actor: Actor): Promise<StoreView> {
  must(actor, 'stock.read');
  const sql = reading();
  const parts = await sql('parts')
    .leftJoin('part_stock', 'part_stock.part_id', 'parts.id')
    .whereNull('parts.retired_at')
    .orWhere('part_stock.accepted', '>', 0)
    .orderBy('parts.code')
    .select<PartLine[]>(
      'parts.id as id',
      'parts.code as code',
      'parts.name as name',
      'parts.values as values',
      'parts.unit as unit',
      'part_stock.accepted as accepted',
      'part_stock.reserved as reserved',
      'part_stock.allocated as allocated',
    );
  const lots = await lotsByPart(sql);
  const due = await rows.heldByDue(sql, now());
  return StoreViewSchema.parse({
    parts: parts.map((part) => {
      const sums = {
        accepted: part.accepted ?? 0,
        reserved: (part.reserved ?? 0) - (due.get(part.id) ?? 0),
        allocated: part.allocated ?? 0,
      };
      const held = lots.get(part.id) ?? [];
      return {
        id: part.id,
        code: part.code,
        name: part.name,
        silhouette: silhouetteOf(PartValues.parse(JSON.parse(part.values))),
        unit: part.unit,
        onHand: held.reduce((all, lot) => all + lot.onHand, 0),
        ...sums,
        available: availableFrom(sums),
        lots: held,
      };
    }),
  });
}

/** The parts that a delivery may be of, for whoever may receive one. */
export async function readReceiving(actor: Actor): Promise<Receivable[]> {
  must(actor, 'stock.receive');
  const { parts } = await readStore(actor);
  return parts.map(({ id, code, name, unit, lots }) => ({
    id,
    code,
    name,
    unit,
    bins: [...new Set(lots.flatMap((lot) => lot.bins.map((bin) => bin.code)))],
  }));
}

interface PartLine {
  id: string;
  code: string;
  name: string;
  values: string;
  unit: string;
  accepted: number | null;
  reserved: number | null;
  allocated: number | null;
}

interface LotLine {
  id: string;
  code: string;
  supplier: string;
  state: string;
  receivedAt: number;
  onHand: number;
  bins: { id: string; code: string; onHand: number }[];
}

async function lotsByPart(sql: Knex): Promise<Map<string, LotLine[]>> {
  const balances = await sql('lots')
    .leftJoin('balances', 'balances.lot_id', 'lots.id')
    .leftJoin('bins', 'bins.id', 'balances.bin_id')
    .orderBy(['lots.part_id', 'lots.received_at', 'lots.code', 'bins.position'])
    .select<
      (Omit<LotLine, 'bins'> & { partId: string; binId: string | null; binCode: string | null; held: number | null })[]
    >(
      'lots.id as id',
      'lots.part_id as partId',
      'lots.code as code',
      'lots.supplier as supplier',
      'lots.state as state',
      'lots.received_at as receivedAt',
      'bins.id as binId',
      'bins.code as binCode',
      'balances.on_hand as held',
    );
  const byPart = new Map<string, LotLine[]>();
  for (const row of balances) {
    const lots = byPart.get(row.partId) ?? [];
    byPart.set(row.partId, lots);
    let lot = lots.find((one) => one.id === row.id);
    if (!lot) {
      const { id, code, supplier, state, receivedAt } = row;
      lot = { id, code, supplier, state, receivedAt, onHand: 0, bins: [] };
      lots.push(lot);
    }
    if (row.binId !== null && row.binCode !== null && (row.held ?? 0) > 0) {
      lot.onHand += row.held ?? 0;
      lot.bins.push({ id: row.binId, code: row.binCode, onHand: row.held ?? 0 });
    }
  }
  return byPart;
}
