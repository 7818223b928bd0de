import type { Actor } from '@/services/access';
import { KitId, OrderId, VersionId, newId } from '@/services/ids';
import { evaluateContent } from '@/services/kits/evaluation';
import { CautionCode, type FrozenLine, VersionContent } from '@/services/kits/schemas';
import { orderKey } from '@/services/orders';
import { partKinds, type PartValues, type Place } from '@/services/parts/schemas';
import { canonicalJson, now, reading, sha256, write } from '@/services/record';
import { allocate, needsOf, reserve } from '@/services/stock';
import { type Decided, insertDecided } from './decided-version';
import { type BuiltPart, lotOf, part, staff } from './orders';

const exact = (nominal: number) => ({ nominal, origin: 'measured' as const });
const about = (nominal: number, tol: number) => ({ nominal, tol, origin: 'maker' as const });

interface Row {
  reference: string;
  place: Place;
  quantity: number;
  code: string;
  name: string;
  mass: number;
  values: PartValues;
  note?: string;
}

/** The lines of "Millrace": a whole kit with wire by the length, several pieces of one part, a spare, tools and prints. */
const millraceLines: readonly Row[] = [
  {
    reference: 'L1',
    place: 'tuning coil',
    quantity: 1,
    code: 'FORM-63',
    name: 'Card tube, 63 mm',
    mass: 31_000,
    values: { kind: 'coil-former', outerDiameter: about(0.063, 0.005), length: 0.12, wall: 'thin' },
  },
  {
    reference: 'W1',
    place: 'tuning coil',
    quantity: 14_000,
    code: 'WIRE-04',
    name: 'Enamelled wire, 0.4 mm',
    mass: 1160,
    values: { kind: 'wire', bare: 0.0004, overall: 0.00044, covering: 'enamel' },
  },
  {
    reference: 'C1',
    place: 'tuning capacitor',
    quantity: 1,
    code: 'GANG-420',
    name: 'Air capacitor, 12 to 420 pF',
    mass: 62_000,
    values: {
      kind: 'variable-capacitor',
      min: about(1.2e-11, 0.1),
      max: about(4.2e-10, 0.05),
      law: 'capacitance',
      turnDegrees: 180,
    },
  },
  {
    reference: 'C2',
    place: 'coupling capacitor',
    quantity: 1,
    code: 'CER-10',
    name: 'Ceramic capacitor, 10 pF',
    mass: 300,
    values: { kind: 'fixed-capacitor', c: about(1e-11, 0.05) },
  },
  {
    reference: 'D1',
    place: 'detector',
    quantity: 2,
    code: 'GER-11',
    name: 'Germanium detector',
    mass: 130,
    note: 'one to fit, one spare',
    values: { kind: 'detector', detectorClass: 'germanium', measured: false },
  },
  {
    reference: 'R1',
    place: 'return resistor',
    quantity: 1,
    code: 'RES-47K',
    name: 'Resistor, 47 kΩ',
    mass: 210,
    values: { kind: 'resistor', r: about(47_000, 0.05) },
  },
  {
    reference: 'E1',
    place: 'earphone',
    quantity: 1,
    code: 'XTAL-EAR',
    name: 'Crystal earphone',
    mass: 9600,
    values: { kind: 'earphone', earphoneKind: 'ceramic', c: about(1.2e-8, 0.2), rDc: exact(2e7) },
  },
  {
    reference: 'A1',
    place: 'aerial',
    quantity: 1,
    code: 'AER-18',
    name: 'Aerial wire, 18 m',
    mass: 96_000,
    values: { kind: 'aerial-wire', length: 18, radius: 0.0005 },
  },
  {
    reference: 'G1',
    place: 'earth',
    quantity: 1,
    code: 'LEAD-3',
    name: 'Earth lead, 3 m',
    mass: 41_000,
    values: { kind: 'earth-lead', length: 3 },
  },
  {
    reference: 'X1',
    place: 'hardware',
    quantity: 4,
    code: 'TERM-B',
    name: 'Brass terminal',
    mass: 4200,
    values: { kind: 'hardware' },
  },
  {
    reference: 'B1',
    place: 'hardware',
    quantity: 1,
    code: 'BOARD-B',
    name: 'Drilled board, beech',
    mass: 410_000,
    values: { kind: 'hardware' },
  },
  {
    reference: 'T1',
    place: 'tool',
    quantity: 1,
    code: 'SAND-320',
    name: 'Sandpaper, a strip',
    mass: 1800,
    values: { kind: 'tool' },
  },
  {
    reference: 'P1',
    place: 'print',
    quantity: 1,
    code: 'GUIDE',
    name: 'Printed guide',
    mass: 30_000,
    values: { kind: 'print' },
  },
  {
    reference: 'K1',
    place: 'packaging',
    quantity: 1,
    code: 'CARTON-2',
    name: 'Carton, size 2',
    mass: 112_000,
    values: { kind: 'packaging' },
  },
];

