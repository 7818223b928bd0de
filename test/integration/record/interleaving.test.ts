import { expect, it } from 'vitest';
import { systemActor } from '@/services/access';
import { record, write } from '@/services/record';
import { testDatabase } from '@/test/builders/database';

const db = testDatabase();
const worker = systemActor('worker');

const raise = (name: string) =>
  write(worker, async (tx) => {
    const row = await tx.sql('counters').where({ name }).first<{ value: number }>('value');
    await tx
      .sql('counters')
      .where({ name })
      .update({ value: (row?.value ?? 0) + 1 });
  });

it('a write holds the lock from its first moment: nobody slips in between its reading and its writing', async () => {
  await db.sql('counters').insert([
    { name: 'raised', value: 0 },
    { name: 'foreign', value: 0 },
  ]);
  // Both connections live in this process, so the second must not wait for the first inside its call.
  const other = db.openAnother({ busyTimeoutMs: 0 });
  const rounds = 1000;
  for (let round = 0; round < rounds; round++) {
    await write(worker, async (tx) => {
      const seen = await tx.sql('counters').where({ name: 'raised' }).first<{ value: number }>('value');
      const foreign = other('counters').where({ name: 'foreign' }).increment('value', 1);
      await expect(foreign).rejects.toThrow(/locked/);
      const value = (seen?.value ?? 0) + 1;
      await tx.sql('counters').where({ name: 'raised' }).update({ value });
    });
    await other('counters').where({ name: 'foreign' }).increment('value', 1);
  }
  const rows = await db.sql('counters').whereIn('name', ['raised', 'foreign']).select<{ value: number }[]>('value');
  expect(rows.map((row) => row.value)).toEqual([rounds, rounds]);
});

it('two connections that both read first and write later lose no count between them', async () => {
  await db.sql('counters').insert({ name: 'shared', value: 0 });
  const rounds = 60;
  const raiseOn = async (sql: typeof db.sql): Promise<void> => {
    for (let round = 0; round < rounds;) {
      try {
        await sql.transaction(async (tx) => {
          const row = await tx('counters').where({ name: 'shared' }).first<{ value: number }>('value');
          await new Promise((resolve) => setImmediate(resolve));
          const value = (row?.value ?? 0) + 1;
          await tx('counters').where({ name: 'shared' }).update({ value });
        });
        round++;
      } catch (error) {
        expect(String(error)).toMatch(/database is locked/);
        await new Promise((resolve) => setTimeout(resolve, 1));
      }
    }
  };
  await Promise.all([raiseOn(db.openAnother({ busyTimeoutMs: 0 })), raiseOn(db.openAnother({ busyTimeoutMs: 0 }))]);
  const row = await db.sql('counters').where({ name: 'shared' }).first<{ value: number }>('value');
  expect(row?.value).toBe(2 * rounds);
});

it('a lock that lasts is waited for, then the person is asked to try again, and nothing was written', async () => {
  const other = db.openAnother();
  const held = await other.transaction();
  await expect(raise('raised')).rejects.toMatchObject({ kind: 'busy', message: /try again/ });
  await held.rollback();
  await expect(raise('raised')).resolves.toBeUndefined();
});

it('a deed that fails takes back its lines in the record as well', async () => {
  const count = async () => (await db.sql('changes').select('seq')).length;
  const before = await count();
  const deed = write(worker, async (tx) => {
    await record(tx, 'price.set', { subject: { kind: 'kit', id: 'x' } });
    throw new Error('no');
  });
  await expect(deed).rejects.toThrow('no');
  expect(await count()).toBe(before);
});
