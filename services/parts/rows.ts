import type { Knex } from 'knex';
import { PartId } from '../ids';
import { Currency, type Money } from '../money';
import { missing } from '../problem';
import { PartValues, partKinds, type PartUnit, type Place } from './schemas';

/** A part as the table holds it, its values parsed. */
export interface Part {
  id: PartId;
  code: string;
  name: string;
  unit: PartUnit;
  massMilligrams: number;
  values: PartValues;
  cost: Money;
  note: string;
  saveNo: number;
  retiredAt: number | null;
}

const columns = [
  'parts.id',
  'parts.code',
  'parts.name',
  'parts.mass_milligrams',
  'parts.values',
  'parts.cost_minor',
  'parts.currency',
  'parts.note',
  'parts.save_no',
  'parts.retired_at',
] as const;

export interface PartRow {
  id: string;
  code: string;
  name: string;
  mass_milligrams: number;
  values: string;
  cost_minor: number;
  currency: string;
  note: string;
  save_no: number;
  retired_at: number | null;
}

export function partOf(row: PartRow): Part {
  const values = PartValues.parse(JSON.parse(row.values));
  return {
    id: PartId.parse(row.id),
    code: row.code,
    name: row.name,
    unit: partKinds[values.kind].unit,
    massMilligrams: row.mass_milligrams,
    values,
    cost: { minor: row.cost_minor, currency: Currency.parse(row.currency) },
    note: row.note,
    saveNo: row.save_no,
    retiredAt: row.retired_at,
  };
}

export async function getPart(sql: Knex, id: PartId): Promise<Part> {
  const row = await sql('parts')
    .select(...columns)
    .where('parts.id', id)
    .first<PartRow | undefined>();
  if (!row) throw missing('There is no such part. Look for it in the list of parts.');
  return partOf(row);
}

export interface Stock {
  onHand: number;
  available: number;
}
export type StockedRow = PartRow & {
  on_hand: number | null;
  /** Null for a part that was never received. */
  accepted: number | null;
  reserved: number | null;
  allocated: number | null;
};

/** Parts with what the store holds of each: a page for a screen. */
export function selectStocked(sql: Knex): Knex.QueryBuilder {
  return sql('parts')
    .leftJoin('part_stock', 'part_stock.part_id', 'parts.id')
    .select(...columns)
    .select('part_stock.accepted', 'part_stock.reserved', 'part_stock.allocated')
    .select({ on_hand: sql('balances').sum('balances.on_hand').where('balances.part_id', sql.ref('parts.id')) });
}

export const stockOf = (row: StockedRow): Stock => ({
  onHand: row.on_hand ?? 0,
  available: (row.accepted ?? 0) - (row.reserved ?? 0) - (row.allocated ?? 0),
});

export async function insertPart(sql: Knex, part: Part, at: number): Promise<void> {
  await sql('parts').insert({ ...rowOf(part), id: part.id, code: part.code, created_at: at, retired_at: null });
}

/** False when somebody saved the part after `basedOn`. */
export async function updatePart(sql: Knex, part: Part, basedOn: number): Promise<boolean> {
  const changed = await sql('parts')
    .where({ id: part.id, save_no: basedOn })
    .update({ ...rowOf(part), retired_at: part.retiredAt });
  return changed === 1;
}

const rowOf = (part: Part) => ({
  kind: part.values.kind,
  name: part.name,
  unit: part.unit,
  mass_milligrams: part.massMilligrams,
  values: JSON.stringify(part.values),
  cost_minor: part.cost.minor,
  currency: part.cost.currency,
  note: part.note,
  save_no: part.saveNo,
});

/** Kinds that may stand in a place. */
export const kindsAt = (place: Place) =>
  Object.entries(partKinds)
    .filter(([, kind]) => kind.places.includes(place))
    .map(([name]) => name);
