import type { Knex } from 'knex';
import { inject } from 'vitest';
import { z } from 'zod';
import { openDatabase } from '@/db/client';

/** Who looks, by the names of the demo's people; a visitor is nobody yet. */
export const people = {
  visitor: null,
  customer: 'Edda Holm',
  designer: 'Isolde Hark',
  checker: 'Walter Tarrow',
  packer: 'Bryn Orne',
  owner: 'Maud Orrin',
} as const;
export type Who = keyof typeof people;

export const everybody = ['visitor', 'customer', 'designer', 'checker', 'packer', 'owner'] as const;
const signedIn = ['customer', 'designer', 'checker', 'packer', 'owner'] as const;
const staff = ['designer', 'checker', 'packer', 'owner'] as const;
const drawing = ['designer', 'owner'] as const;
const floor = ['packer', 'owner'] as const;

export interface PageOf {
  path: string;
  who: readonly Who[];
  /** Follows the system's light and dark. */
  dark?: true;
}

/** Every page and everybody who may see it. In a path, `:draft` and the like stand for a row of the demo yard. */
export const pages: readonly PageOf[] = [
  { path: '/', who: everybody },
  { path: '/?q=lamp', who: ['visitor'] },
  { path: '/?q=harp', who: ['visitor'] },
  { path: '/kits/MW7', who: everybody },
  { path: '/kits/LW11', who: ['visitor'] },
  { path: '/basket', who: everybody },
  { path: '/checkout', who: everybody },
  { path: '/sign-in', who: ['visitor'] },
  { path: '/sign-in/link', who: ['visitor'] },
  { path: '/join', who: ['visitor'] },
  { path: '/invitations/of-nobody', who: ['visitor'] },
  { path: '/demo', who: ['visitor'] },
  { path: '/account', who: signedIn },
  { path: '/orders', who: signedIn },
  { path: '/orders/:unpaid', who: ['customer', 'owner'] },
  { path: '/orders/:paid', who: ['customer', 'owner'] },
  { path: '/orders/:sent', who: ['customer', 'owner'] },
  { path: '/bench', who: staff, dark: true },
  { path: '/bench?show=mine', who: drawing, dark: true },
  { path: '/bench/:draft', who: staff, dark: true },
  { path: '/bench/:held', who: ['designer'], dark: true },
  { path: '/bench/:released', who: ['designer'], dark: true },
  { path: '/bench/:draft/guide', who: staff, dark: true },
  { path: '/bench/parts', who: staff, dark: true },
  { path: '/bench/parts?q=green+coil', who: ['designer'], dark: true },
  { path: '/bench/parts/:capacitor', who: staff, dark: true },
  { path: '/bench/parts/:board', who: ['designer'], dark: true },
  { path: '/bench/parts/new', who: drawing, dark: true },
  { path: '/bench/bands', who: staff, dark: true },
  { path: '/bench/kits/new', who: drawing, dark: true },
  { path: '/check', who: ['checker'], dark: true },
  { path: '/check/:held', who: staff, dark: true },
  { path: '/check/:released', who: ['checker'], dark: true },
  { path: '/check/released', who: ['checker'], dark: true },
  { path: '/check/held', who: ['checker'], dark: true },
  { path: '/store', who: staff },
  { path: '/store?q=C-365', who: ['packer'] },
  { path: '/store/receive', who: floor },
  { path: '/packing', who: floor },
  { path: '/packing/pick-list', who: floor },
  { path: '/packing/dispatch', who: floor },
  { path: '/packing/:box', who: floor },
  { path: '/packing/trace', who: staff },
  { path: '/packing/trace/:serial', who: staff },
  { path: '/packing/trace?code=:lot', who: staff },
  { path: '/packing/trace?code=NO-SUCH-LOT', who: ['packer'] },
  { path: '/papers/guide-page/:closed', who: staff },
  { path: '/desk', who: ['owner'], dark: true },
  { path: '/desk/orders', who: ['owner'], dark: true },
  { path: '/desk/kits', who: ['owner'], dark: true },
  { path: '/desk/people', who: ['owner'], dark: true },
  { path: '/desk/people/:person', who: ['owner'], dark: true },
  { path: '/desk/changes', who: ['owner'], dark: true },
];

