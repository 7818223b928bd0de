import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import type { Actor } from '@/services/access';
import { sendToCheck } from '@/services/check';
import { newId } from '@/services/ids';
import { prepareBoxes } from '@/services/packing';
import { reading } from '@/services/record';
import { root } from '../../../db/demo/steps.mjs';
import { millrace, paidOrder, stocked } from '../../builders/boxes';
import { testDatabase } from '../../builders/database';
import { customer, deliveryAndTax, staff } from '../../builders/orders';
import { aVersion, addSomeParts } from '../../builders/versions';
import { type Row, type Things, type Who, actions, everybody, pages, routes } from './rows';

// Every door of the product, tried by everybody: each cell of the matrix is stated in `rows.ts`, and a door without a
// row fails. Doors are called by themselves, without proxy.ts and without the layouts around them.

const acting = vi.hoisted(() => ({ now: { kind: 'visitor' } as unknown, origin: 'http://127.0.0.1:3000' }));

vi.mock('@/services/people', async (original) => ({
  ...(await original<object>()),
  currentActor: () => Promise.resolve(acting.now),
  currentVisit: () => Promise.resolve({ browser: 'a browser', address: Math.random().toString() }),
}));
vi.mock('next/headers', () => ({
  headers: () => Promise.resolve(new Headers({ origin: acting.origin, host: '127.0.0.1:3000' })),
  cookies: () => Promise.resolve({ get: () => undefined, set: () => undefined }),
}));
vi.mock('next/cache', () => ({ revalidatePath: () => undefined }));
vi.mock('next/navigation', async (original) => {
  const end = (where: string) => () => {
    throw new Error(where);
  };
  const redirect = (to: string) => end(to.startsWith('/sign-in') ? 'sign-in' : 'elsewhere')();
  return { ...(await original<object>()), notFound: end('not found'), forbidden: end('forbidden'), redirect };
});

testDatabase();
const people = { visitor: { kind: 'visitor' } } as Record<Who, Actor>;
let things: Things;

beforeAll(async () => {
  for (const role of ['designer', 'checker', 'packer', 'owner'] as const) people[role] = await staff(role, role);
  people.buyer = await customer('Ann Tarrant');
  people.stranger = await customer('Bea Coombe');
  await deliveryAndTax();
  await addSomeParts(people.designer);
  const { view } = await aVersion().saved(people.designer);
  const sent = await sendToCheck(people.designer, { versionId: view.id, basedOn: view.saveNo });

  const kit = await millrace();
  const lots = await stocked(people.packer, kit, 2);
  const customerId = 'id' in people.buyer ? people.buyer.id : null;
  const { orderId, linkKey } = await paidOrder(kit, 1, { customerId });
  await prepareBoxes(people.packer);
  const box = await reading()('boxes').where({ order_id: orderId }).first<{ id: string; serial: string }>();
  const [code] = [...lots.values()];
  const lot = await reading()('lots').where({ code }).first<{ id: string; part_id: string }>();
  const owner = people.owner;
  things = {
    order: orderId,
    key: linkKey,
    box: box.id,
    serial: box.serial,
    version: sent.id,
    contentHash: sent.contentHash ?? '',
    kit: kit.code,
    part: lot.part_id,
    lot: lot.id,
    person: 'id' in owner ? owner.id : '',
    invoice: await invoiceOf(orderId),
  };
  await reading()('lots').where({ id: lot.id }).update({ state: 'quarantine' });
});

async function invoiceOf(orderId: string): Promise<string> {
  const id = newId();
  const gbp = (minor: number) => ({ minor, currency: 'GBP' });
  const content = {
    number: 1,
    issuedAt: 1,
    order: { number: 'Y-1', placedAt: 1, paidAt: 1 },
    seller: { name: 'Coilyard', lines: [], country: 'GB', taxId: '' },
    buyer: {
      name: 'Ann Tarrant',
      email: 'ann@example.org',
      address: { line1: '3 Quay Street', line2: '', town: 'Pellstow', postcode: '', country: 'GB' },
    },
    lines: [],
    delivery: { name: 'Parcel', price: gbp(450) },
    taxBasisPoints: 2000,
    net: gbp(3542),
    tax: gbp(708),
    total: gbp(4250),
  };
  const row = { id, number: 1, order_id: orderId, issued_at: 1, content: JSON.stringify(content) };
  await reading()('invoices').insert(row);
  return id;
}

/** Who gets through, asked one after the other. */
async function through(open: () => Promise<boolean>): Promise<Who[]> {
  const may: Who[] = [];
  for (const who of everybody) {
    acting.now = people[who];
    if (await open()) may.push(who);
  }
  return may;
}

interface Door {
  name: string;
  file: string;
}

/** The files of one kind under app, with the address they stand for. */
function doors(kind: string, folder = 'app'): Door[] {
  const here = existsSync(join(root, folder, kind)) ? [{ name: addressOf(folder), file: join(folder, kind) }] : [];
  const below = readdirSync(join(root, folder), { withFileTypes: true }).filter((entry) => entry.isDirectory());
  return [...here, ...below.flatMap((entry) => doors(kind, join(folder, entry.name)))];
}
const addressOf = (folder: string) =>
  `/${folder
    .split('/')
    .slice(1)
    .filter((part) => !part.startsWith('('))
    .join('/')}`;
const load = (file: string): Promise<Record<string, unknown>> => import(join(root, file));

const methods = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS'];
const request = (method: string) =>
  new Request('http://127.0.0.1:3000/asked', {
    method,
    headers: { origin: acting.origin, host: '127.0.0.1:3000' },
    ...(method !== 'GET' && { body: '{}' }),
  });