export const millraceGuide: VersionContent['guide'] = {
  intro:
    'When it is done you have a set that plays from the aerial alone: no battery, nothing to run down. Allow two evenings.',
  steps: [
    {
      title: 'Lay out the parts',
      text: 'Empty the box on a tray and tick each part on the checklist. Leave the detectors in their bag until step 4: their leads break easily.',
      uses: ['X1', 'T1'],
      check: 'Every box on the checklist has a tick.',
    },
    {
      title: 'Wind the coil',
      text: 'Pass 15 cm of wire through both holes at the left rim of the tube and tape it down. Turn the tube, not your hand, and push each turn against the last. Do not let go of the wire. Thread the end through the right rim and leave 15 cm. Sand both ends bright.',
      uses: ['L1', 'W1', 'T1'],
      check:
        'Count the turns twice. With a meter, start to end reads a few ohms; no reading means a break, or enamel left on an end.',
    },
    {
      title: 'Mount the capacitor',
      text: 'Screw the capacitor to the board so that its spindle points at you. Turn it from end to end: the plates must never touch.',
      uses: ['B1', 'C1', 'C2'],
      check: 'A meter shows no connection between the two sides of the capacitor in any position.',
    },
    {
      title: 'Fit the detector',
      text: 'Bend the leads 5 mm from the glass over a match. The band goes to the terminal marked E. Solder with lead-free solder, or clamp under the terminals.',
      uses: ['D1', 'R1'],
      check: '',
    },
    {
      title: 'Connect and listen',
      text: 'Connect the aerial, the earth lead and the earphone. Turn the capacitor slowly from one end to the other.',
      uses: ['E1', 'A1', 'G1'],
      check: 'Touching the earphone leads together gives a soft click in the ear.',
    },
  ],
  cautions: [...CautionCode.options],
};

export interface MillraceOptions {
  letter?: string;
  state?: 'released' | 'withdrawn' | 'held';
  number?: number;
  code?: string;
  /** Steps or lines changed, so that the content hash differs. */
  change?: (content: VersionContent) => VersionContent;
}

export interface Millrace {
  kitId: KitId;
  versionId: VersionId;
  code: string;
  letter: string;
  content: VersionContent;
  contentHash: string;
  parts: Map<string, BuiltPart>;
}

const knownParts = async (): Promise<Map<string, BuiltPart>> => {
  const parts = new Map<string, BuiltPart>();
  for (const line of millraceLines) {
    const row = await reading()('parts').where('code', line.code).first('id');
    const built: BuiltPart = row
      ? { id: row.id, code: line.code, name: line.name, values: line.values }
      : await part(line.code, line.name, line.values, line.mass);
    parts.set(line.code, built);
  }
  return parts;
};

/** A kit version in the shape of a real one, as rows, with the engine's own verdict on its sign-off. */
export async function millrace(options: MillraceOptions = {}): Promise<Millrace> {
  const { letter = 'F', state = 'released', number = 4, code = 'MW4' } = options;
  const parts = await knownParts();
  const plain = VersionContent.parse({
    format: 'coilyard-version/1',
    kit: {
      code,
      number,
      name: 'Millrace',
      summary: 'A medium wave set on a hand-wound coil, for a first evening at the bench and a second on the air.',
      audience: 'Schools and clubs',
      ageFrom: 10,
      band: { code: 'MW-1', lo: 526_500, hi: 1_606_500, firstCarrier: 531_000, lastCarrier: 1_602_000, step: 9000 },
    },
    letter,
    circuit: {
      winding: { turns: 60, pitch: null, aerialTap: null, detectorTap: 40, tolerance: 0.03 },
      coupling: 'series-c',
      detectorAt: 'tap',
      aerial: { vertical: 6, horizontal: 12, siteFactor: { nominal: 1.1, tol: 0.2 } },
      earth: { kind: 'resistance', r: { nominal: 50, tol: 0.5 } },
      stray: { nominal: 8e-12, tol: 0.3 },
      place: {
        field: 0.01,
        stations: [
          { name: 'Osk Home', f: 549_000, field: 0.02 },
          { name: 'Cape Sound', f: 1_593_000, field: 0.01 },
          { name: 'Sluice', f: 747_000, field: 0.02 },
        ],
      },
    },
    guide: millraceGuide,
    lines: millraceLines.map(
      ({ reference, place, quantity, note, code: partCode, name, mass, values }): FrozenLine => ({
        reference,
        place,
        quantity,
        note: note ?? '',
        part: { code: partCode, name, unit: partKinds[values.kind].unit, massMilligrams: mass, values },
      }),
    ),
  });
  const content = options.change?.(plain) ?? plain;
  return { ...(await insertVersion(content, state)), parts };
}