/** What somebody asks for and is not given: 403 says it is not theirs, 404 that nothing is there. */
export const refusals: readonly { who: Who; status: 403 | 404; paths: readonly string[] }[] = [
  { who: 'visitor', status: 404, paths: ['/nowhere', '/kits/NOPE', '/orders/:unpaid', '/orders/:nobody'] },
  { who: 'customer', status: 403, paths: ['/bench', '/check', '/store', '/packing', '/desk'] },
  { who: 'customer', status: 404, paths: ['/orders/:others', '/orders/:nobody'] },
  { who: 'designer', status: 403, paths: ['/check', '/packing', '/store/receive', '/desk', '/desk/people'] },
  { who: 'designer', status: 404, paths: ['/bench/:nobody', '/bench/parts/:nobody', '/packing/trace/MW7B9999999'] },
  { who: 'checker', status: 403, paths: ['/bench/kits/new', '/bench/parts/new', '/packing', '/desk'] },
  { who: 'checker', status: 404, paths: ['/check/:nobody'] },
  { who: 'packer', status: 403, paths: ['/check', '/bench/kits/new', '/desk', '/desk/changes'] },
  { who: 'packer', status: 404, paths: ['/packing/:nobody'] },
  { who: 'owner', status: 403, paths: ['/check'] },
  { who: 'owner', status: 404, paths: ['/desk/people/:nobody', '/papers/guide-page/:nobody'] },
];

/** Where somebody unknown is asked to sign in first. */
export const guarded = ['/account', '/orders', '/bench', '/bench/parts', '/check', '/store', '/packing', '/desk'];

type Row = (yard: Knex) => Knex.QueryBuilder;

const version =
  (code: string, state: string): Row =>
  (yard) =>
    yard('versions')
      .join('kits', 'kits.id', 'versions.kit_id')
      .where({ 'kits.code': code, 'versions.state': state })
      .select('versions.id as found');
const order =
  (where: Readonly<Record<string, string>>): Row =>
  (yard) =>
    yard('orders')
      .join('people', 'people.id', 'orders.customer_id')
      .where({ 'people.name': people.customer, ...where })
      .select('orders.id as found');
const box =
  (state: string, column: 'id' | 'serial'): Row =>
  (yard) =>
    yard('boxes').where({ state }).select(`${column} as found`);

const rows: Readonly<Record<string, Row>> = {
  // A draft that no file sends to check, and one that the walk with keys alone does.
  mine: version('MW7', 'draft'),
  draft: version('MW16', 'draft'),
  held: version('MW12', 'held'),
  released: version('MW7', 'released'),
  capacitor: (yard) => yard('parts').where({ code: 'C-365' }).select('id as found'),
  board: (yard) => yard('parts').where({ code: 'X-BOARD' }).select('id as found'),
  unpaid: order({ payment: 'awaiting-payment' }),
  paid: order({ payment: 'paid', fulfilment: 'allocated' }),
  sent: order({ fulfilment: 'shipped' }),
  others: (yard) =>
    yard('orders')
      .join('people', 'people.id', 'orders.customer_id')
      .whereNot({ 'people.name': people.customer })
      .select('orders.id as found'),
  box: box('packing', 'id'),
  closed: box('closed', 'id'),
  serial: box('shipped', 'serial'),
  lot: (yard) => yard('lots').where('code', 'like', '%-F-50T').select('code as found'),
  person: (yard) => yard('people').where({ name: 'Piers Lindow' }).select('id as found'),
};

let opened: Knex | undefined;
const openYard = () => (opened ??= openDatabase(inject('database'), { busyTimeoutMs: 5000 }));

/** The path with the rows of this run's yard in it; `:nobody` is the id of nothing. */
export async function pathOf(pattern: string): Promise<string> {
  let path = pattern;
  for (const [mark, name = ''] of pattern.matchAll(/:([a-z]+)/g)) {
    path = path.replace(mark, name === 'nobody' ? 'z'.repeat(26) : await find(name));
  }
  return path;
}

async function find(name: string): Promise<string> {
  const row: unknown = await rows[name]?.(openYard()).first();
  const { found } = z.object({ found: z.string() }, `The demo yard has no ${name}.`).parse(row);
  return found;
}
