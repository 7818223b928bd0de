import fc from 'fast-check';
import { afterAll, afterEach, beforeAll, beforeEach, expect, it } from 'vitest';
import { systemActor, visitor } from '@/services/access';
import * as mail from '@/services/mail';
import * as people from '@/services/people';
import { setClock, write } from '@/services/record';
import { minutes } from '@/services/time';
import { closeTransport, send } from '@/services/worker/handlers/transport';
import { runWorkerOnce } from '@/services/worker';
import { emptyOutbox } from '@/services/worker/loop';
import { testDatabase } from '@/test/builders/database';
import { aCustomer, visit } from '../people/people';
import { type PostOffice, openPostOffice } from './post-office';

const db = testDatabase();
const worker = systemActor('worker');
let office: PostOffice;

let clock = Date.parse('2026-12-01T09:00:00Z');
beforeAll(async () => {
  office = await openPostOffice();
  process.env['SMTP_PORT'] = String(office.port);
});
afterAll(async () => {
  closeTransport();
  await office.close();
});
beforeEach(async () => {
  clock += minutes(180);
  setClock(() => clock);
  await db.sql('outbox').delete();
  office.received.length = 0;
});
afterEach(() => setClock(undefined));

const noLink = (key: string) =>
  write(worker, (tx) => mail.queue(tx, 'no-link', { email: 'edda@home.example', reason: 'no-account' }, key));
const outboxRow = () =>
  db
    .sql('outbox')
    .first<{ id: string; state: string; attempts: number; due_at: number; last_error: string | null }>(
      'id',
      'state',
      'attempts',
      'due_at',
      'last_error',
    );

it('a change that is committed sends one mail, however often the worker looks', async () => {
  await noLink('one');
  expect(await emptyOutbox()).toEqual({ sent: 1, failed: 0 });
  expect(await emptyOutbox()).toEqual({ sent: 0, failed: 0 });
  expect(office.received).toHaveLength(1);
  expect(office.received[0]?.recipients).toEqual([expect.stringContaining('<edda@home.example>')]);
  expect((await outboxRow())?.state).toBe('done');
});

it('a change that is rolled back sends none', async () => {
  const change = write(worker, async (tx) => {
    await mail.queue(tx, 'no-link', { email: 'edda@home.example', reason: 'staff' }, 'never');
    throw new Error('the deed failed after queueing');
  });
  await expect(change).rejects.toThrow(/failed after queueing/);
  expect(await emptyOutbox()).toEqual({ sent: 0, failed: 0 });
  expect(office.received).toEqual([]);
});

it('the same news queued twice is one mail', async () => {
  await noLink('same');
  await noLink('same');
  await emptyOutbox();
  expect(office.received).toHaveLength(1);
});

it('one round of the worker looks after reservations and payments and then sends what is due', async () => {
  await noLink('round');
  expect(await runWorkerOnce()).toEqual({ sent: 1, failed: 0 });
});

it('two workers at once send each mail once', async () => {
  for (let index = 0; index < 10; index++) await noLink(`both ${index}`);
  const [one, two] = await Promise.all([emptyOutbox(), emptyOutbox()]);
  expect(one.sent + two.sent).toBe(10);
  expect(office.received).toHaveLength(10);
});

it('a mail the server refuses goes out later, under the same message id, and the reason is kept without addresses', async () => {
  await noLink('later');
  office.refuseNext(1);
  expect(await emptyOutbox()).toEqual({ sent: 0, failed: 1 });
  const row = await outboxRow();
  expect(row).toMatchObject({ state: 'waiting', attempts: 1, due_at: clock + minutes(1) });
  expect(row?.last_error).toMatch(/no room for/);
  expect(row?.last_error).not.toMatch(/@home/);

  expect(await emptyOutbox()).toEqual({ sent: 0, failed: 0 });
  clock += minutes(1);
  expect(await emptyOutbox()).toEqual({ sent: 1, failed: 0 });
  expect(office.received[0]?.data).toContain(`Message-ID: <${row?.id ?? ''}.0@127.0.0.1>`);
});

