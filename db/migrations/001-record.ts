import type { Knex } from 'knex';
import { createTable, makeAppendOnly } from '../dialect';

/** The record of changes, the outbox and the counters that documents take their numbers from. */
export async function up(sql: Knex): Promise<void> {
  await createTable(sql, 'changes', (table) => {
    table.integer('seq').primary();
    table.string('id').notNullable().unique();
    table.integer('at').notNullable();
    table.string('actor_id');
    table.string('actor_name').notNullable();
    table.string('action').notNullable();
    table.string('subject_kind').notNullable();
    table.string('subject_id').notNullable();
    table.text('before');
    table.text('after');
    table.text('reason');
    table.string('previous_hash').notNullable();
    table.string('hash').notNullable().unique();
    table.index(['subject_kind', 'subject_id', 'seq'], 'changes_by_subject');
  });
  await makeAppendOnly(sql, 'changes');

  await createTable(sql, 'outbox', (table) => {
    table.string('id').primary();
    table.string('kind').notNullable().checkIn(['mail'], 'outbox_kind');
    table.string('key').notNullable().unique();
    table.text('payload').notNullable();
    table.integer('created_at').notNullable();
    table.integer('due_at').notNullable();
    table.integer('attempts').notNullable().checkBetween([0, 1000], 'outbox_attempts');
    table.string('state').notNullable().checkIn(['waiting', 'done', 'failed'], 'outbox_state');
    table.integer('claimed_until');
    table.integer('done_at');
    table.text('last_error');
    table.index(['state', 'due_at'], 'outbox_due');
  });

  await createTable(sql, 'counters', (table) => {
    table.string('name').primary();
    table.integer('value').notNullable().checkBetween([0, 1_000_000_000], 'counter_value');
  });
}

export async function down(sql: Knex): Promise<void> {
  for (const table of ['counters', 'outbox', 'changes']) await sql.schema.dropTable(table);
}