async function insertVersion(content: VersionContent, state: Decided): Promise<Omit<Millrace, 'parts'>> {
  const { code, number, name } = content.kit;
  const designer = await staff('Isolde Hark', 'designer');
  const checker = await staff('Walter Tarrow', 'checker');
  const at = now();
  const known = await reading()('kits').where({ code }).first<{ id: string } | undefined>('id');
  const kitId = KitId.parse(known?.id ?? newId());
  if (!known) {
    await reading()('kits').insert({
      id: kitId,
      code,
      number,
      name,
      summary: content.kit.summary,
      audience: content.kit.audience,
      age_from: content.kit.ageFrom,
      band_code: content.kit.band.code,
      band: JSON.stringify(content.kit.band),
      created_by: designer.id,
      created_at: at,
    });
  }
  const versionId = VersionId.parse(newId());
  const contentHash = sha256(canonicalJson(content));
  const { verdict } = evaluateContent(content, { boxes: 400, seed: 1 });
  await insertDecided(
    {
      id: versionId,
      kit_id: kitId,
      letter: content.letter,
      based_on_id: null,
      circuit: JSON.stringify(content.circuit),
      guide: JSON.stringify(content.guide),
      save_no: 1,
      created_by: designer.id,
      created_at: at,
      updated_at: at,
      content: canonicalJson(content),
      content_hash: contentHash,
      sent_by: designer.id,
      sent_at: at,
      verdict: canonicalJson(verdict),
    },
    state,
    { person_id: checker.id, engine_version: verdict.engine, rules_version: verdict.rules.version },
  );
  return { kitId, versionId, code, letter: content.letter, content, contentHash };
}

/** Stock for so many boxes: one lot a part, each in a bin of its own. Returns the lots' label codes by part code. */
export async function stocked(packer: Actor, kit: Millrace, boxes: number): Promise<Map<string, string>> {
  const lots = new Map<string, string>();
  for (const { code, quantity, values } of millraceLines) {
    const built = kit.parts.get(code);
    if (!built || values.kind === 'print') continue;
    const { lotId } = await lotOf(packer, built, quantity * boxes);
    const row = await reading()('lots').where('id', lotId).first<{ code: string }>('code');
    lots.set(code, row?.code ?? '');
  }
  return lots;
}

let orderCount = 0;

/** A paid order with its parts allocated, as rows and steps of the store. */
export async function paidOrder(
  kit: Pick<Millrace, 'versionId' | 'content'>,
  quantity = 1,
  more: { name?: string; giftNote?: string; customerId?: string | null; paidAt?: number } = {},
): Promise<{ orderId: string; number: string; linkKey: string }> {
  const orderId = newId();
  const number = `Y-${4100 + ++orderCount}`;
  const linkKey = orderKey(OrderId.parse(orderId));
  const at = more.paidAt ?? now();
  await reading()('orders').insert({
    id: orderId,
    number,
    customer_id: more.customerId ?? null,
    email: 'club@example.org',
    name: more.name ?? 'Hollin Road Radio Club',
    link_hash: sha256(linkKey),
    address: JSON.stringify({
      line1: 'The Old Drill Hall',
      line2: 'Hollin Road',
      town: 'Osk Bridge',
      postcode: 'OB4 2HR',
      country: 'GB',
    }),
    delivery_code: 'parcel',
    gift_note: more.giftNote ?? '',
    payment: 'paid',
    fulfilment: 'allocated',
    currency: 'GBP',
    lines_minor: 3800 * quantity,
    delivery_minor: 450,
    tax_minor: 700,
    tax_basis_points: 2000,
    total_minor: 3800 * quantity + 450,
    placed_at: at,
    paid_at: at,
    shipped_at: null,
    session_id: null,
    session_attempt: 1,
    look_at_it: '',
  });
  await reading()('order_lines').insert({
    id: newId(),
    order_id: orderId,
    version_id: kit.versionId,
    quantity,
    unit_minor: 3800,
    position: 1,
  });
  await write({ kind: 'system', name: 'stripe' }, async (tx) => {
    const one = await needsOf(tx.sql, kit.content);
    const needs = new Map([...one].map(([partId, count]) => [partId, count * quantity]));
    await reserve(tx, { orderId, needs, expiresAt: tx.now + 60_000 });
    await allocate(tx, orderId);
  });
  return { orderId, number, linkKey };
}