it('the waits grow from a minute to an hour, then a day; after that the mail is given up and stands in the record', async () => {
  await noLink('never taken');
  office.refuseNext(1000);
  const waits: number[] = [];
  for (let attempt = 1; attempt <= 8; attempt++) {
    await emptyOutbox();
    const due = (await outboxRow())?.due_at ?? 0;
    waits.push((due - clock) / minutes(1));
    clock = due;
  }
  expect(waits).toEqual([1, 2, 4, 8, 16, 32, 60, 1440]);
  await emptyOutbox();
  office.refuseNext(0);
  const row = await outboxRow();
  expect(row).toMatchObject({ state: 'failed', attempts: 9 });
  const lines = await db.sql('changes').where({ action: 'job.given-up', subject_id: row?.id }).select('id');
  expect(lines).toHaveLength(1);
});

it('a worker that died in the middle leaves its mail to the next one after five minutes', async () => {
  await noLink('left behind');
  await db.sql('outbox').update({ claimed_until: clock + minutes(5), attempts: 1 });
  expect(await emptyOutbox()).toEqual({ sent: 0, failed: 0 });
  clock += minutes(5);
  expect(await emptyOutbox()).toEqual({ sent: 1, failed: 0 });
});

it('the mail with a link holds the link itself, and what it was about can be over before it goes out', async () => {
  const edda = await aCustomer('Edda Holm');
  await people.askForLink(visitor, { email: edda.email }, visit('her browser'));
  await emptyOutbox();
  const data = office.received[0]?.data ?? '';
  const text = data.replace(/=\r\n/g, '').replace(/=3D/g, '=');
  const token = /sign-in\/link\?token=([\w-]{43})/.exec(text)?.[1] ?? '';
  await expect(people.signInWithLink(visitor, { token, forgetPassword: false }, 'her browser')).resolves.toEqual({
    personId: edda.id,
  });

  await people.askForLink(visitor, { email: edda.email }, visit('her browser'));
  clock += minutes(11);
  expect(await emptyOutbox()).toEqual({ sent: 1, failed: 0 });
  expect(office.received).toHaveLength(1);
});

it('a job of a kind nobody knows is put off, not lost, and does not hold up the others', async () => {
  await noLink('behind it');
  await db.sql('outbox').insert({
    id: 'unknown',
    kind: 'mail',
    key: 'unknown',
    payload: JSON.stringify({ mail: 'pigeon', of: {} }),
    created_at: 0,
    due_at: 0,
    attempts: 0,
    state: 'waiting',
    claimed_until: null,
    done_at: null,
    last_error: null,
  });
  expect(await emptyOutbox()).toEqual({ sent: 1, failed: 1 });
});

it('whatever a name or subject holds, a message has one recipient and the same set of headers', async () => {
  const hostile = fc.oneof(
    fc.string({ unit: 'binary', maxLength: 80 }),
    fc.constantFrom('a\r\nBcc: thief@evil.example', 'a, thief@evil.example', '"a" <thief@evil.example>', 'a\u2028b'),
  );
  const headersOf = (data: string) =>
    (data.split('\r\n\r\n')[0] ?? '')
      .split('\r\n')
      .filter((line) => /^[\w-]+:/.test(line))
      .map((line) => line.split(':')[0]?.toLowerCase());
  await fc.assert(
    fc.asyncProperty(hostile, hostile, async (name, subject) => {
      office.received.length = 0;
      const letter = { subject, text: 'Good day.', html: '<p>Good day.</p>' };
      await send('one', { to: { name, email: 'edda@home.example' }, letter });
      expect(office.received).toHaveLength(1);
      expect(office.received[0]?.recipients).toEqual(['<edda@home.example>']);
      const headers = headersOf(office.received[0]?.data ?? '');
      expect(new Set(headers).size).toBe(headers.length);
      const known = ['from', 'to', 'subject', 'message-id', 'date', 'mime-version', 'content-type', 'auto-submitted'];
      expect(headers.filter((name) => !known.includes(name ?? ''))).toEqual([]);
    }),
    { numRuns: 500 },
  );
});
