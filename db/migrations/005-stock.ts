import type { Knex } from 'knex';
import { createTable, makeAppendOnly } from '../dialect';

/**
 * Lots, bins and the ledger of movements. `balances` and `part_stock` are sums kept in the same transaction as their
 * movement; the checks on them refuse a negative stock and an oversold part whatever the code does.
 */
export async function up(sql: Knex): Promise<void> {
  await createTable(sql, 'bins', (table) => {
    table.string('id').primary();
    table.string('code').notNullable().unique();
    /** Walking order of the store. */
    table.integer('position').notNullable();
  });
  await createTable(sql, 'lots', (table) => {
    table.string('id').primary();
    table.string('code').notNullable().unique();
    table.string('part_id').notNullable().references('parts.id');
    table.string('supplier').notNullable();
    table.integer('received_at').notNullable();
    table.string('state').notNullable().checkIn(['quarantine', 'accepted', 'blocked'], 'lot_state');
    table.integer('unit_cost_minor').notNullable().checkBetween([0, 100_000_000], 'lot_cost');
    table.text('measurements').notNullable();
    table.index(['part_id', 'state', 'received_at'], 'lots_by_part');
  });
  await createTable(sql, 'movements', (table) => {
    table.integer('seq').primary();
    table.string('id').notNullable().unique();
    table.integer('at').notNullable();
    table.string('part_id').notNullable().references('parts.id').index('movements_by_part');
    table.string('lot_id').notNullable().references('lots.id').index('movements_by_lot');
    table.string('bin_id').notNullable().references('bins.id').index('movements_by_bin');
    table.integer('quantity').notNullable();
    table
      .string('kind')
      .notNullable()
      .checkIn(['receipt', 'pick', 'pick-return', 'move', 'count-adjust', 'scrap'], 'movement_kind');
    table.string('reason').notNullable();
    table.string('document').notNullable();
    table.string('person_id').references('people.id').index('movements_by_person');
    table.integer('unit_cost_minor').notNullable();
    table.check('quantity <> 0', [], 'movement_moves');
  });
  await makeAppendOnly(sql, 'movements');
  await createTable(sql, 'balances', (table) => {
    table.string('lot_id').notNullable().references('lots.id');
    table.string('bin_id').notNullable().references('bins.id').index('balances_by_bin');
    table.string('part_id').notNullable().references('parts.id').index('balances_by_part');
    table.integer('on_hand').notNullable().checkBetween([0, 1_000_000_000], 'balance_not_negative');
    table.primary(['lot_id', 'bin_id']);
  });
  await createTable(sql, 'part_stock', (table) => {
    table.string('part_id').primary().references('parts.id');
    /** On hand in accepted lots. */
    table.integer('accepted').notNullable().checkBetween([0, 1_000_000_000], 'stock_accepted');
    table.integer('reserved').notNullable().checkBetween([0, 1_000_000_000], 'stock_reserved');
    table.integer('allocated').notNullable().checkBetween([0, 1_000_000_000], 'stock_allocated');
    table.check('reserved + allocated <= accepted', [], 'stock_not_oversold');
  });
}

export async function down(sql: Knex): Promise<void> {
  for (const table of ['part_stock', 'balances', 'movements', 'lots', 'bins']) await sql.schema.dropTable(table);
}
