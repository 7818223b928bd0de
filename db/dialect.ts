import type { Knex } from 'knex';

/**
 * What only SQLite knows, as named pieces. Everything else is written with Knex's builder, so that another
 * database needs another version of this file only.
 */

/** Creates a table and makes it STRICT: a text in an integer column is refused instead of stored. */
export async function createTable(
  sql: Knex,
  name: string,
  build: (table: Knex.CreateTableBuilder) => void,
): Promise<void> {
  const statements = sql.schema.createTable(name, build).toSQL();
  for (const { sql: text, bindings } of statements) {
    const strict = text.startsWith('create table') ? `${strictTypes(text)} strict` : text;
    await sql.raw(strict, bindings as Knex.RawBinding[]);
  }
}

/** STRICT knows five types only; Knex's names for texts and whole numbers become those. */
function strictTypes(text: string): string {
  return text
    .replace(/\bvarchar\(\d+\)/g, 'text')
    .replace(/\bbigint\b/g, 'integer')
    .replace(/\bfloat\b/g, 'real');
}

/** Rows of an append-only table can be added, never changed or removed, whoever asks. */
export async function makeAppendOnly(sql: Knex, table: string): Promise<void> {
  for (const deed of ['update', 'delete']) {
    await sql.raw(
      `create trigger ${table}_no_${deed} before ${deed} on ${table} begin select raise(abort, '${table} is append-only'); end`,
    );
  }
}

/** Refuses an update of the named columns while a condition on the old row holds. */
export async function freezeColumns(
  sql: Knex,
  table: string,
  columns: readonly string[],
  when: string,
  sentence: string,
): Promise<void> {
  await sql.raw(
    `create trigger ${table}_frozen before update of ${columns.join(', ')} on ${table} when ${when} begin select raise(abort, '${sentence}'); end`,
  );
}

/** Refuses new rows that do not meet a condition on them. */
export async function refuseInserts(sql: Knex, table: string, when: string, sentence: string): Promise<void> {
  await sql.raw(
    `create trigger ${table}_begins before insert on ${table} when ${when} begin select raise(abort, '${sentence}'); end`,
  );
}

/** Refuses any change of rows that belong to a parent whose condition holds ("old" and "new" both looked at). */
export async function freezeChildren(
  sql: Knex,
  table: string,
  parentIsFrozen: (row: 'old' | 'new') => string,
  sentence: string,
): Promise<void> {
  const deeds = [
    ['insert', 'new'],
    ['update', 'old'],
    ['delete', 'old'],
  ] as const;
  for (const [deed, row] of deeds) {
    await sql.raw(
      `create trigger ${table}_frozen_${deed} before ${deed} on ${table} when ${parentIsFrozen(row)} begin select raise(abort, '${sentence}'); end`,
    );
  }
}

/** A unique index over the rows that meet a condition, "one live claim a box" say. */
export async function uniqueWhere(
  sql: Knex,
  table: string,
  name: string,
  columns: readonly string[],
  where: string,
): Promise<void> {
  await sql.raw(`create unique index ${name} on ${table} (${columns.join(', ')}) where ${where}`);
}

/** "accepted - reserved - allocated" as one comparable value of a row. */
export const difference = (sql: Knex, from: string, ...less: readonly string[]): Knex.Raw =>
  sql.raw(['??', ...less.map(() => '??')].join(' - '), [from, ...less]);
