/** The people of the matrix: a visitor, the buyer of the order, another customer, and one of the staff for each role. */
export const everybody = ['visitor', 'buyer', 'stranger', 'designer', 'checker', 'packer', 'owner'] as const;
export type Who = (typeof everybody)[number];

const all = [...everybody];
const nobody: Who[] = [];
const signedIn: Who[] = ['buyer', 'stranger', 'designer', 'checker', 'packer', 'owner'];
const staff: Who[] = ['designer', 'checker', 'packer', 'owner'];
const designers: Who[] = ['designer', 'owner'];
const packers: Who[] = ['packer'];
const floor: Who[] = ['packer', 'owner'];
const owner: Who[] = ['owner'];

/** Things of the test's yard that a door may be asked for. */
export interface Things {
  order: string;
  key: string;
  box: string;
  serial: string;
  version: string;
  contentHash: string;
  kit: string;
  part: string;
  lot: string;
  person: string;
  invoice: string;
}

export interface Row {
  may: readonly Who[];
  /** What an action is handed; without it, nothing that it could do anything with. */
  input?: (things: Things) => unknown;
  /** Parts of the address of a route or page. */
  params?: (things: Things) => Record<string, string | string[]>;
}

const order = ({ order }: Things) => ({ id: order });
const version = ({ version }: Things) => ({ versionId: version });
const judged = ({ version, contentHash }: Things) => ({ versionId: version, contentHash });

/** Who may use each server action. */
export const actions: Record<string, Row> = {
  '(account) askForLink': { may: all },
  '(account) createAccount': { may: all },
  '(account) acceptInvitation': { may: all },
  '(account) changePassword': { may: signedIn },
  '(account) signOutEverywhere': { may: signedIn },
  '(shop) putInBasket': { may: all },
  '(shop) changeLine': { may: all },
  '(shop) order': { may: all },
  '(shop) pay': { may: ['buyer'], input: (things) => ({ orderId: things.order }) },
  '(shop) cancelIt': { may: ['buyer', 'owner'], input: (things) => ({ orderId: things.order }) },
  '(shop) claimIt': { may: ['buyer'], input: (things) => ({ orderId: things.order }) },
  'bench createKit': { may: designers },
  'bench startVersion': { may: designers },
  'bench addLine': { may: designers },
  'bench saveLine': { may: designers },
  'bench removeLine': { may: designers },
  'bench saveCircuit': { may: designers },
  'bench saveGuide': { may: designers },
  'bench sendToCheck': { may: designers },
  'bench callBack': { may: designers },
  'bench addPart': { may: designers },
  'bench changePart': { may: designers },
  'bench retirePart': { may: designers },
  'check hold': {
    may: ['checker'],
    input: (things) => ({ ...judged(things), contentHash: 'a'.repeat(64), remark: 'The low end is out of reach.' }),
  },
  'check release': { may: ['checker'], input: (things) => ({ ...judged(things), reasons: {} }) },
  'check withdraw': { may: owner },
  'desk price': { may: owner },
  'desk/people inviteStaff': { may: owner },
  'desk/people changeRoles': { may: owner },
  'desk/people sendNewWayIn': { may: owner },
  'packing claimBox': { may: packers },
  'packing scan': { may: packers },
  'packing putBack': { may: packers },
  'packing tellEmpty': { may: packers },
  'packing markPrinted': { may: packers },
  'packing weigh': { may: packers },
  'packing closeBox': { may: packers },
  'packing ship': { may: packers },
  'store receive': { may: floor },
  'store accept': { may: floor, input: ({ lot }) => ({ lotId: lot, reason: 'Twelve pieces measured' }) },
  'store block': { may: ['checker'] },
};

/** Who gets an answer of each route. */
export const routes: Record<string, Row> = {
  'GET /api/v1/health': { may: all },
  'GET /api/v1/parts': { may: staff },
  'GET /api/v1/versions/[id]': { may: staff, params: ({ version }) => ({ id: version }) },
  'GET /api/v1/orders/[id]': { may: ['buyer', 'owner'], params: order },
  'POST /api/v1/evaluations': { may: all },
  // Whoever the provider's signature is from; without it each of them gets 400 and changes nothing.
  'POST /api/stripe': { may: all },
  // Sessions are read by the product alone; signing in has tests of its own.
  'GET /api/auth/[...nextauth]': { may: nobody, params: () => ({ nextauth: ['session'] }) },
  'POST /api/auth/[...nextauth]': { may: nobody, params: () => ({ nextauth: ['session'] }) },
  'GET /api/[...path]': { may: nobody },
  'POST /api/[...path]': { may: nobody },
  'PUT /api/[...path]': { may: nobody },
  'PATCH /api/[...path]': { may: nobody },
  'DELETE /api/[...path]': { may: nobody },
  'GET /papers/[kind]/[id] guide': {
    may: ['buyer', ...staff],
    params: ({ box }) => ({ kind: 'guide', id: box }),
  },
  'GET /papers/[kind]/[id] slip': { may: floor, params: ({ box }) => ({ kind: 'slip', id: box }) },
  'GET /papers/[kind]/[id] label': { may: floor, params: ({ box }) => ({ kind: 'label', id: box }) },
  'GET /papers/[kind]/[id] invoice': {
    may: ['buyer', 'owner'],
    params: ({ invoice }) => ({ kind: 'invoice', id: invoice }),
  },
};

/** Who sees each page. A page asks for itself: the test calls it without its layout and without proxy.ts. */
export const pages: Record<string, Row> = {
  '/': { may: all },
  '/kits/[code]': { may: all, params: ({ kit }) => ({ code: kit }) },
  '/basket': { may: all },
  '/checkout': { may: all },
  '/orders': { may: signedIn },
  '/orders/[id]': { may: ['buyer', 'owner'], params: order },
  '/orders/[id]/claim': { may: ['buyer', 'owner'], params: order },
  '/account': { may: signedIn },
  '/sign-in': { may: all },
  '/sign-in/link': { may: all },
  '/join': { may: all },
  '/invitations/[token]': { may: all, params: () => ({ token: 'a'.repeat(43) }) },
  // The test's yard is no demo, so that the page is not there.
  '/demo': { may: nobody },
  '/papers/guide-page/[id]': { may: ['buyer', ...staff], params: ({ box }) => ({ id: box }) },
  '/bench': { may: staff },
  '/bench/bands': { may: staff },
  '/bench/kits/new': { may: designers },
  '/bench/parts': { may: staff },
  '/bench/parts/new': { may: designers },
  '/bench/parts/[id]': { may: staff, params: ({ part }) => ({ id: part }) },
  '/bench/[versionId]': { may: staff, params: version },
  '/bench/[versionId]/guide': { may: staff, params: version },
  '/check': { may: ['checker'] },
  '/check/held': { may: staff },
  '/check/released': { may: staff },
  '/check/[versionId]': { may: staff, params: version },
  '/desk': { may: owner },
  '/desk/changes': { may: owner },
  '/desk/kits': { may: owner },
  '/desk/orders': { may: owner },
  '/desk/people': { may: owner },
  '/desk/people/[person]': { may: owner, params: ({ person }) => ({ person }) },
  '/store': { may: staff },
  '/store/receive': { may: floor },
  '/packing': { may: floor },
  '/packing/[boxId]': { may: floor, params: ({ box }) => ({ boxId: box }) },
  '/packing/dispatch': { may: floor },
  '/packing/pick-list': { may: floor },
  '/packing/trace': { may: staff },
  '/packing/trace/[serial]': { may: staff, params: ({ serial }) => ({ serial }) },
};
