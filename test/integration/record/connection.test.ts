import { expect, it } from 'vitest';
import { openDatabase } from '@/db/client';
import { testDatabase } from '@/test/builders/database';

const db = testDatabase();

async function pragmasOf(sql: typeof db.sql): Promise<Record<string, unknown>> {
  const names = ['journal_mode', 'synchronous', 'foreign_keys', 'trusted_schema', 'busy_timeout'];
  const found: Record<string, unknown> = {};
  for (const name of names) {
    const rows: Record<string, unknown>[] = await sql.raw(`pragma ${name}`);
    found[name] = Object.values(rows[0] ?? {})[0];
  }
  return found;
}

const settings = { journal_mode: 'wal', synchronous: 2, foreign_keys: 1, trusted_schema: 0, busy_timeout: 250 };

it('a connection keeps every write through a power cut, on first opening and on opening again', async () => {
  expect(await pragmasOf(db.sql)).toEqual(settings);
  await db.sql('counters').insert({ name: 'opened', value: 1 });
  const again = openDatabase(db.filename);
  expect(await pragmasOf(again)).toEqual(settings);
  await again('counters').where({ name: 'opened' }).update({ value: 2 });
  expect(await pragmasOf(again)).toEqual(settings);
  await again.destroy();
});

it('every table refuses a text where a number belongs', async () => {
  await expect(db.sql('counters').insert({ name: 'wrong', value: 'many' })).rejects.toThrow(/INTEGER/);
  const tables: { name: string; strict: number }[] = await db.sql.raw(
    "select name, strict from pragma_table_list where schema = 'main' and type = 'table' and name not like 'sqlite_%' and name not like 'knex_%'",
  );
  expect(tables.length).toBeGreaterThan(20);
  expect(tables.filter((table) => table.strict !== 1)).toEqual([]);
});
