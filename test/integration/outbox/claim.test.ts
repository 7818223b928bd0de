import { afterEach, beforeEach, expect, it } from 'vitest';
import { setDatabase } from '@/db/client';
import { systemActor, visitor } from '@/services/access';
import * as outbox from '@/services/outbox';
import { setClock, write } from '@/services/record';
import { minutes } from '@/services/time';
import { testDatabase } from '@/test/builders/database';

const db = testDatabase();
const worker = systemActor('worker');

let clock = Date.parse('2026-12-01T09:00:00Z');
beforeEach(async () => {
  setClock(() => clock);
  await db.sql('outbox').delete();
});
afterEach(() => {
  setClock(undefined);
  setDatabase(db.sql);
});

const queue = (key: string, dueAt?: number) =>
  write(worker, (tx) =>
    outbox.queue(tx, { kind: 'mail', key, payload: { key }, ...(dueAt !== undefined && { dueAt }) }),
  );

it('jobs come out in the order in which they are due, none before its time', async () => {
  await queue('second', clock - 1);
  await queue('first', clock - 2);
  await queue('tomorrow', clock + minutes(60 * 24));
  const out = [await outbox.claimNext(worker, 'mail'), await outbox.claimNext(worker, 'mail')];
  expect(out.map((job) => job?.payload)).toEqual([{ key: 'first' }, { key: 'second' }]);
  expect(await outbox.claimNext(worker, 'mail')).toBeNull();
});

it('workers in two processes never get the same job', async () => {
  const other = db.openAnother();
  for (let index = 0; index < 40; index++) await queue(`job ${index}`);
  const taken: string[] = [];
  for (let round = 0; round < 20; round++) {
    setDatabase(db.sql);
    const one = outbox.claimNext(worker, 'mail');
    setDatabase(other);
    const two = outbox.claimNext(worker, 'mail');
    for (const job of await Promise.all([one, two])) if (job) taken.push(job.id);
  }
  expect(taken).toHaveLength(40);
  expect(new Set(taken).size).toBe(40);
});

it('a worker whose claim has passed to another cannot finish or put off the job any more', async () => {
  await queue('slow');
  const slow = await outbox.claimNext(worker, 'mail');
  clock += minutes(6);
  const quick = await outbox.claimNext(worker, 'mail');
  if (!slow || !quick) throw new Error('Both should have got the job.');
  await outbox.putOff(worker, slow, 'too late');
  await outbox.finish(worker, slow);
  const state = () => db.sql('outbox').first<{ state: string; last_error: string | null }>('state', 'last_error');
  expect(await state()).toEqual({ state: 'waiting', last_error: null });
  await outbox.finish(worker, quick);
  expect(await state()).toEqual({ state: 'done', last_error: null });
});

it('only the worker takes jobs', async () => {
  await expect(outbox.claimNext(visitor, 'mail')).rejects.toMatchObject({ kind: 'forbidden' });
});
