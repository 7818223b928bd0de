import type { Knex } from 'knex';
import { createTable, makeAppendOnly } from '../dialect';

/** Boxes, what goes and went into them lot by lot, and the parcels they leave in. */
export async function up(sql: Knex): Promise<void> {
  await createTable(sql, 'shipments', (table) => {
    table.string('id').primary();
    table.string('order_id').notNullable().references('orders.id').index('shipments_by_order');
    table.string('carrier').notNullable();
    table.string('tracking_number').notNullable();
    table.integer('shipped_at').notNullable().index('shipments_by_time');
    table.string('shipped_by').notNullable().references('people.id').index('shipments_by_person');
  });
  await createTable(sql, 'boxes', (table) => {
    table.string('id').primary();
    table.string('serial').notNullable().unique();
    table.string('order_id').notNullable().references('orders.id');
    table.string('order_line_id').notNullable().references('order_lines.id').index('boxes_by_order_line');
    table.string('version_id').notNullable().references('versions.id').index('boxes_by_version');
    /** 1 of 2, 2 of 2 within the order. */
    table.integer('position').notNullable();
    table.string('state').notNullable().checkIn(['to-pack', 'packing', 'closed', 'shipped'], 'box_state');
    table.string('claimed_by').references('people.id').index('boxes_by_packer');
    table.integer('claimed_at');
    table.integer('expected_milligrams').notNullable().checkBetween([1, 100_000_000], 'box_expected');
    table.integer('weighed_milligrams');
    table.integer('slip_printed_at');
    table.integer('guide_printed_at');
    table.integer('guide_scanned_at');
    table.string('closed_by').references('people.id').index('boxes_by_closer');
    table.integer('closed_at');
    table.string('shipment_id').references('shipments.id').index('boxes_by_shipment');
    table.unique(['order_id', 'position']);
    table.index(['state', 'id'], 'boxes_by_state');
    table.check("(state in ('closed', 'shipped')) = (closed_at is not null)", [], 'box_closed_has_time');
    table.check("state not in ('closed', 'shipped') or guide_scanned_at is not null", [], 'box_closed_has_guide');
  });
  await createTable(sql, 'box_lines', (table) => {
    table.string('id').primary();
    table.string('box_id').notNullable().references('boxes.id');
    table.string('reference').notNullable();
    table.string('part_id').notNullable().references('parts.id').index('box_lines_by_part');
    table.integer('needed').notNullable().checkBetween([1, 1_000_000], 'box_line_needed');
    table.integer('packed').notNullable().checkBetween([0, 1_000_000], 'box_line_packed');
    table.integer('position').notNullable();
    /** When the packer found the suggested bin empty, and which one; the next suggestion passes it by. */
    table.integer('told_empty_at');
    table.string('told_empty_bin_id').references('bins.id').index('box_lines_by_told_bin');
    table.unique(['box_id', 'reference']);
    table.check('packed <= needed', [], 'box_line_not_over');
  });
  await createTable(sql, 'box_picks', (table) => {
    table.string('id').primary();
    table.string('box_line_id').notNullable().references('box_lines.id').index('box_picks_by_line');
    table.string('box_id').notNullable().references('boxes.id').index('box_picks_by_box');
    table.string('part_id').notNullable().references('parts.id').index('box_picks_by_part');
    table.string('lot_id').notNullable().references('lots.id').index('box_picks_by_lot');
    table.string('bin_id').notNullable().references('bins.id').index('box_picks_by_bin');
    /** Negative where a piece was put back. */
    table.integer('quantity').notNullable();
    table.string('person_id').notNullable().references('people.id').index('box_picks_by_person');
    table.integer('at').notNullable();
  });
  await makeAppendOnly(sql, 'box_picks');
}

export async function down(sql: Knex): Promise<void> {
  for (const table of ['box_picks', 'box_lines', 'boxes', 'shipments']) await sql.schema.dropTable(table);
}
