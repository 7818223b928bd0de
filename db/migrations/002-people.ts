import type { Knex } from 'knex';
import { createTable } from '../dialect';

/** People, their roles, invitations, one-time links and the counters against guessing. */
export async function up(sql: Knex): Promise<void> {
  await createTable(sql, 'people', (table) => {
    table.string('id').primary();
    table.string('kind').notNullable().checkIn(['staff', 'customer'], 'people_kind');
    table.string('email').notNullable().unique();
    table.string('name').notNullable();
    table.string('password_hash');
    /** Sealed with the application's secret; staff only. */
    table.string('totp_secret');
    /** The last accepted step of the second factor: a code works once. */
    table.integer('totp_step').notNullable();
    /** Compared on every request: raised, it ends all sessions of the person. */
    table.integer('session_version').notNullable();
    table.integer('created_at').notNullable();
    table.integer('disabled_at');
    table.index(['kind', 'name', 'id'], 'people_by_kind');
  });
  await createTable(sql, 'person_roles', (table) => {
    table.string('person_id').notNullable().references('people.id');
    table.string('role').notNullable().checkIn(['designer', 'checker', 'packer', 'owner'], 'person_role');
    table.primary(['person_id', 'role']);
  });
  await createTable(sql, 'invitations', (table) => {
    table.string('id').primary();
    table.string('email').notNullable().index('invitations_by_email');
    table.string('name').notNullable();
    table.string('roles').notNullable();
    table.string('token_hash').notNullable().unique();
    table.string('invited_by').notNullable().references('people.id').index('invitations_by_inviter');
    table.integer('created_at').notNullable();
    table.integer('expires_at').notNullable();
    table.integer('accepted_at');
  });
  await createTable(sql, 'sign_in_links', (table) => {
    table.string('token_hash').primary();
    table.string('person_id').notNullable().references('people.id').index('sign_in_links_by_person');
    /** The link works in the browser that asked for it only. */
    table.string('browser_hash').notNullable();
    table.integer('created_at').notNullable();
    table.integer('expires_at').notNullable();
    table.integer('used_at');
  });
  await createTable(sql, 'attempts', (table) => {
    table.string('key').primary();
    table.integer('failures').notNullable().checkBetween([0, 1_000_000], 'attempts_failures');
    table.integer('not_before').notNullable();
    table.integer('updated_at').notNullable().index('attempts_by_age');
  });
}

export async function down(sql: Knex): Promise<void> {
  for (const table of ['attempts', 'sign_in_links', 'invitations', 'person_roles', 'people']) {
    await sql.schema.dropTable(table);
  }
}