type Action = (input: unknown) => Promise<{ ok: boolean; problem?: { kind: string } }>;
type Handler = (request: Request, context: object) => Promise<Response>;
type Page = (props: object) => Promise<unknown>;

describe('every server action', async () => {
  const found: Record<string, Action> = {};
  for (const { file } of doors('actions.ts')) {
    const room = file.replace(/^app\/(\(rooms\)\/)?|\/actions\.ts$/g, '');
    for (const [name, deed] of Object.entries(await load(file))) found[`${room} ${name}`] = deed as Action; // see below
  }

  it('has a row, and every row an action', () => {
    expect(Object.keys(found).sort()).toEqual(Object.keys(actions).sort());
    for (const deed of Object.values(found)) expect(deed).toBeTypeOf('function');
  });

  it.each(Object.entries(actions))('%s is for those of its row', async (name, { may, input }) => {
    const deed = found[name];
    const asked = await through(async () => {
      const answer = await deed?.(input ? input(things) : { uninvited: true });
      return answer !== undefined && !['forbidden', 'missing'].includes(answer.problem?.kind ?? '');
    });
    expect(asked).toEqual(everybody.filter((who) => may.includes(who)));
  });

  it.each(Object.keys(actions))('%s takes no field that nobody asked for', async (name) => {
    const { input, may } = actions[name] as Row; // its own key
    acting.now = people[may[0] ?? 'visitor'];
    const uninvited = { ...(input?.(things) as object), role: 'owner', price: 1, state: 'released', userId: newId() };
    const answer = await found[name]?.(uninvited);
    if (name === '(account) signOutEverywhere') return;
    expect(answer).toMatchObject({ ok: false, problem: { kind: 'invalid' } });
  });

  it.each(Object.keys(actions))('%s is refused when another site asks', async (name) => {
    acting.now = people[actions[name]?.may[0] ?? 'visitor'];
    acting.origin = 'https://evil.example';
    const answer = await found[name]?.(actions[name]?.input?.(things) ?? null);
    acting.origin = 'http://127.0.0.1:3000';
    expect(answer).toMatchObject({ ok: false, problem: { kind: 'forbidden' } });
  });
});

describe('every route', async () => {
  const found: Record<string, Handler> = {};
  for (const { name, file } of doors('route.ts')) {
    for (const [method, handler] of Object.entries(await load(file))) {
      if (methods.includes(method)) found[`${method} ${name}`] = handler as Handler; // Next calls it with these
    }
  }

  it('has a row, and every row a route', () => {
    const stated = Object.keys(routes).map((name) => name.split(' ').slice(0, 2).join(' '));
    expect(Object.keys(found).sort()).toEqual([...new Set(stated)].sort());
  });

  it.each(Object.entries(routes))('%s answers those of its row', async (name, { may, params }) => {
    const [method = '', address = ''] = name.split(' ');
    const asked = await through(async () => {
      const context = { params: Promise.resolve(params?.(things) ?? {}) };
      const answer = await found[`${method} ${address}`]?.(request(method), context);
      return answer !== undefined && ![401, 403, 404].includes(answer.status);
    });
    expect(asked).toEqual(everybody.filter((who) => may.includes(who)));
  });
});

describe('every page', async () => {
  const found: Record<string, Page> = {};
  for (const { name, file } of doors('page.tsx')) found[name] = (await load(file))['default'] as Page; // Next's form

  it('has a row, and every row a page', () => {
    expect(Object.keys(found).sort()).toEqual(Object.keys(pages).sort());
  });

  const seenBy = (name: string, search: Record<string, string> = {}) =>
    through(async () => {
      const { params } = pages[name] ?? {};
      const props = { params: Promise.resolve(params?.(things) ?? {}), searchParams: Promise.resolve(search) };
      try {
        await found[name]?.(props);
        return true;
      } catch (error) {
        const where = error instanceof Error ? error.message : '';
        if (where === 'elsewhere') return true;
        if (['sign-in', 'not found', 'forbidden'].includes(where)) return false;
        throw error;
      }
    });

  it.each(Object.entries(pages))('%s is seen by those of its row', async (name, { may }) => {
    expect(await seenBy(name)).toEqual(everybody.filter((who) => may.includes(who)));
  });

  it.each(Object.keys(pages))('%s stands up to whatever its address asks for', async (name) => {
    const odd = {
      key: '\0',
      after: 'zz',
      before: 'x',
      show: 'nope',
      q: '%_\\',
      boxes: '-1',
      place: 'zz',
      next: '//evil',
    };
    const seen = await seenBy(name, { ...odd, code: '\u202e', page: '1e9', back: '<b>' });
    expect(seen.every((who) => pages[name]?.may.includes(who))).toBe(true);
  });
});

it('an order’s link opens the order and its papers, and no other door', async () => {
  const { GET } = (await import('@/app/api/v1/orders/[id]/route')) as { GET: Handler };
  const asked = (key: string) => new Request(`http://127.0.0.1:3000/api/v1/orders/x?key=${key}`);
  const context = { params: Promise.resolve({ id: things.order }) };
  acting.now = people.visitor;
  expect((await GET(asked(things.key), context)).status).toBe(200);
  expect((await GET(asked('b'.repeat(43)), context)).status).toBe(404);
  const paper = (await import('@/app/papers/[kind]/[id]/route')) as { GET: Handler };
  const open = (kind: string, id: string) => paper.GET(asked(things.key), { params: Promise.resolve({ kind, id }) });
  expect((await open('guide', things.box)).status).toBe(200);
  expect((await open('invoice', things.invoice)).status).toBe(200);
  for (const kind of ['slip', 'label']) expect((await open(kind, things.box)).status).toBe(404);
});
