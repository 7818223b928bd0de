import type { Knex } from 'knex';
import { createTable } from '../dialect';

const kinds = [
  'coil-former',
  'wire',
  'variable-capacitor',
  'foil-capacitor',
  'fixed-capacitor',
  'resistor',
  'detector',
  'earphone',
  'transformer',
  'aerial-wire',
  'earth-lead',
  'hardware',
  'tool',
  'print',
  'packaging',
];

/** Parts with the values of their kind. Their former values stay in the record of changes. */
export async function up(sql: Knex): Promise<void> {
  await createTable(sql, 'parts', (table) => {
    table.string('id').primary();
    table.string('code').notNullable().unique();
    table.string('kind').notNullable().checkIn(kinds, 'part_kind');
    table.string('name').notNullable();
    table.string('unit').notNullable().checkIn(['each', 'metre', 'gram'], 'part_unit');
    /** Of one piece, one metre or one gram. */
    table.integer('mass_milligrams').notNullable().checkBetween([0, 100_000_000], 'part_mass');
    table.text('values').notNullable();
    table.integer('cost_minor').notNullable().checkBetween([0, 100_000_000], 'part_cost');
    table.string('currency').notNullable();
    table.text('note').notNullable();
    table.integer('save_no').notNullable();
    table.integer('created_at').notNullable();
    table.integer('retired_at');
    table.index(['kind', 'code'], 'parts_by_kind');
  });
}

export async function down(sql: Knex): Promise<void> {
  await sql.schema.dropTable('parts');
}
