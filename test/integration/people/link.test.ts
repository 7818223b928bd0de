import { afterEach, beforeEach, expect, it } from 'vitest';
import { systemActor, visitor } from '@/services/access';
import { MailJob } from '@/services/mail';
import * as people from '@/services/people';
import { actorOf, beginSession } from '@/services/people/auth';
import { setClock } from '@/services/record';
import { minutes } from '@/services/time';
import { testDatabase } from '@/test/builders/database';
import { aCustomer, aStaffMember, passwords, signIn, visit } from './people';

const db = testDatabase();
const doesNotWork = /This link does not work here/;
const worker = systemActor('worker');

let clock = Date.parse('2026-12-01T09:00:00Z');
beforeEach(async () => {
  clock += minutes(120);
  setClock(() => clock);
  await db.sql('outbox').delete();
});
afterEach(() => setClock(undefined));

interface Queued {
  mail: string;
  of: Record<string, string>;
}

async function queued(): Promise<Queued[]> {
  const rows = await db.sql('outbox').orderBy('created_at').select<{ payload: string }[]>('payload');
  return rows.map((row) => {
    const { mail, of } = MailJob.parse(JSON.parse(row.payload));
    return { mail, of: Object.fromEntries(Object.entries(of ?? {}).map(([key, value]) => [key, String(value)])) };
  });
}

/** The token in the mail that was queued last, as the worker would write it. */
async function tokenInMail(): Promise<string> {
  const view = await people.readLinkForMail(worker, (await queued()).at(-1)?.of['linkId'] ?? '');
  return new URL(view?.link ?? '').searchParams.get('token') ?? '';
}

const use = (token: string, browser = 'her browser', forgetPassword = false) =>
  people.signInWithLink(visitor, { token, forgetPassword }, browser);

it('a customer asks for a link, gets one mail and signs in with it once', async () => {
  const edda = await aCustomer('Edda Holm');
  await people.askForLink(visitor, { email: edda.email }, visit('her browser'));
  expect(await queued()).toHaveLength(1);
  const token = await tokenInMail();
  await expect(use(token)).resolves.toEqual({ personId: edda.id });
  await expect(use(token)).rejects.toThrow(doesNotWork);
});

it('a link pressed twice at the same moment signs in once', async () => {
  const edda = await aCustomer('Edda Holm');
  await people.askForLink(visitor, { email: edda.email }, visit('her browser'));
  const token = await tokenInMail();
  const answers = await Promise.all(
    [1, 2, 3].map(() =>
      use(token).then(
        () => 'in',
        () => 'out',
      ),
    ),
  );
  expect(answers.filter((answer) => answer === 'in')).toHaveLength(1);
});

it('a link works for ten minutes, not a second longer', async () => {
  const edda = await aCustomer('Edda Holm');
  await people.askForLink(visitor, { email: edda.email }, visit('her browser'));
  const token = await tokenInMail();
  clock += minutes(10) + 1000;
  await expect(use(token)).rejects.toThrow(doesNotWork);
});

it('a link works only in the browser that asked, and a try elsewhere does not use it up', async () => {
  const edda = await aCustomer('Edda Holm');
  await people.askForLink(visitor, { email: edda.email }, visit('her browser'));
  const token = await tokenInMail();
  await expect(use(token, 'another browser')).rejects.toThrow(doesNotWork);
  await expect(use(token, '')).rejects.toThrow(doesNotWork);
  await expect(use(token)).resolves.toEqual({ personId: edda.id });
});

it('asking looks the same for a customer, for staff and for an address nobody has', async () => {
  const edda = await aCustomer('Edda Holm');
  const bryn = await aStaffMember('Bryn Orne', ['packer']);
  for (const email of [edda.email, bryn.email, 'nobody@home.example']) {
    await expect(people.askForLink(visitor, { email }, visit())).resolves.toEqual({ email });
  }
  expect((await queued()).map(({ mail, of }) => [mail, of['reason']])).toEqual(
    expect.arrayContaining([
      ['sign-in-link', undefined],
      ['no-link', 'staff'],
      ['no-link', 'no-account'],
    ]),
  );
});

it('nothing in the database opens an account by itself', async () => {
  const edda = await aCustomer('Edda Holm');
  await people.askForLink(visitor, { email: edda.email }, visit('her browser'));
  const token = await tokenInMail();
  for (const table of ['sign_in_links', 'outbox', 'changes', 'attempts', 'people']) {
    const rows: unknown[] = await db.sql(table).select();
    expect(JSON.stringify(rows)).not.toContain(token);
    expect(JSON.stringify(rows)).not.toContain('her browser');
  }
});

it('one account gets five links an hour; the sixth has to wait, whoever asks', async () => {
  const edda = await aCustomer('Edda Holm');
  const ask = (address: string) => people.askForLink(visitor, { email: edda.email }, visit('her browser', address));
  for (const last of [1, 2, 3, 4, 5]) await ask(`192.0.2.${last}`);
  await expect(ask('192.0.2.6')).rejects.toThrow(/Wait/);
  clock += minutes(60);
  await expect(ask('192.0.2.6')).resolves.toBeTruthy();
});

it('a forgotten password is removed on the way in, and other sessions end', async () => {
  const edda = await aCustomer('Edda Holm');
  const elsewhere = await beginSession(edda.id);
  await people.askForLink(visitor, { email: edda.email }, visit('her browser'));
  await use(await tokenInMail(), 'her browser', true);
  expect((await actorOf(elsewhere)).kind).toBe('visitor');
  await expect(signIn(edda.email, passwords.customer)).rejects.toThrow(/does not fit/);
  expect((await people.readAccount(edda.actor)).hasPassword).toBe(false);
  await people.changePassword(edda.actor, { current: '', next: 'four odd new words' });
  await expect(signIn(edda.email, 'four odd new words')).resolves.toEqual({ personId: edda.id });
});

it('a new account has no password until its holder has read the mail; an address that is known gets its usual link', async () => {
  const join = (email: string) => people.createAccount(visitor, { name: 'Omar Penhale', email }, visit('his browser'));
  await expect(join('omar@penhale.example')).resolves.toEqual({ email: 'omar@penhale.example' });
  const token = await tokenInMail();
  const { personId } = await use(token, 'his browser');
  const row = await db.sql('people').where({ id: personId }).first<{ name: string; password_hash: null }>();
  expect(row).toMatchObject({ name: 'Omar Penhale', kind: 'customer', password_hash: null });

  await expect(join('omar@penhale.example')).resolves.toEqual({ email: 'omar@penhale.example' });
  expect((await queued()).map(({ mail }) => mail)).toEqual(['sign-in-link', 'sign-in-link']);
  expect(await db.sql('people').where({ email: 'omar@penhale.example' }).select('id')).toHaveLength(1);
});

it('a link for somebody who left signs nobody in', async () => {
  const jonas = await aCustomer('Jonas Veck');
  await people.askForLink(visitor, { email: jonas.email }, visit('his browser'));
  const token = await tokenInMail();
  await db.sql('people').where({ id: jonas.id }).update({ disabled_at: clock });
  await expect(use(token, 'his browser')).rejects.toThrow(doesNotWork);
});
