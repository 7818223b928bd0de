import { newId, KitId, PartId, PersonId, VersionId } from '@/services/ids';
import type { Actor, Role } from '@/services/access';
import { reading, canonicalJson, now, sha256 } from '@/services/record';
import { partKinds, type PartValues, type Place } from '@/services/parts/schemas';
import { CautionCode, type VersionContent, type FrozenLine } from '@/services/kits/schemas';
import { designOf } from '@/services/kits/rules';
import { evaluate } from '@/services/receiver';
import { receiveLot } from '@/services/stock';
import { type Decided, insertDecided } from './decided-version';

let count = 0;
const next = () => ++count;

/** Somebody of the yard with these roles, as rows. */
export async function staff(name: string, ...roles: Role[]): Promise<Extract<Actor, { kind: 'staff' }>> {
  const person = await insertPerson('staff', name);
  for (const role of roles) await reading()('person_roles').insert({ person_id: person.id, role });
  return { kind: 'staff', ...person, roles };
}

export async function customer(name: string): Promise<Extract<Actor, { kind: 'customer' }>> {
  return { kind: 'customer', ...(await insertPerson('customer', name)) };
}

async function insertPerson(kind: 'staff' | 'customer', name: string) {
  const id = PersonId.parse(newId());
  const email = `${name.toLowerCase().replace(/[^a-z]+/g, '.')}.${next()}@example.org`;
  await reading()('people').insert({
    id,
    kind,
    email,
    name,
    password_hash: null,
    totp_secret: null,
    totp_step: 0,
    session_version: 1,
    created_at: now(),
    disabled_at: null,
  });
  return { id, email, name };
}

export interface BuiltPart {
  id: PartId;
  code: string;
  name: string;
  values: PartValues;
}

export async function part(code: string, name: string, values: PartValues, massMilligrams = 1000): Promise<BuiltPart> {
  const id = PartId.parse(newId());
  await reading()('parts').insert({
    id,
    code,
    kind: values.kind,
    name,
    unit: partKinds[values.kind].unit,
    mass_milligrams: massMilligrams,
    values: JSON.stringify(values),
    cost_minor: 120,
    currency: 'GBP',
    note: '',
    save_no: 1,
    created_at: now(),
    retired_at: null,
  });
  return { id, code, name, values };
}

const exact = (nominal: number) => ({ nominal, origin: 'measured' as const });

/** The parts of a plain medium wave set, each under a code of its own. */
export async function setParts(prefix = `P${next()}`) {
  const code = (name: string) => `${prefix}-${name}`;
  return {
    former: await part(code('FORMER'), 'Card tube, 50 mm', {
      kind: 'coil-former',
      outerDiameter: exact(0.05),
      length: 0.11,
      wall: 'thin',
    }),
    wire: await part(code('WIRE'), 'Enamelled wire, 0.4 mm', {
      kind: 'wire',
      bare: 0.0004,
      overall: 0.00044,
      covering: 'enamel',
    }),
    capacitor: await part(code('C-500'), 'Air capacitor', {
      kind: 'variable-capacitor',
      min: exact(1.2e-11),
      max: exact(5e-10),
      law: 'capacitance',
      turnDegrees: 180,
    }),
    coupling: await part(code('C-12P'), 'Ceramic capacitor, 12 pF', { kind: 'fixed-capacitor', c: exact(1.2e-11) }),
    resistor: await part(code('R-100K'), 'Resistor, 100 kΩ', { kind: 'resistor', r: exact(1e5) }),
    detector: await part(code('DET'), 'Germanium detector', {
      kind: 'detector',
      detectorClass: 'germanium',
      measured: false,
    }),
    earphone: await part(code('EAR'), 'Crystal earphone', {
      kind: 'earphone',
      earphoneKind: 'ceramic',
      c: exact(1.2e-8),
      rDc: exact(2e7),
    }),
    aerial: await part(code('AERIAL'), 'Aerial wire, 18 m', { kind: 'aerial-wire', length: 18, radius: 0.0005 }),
  };
}
export type SetParts = Awaited<ReturnType<typeof setParts>>;

export interface BuiltKit {
  kitId: KitId;
  versionId: VersionId;
  code: string;
  number: number;
  name: string;
  letter: string;
  content: VersionContent;
  contentHash: string;
}

export interface KitOptions {
  name?: string;
  code?: string;
  number?: number;
  letter?: string;
  state?: Decided;
  parts?: SetParts;
  /** In pence, tax included; null leaves the kit without a price. */
  price?: number | null;
  kitId?: KitId;
}

/** A kit with one version in some state after it was sent to check, as rows. */
export async function kit(options: KitOptions = {}): Promise<BuiltKit> {
  const number = options.number ?? 100 + next();
  const { name = `Ebb Lamp ${number}`, code = `EL${number}`, letter = 'A', state = 'released' } = options;
  const parts = options.parts ?? (await setParts());
  const designer = await staff('Isolde Hark', 'designer');
  const checker = await staff('Walter Tarrow', 'checker');
  const content = contentOf({ code, number, name, letter }, parts);
  const contentHash = sha256(canonicalJson(content));
  const kitId = options.kitId ?? KitId.parse(newId());
  const versionId = VersionId.parse(newId());
  const at = now();
  const verdict = JSON.stringify(verdictOf(content));
  if (!options.kitId) {
    await reading()('kits').insert({
      id: kitId,
      code,
      number,
      name,
      summary: content.kit.summary,
      audience: content.kit.audience,
      age_from: 10,
      band_code: content.kit.band.code,
      band: JSON.stringify(content.kit.band),
      created_by: designer.id,
      created_at: at,
    });
  }
  await insertDecided(
    {
      id: versionId,
      kit_id: kitId,
      letter,
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
      verdict,
    },
    state,
    { person_id: checker.id, engine_version: '1', rules_version: '1' },
  );
  const price = options.price === undefined ? 3800 : options.price;
  if (price !== null && !options.kitId) await priceStep(kitId, 1, price);
  return { kitId, versionId, code, number, name, letter, content, contentHash };
}

/** Few boxes, yet enough to be sure of 99 %. */
function verdictOf(content: VersionContent) {
  const { design } = designOf(content);
  if (!design) throw new Error('The set of the tests lacks a part.');
  return evaluate(design, { seed: 1, boxes: 500 });
}

export async function priceStep(kitId: KitId, from: number, minor: number): Promise<void> {
  await reading()('prices').insert({
    id: newId(),
    kit_id: kitId,
    from_quantity: from,
    unit_minor: minor,
    currency: 'GBP',
  });
}

/** The invented list of the yard's own region. */
const stations = (
  [
    ['Osk Home', 549],
    ['Harbour', 612],
    ['Vale', 702],
    ['Sluice', 747],
    ['North Cantred', 846],
    ['Hill Service', 954],
    ['Osk Light', 1071],
    ['Ferry', 1197],
    ['Downs', 1341],
    ['Old Mill', 1458],
    ['Cape', 1593],
  ] as const
).map(([name, kHz]) => ({ name, f: kHz * 1000, field: 0.01 }));

function contentOf(
  named: { code: string; number: number; name: string; letter: string },
  parts: SetParts,
): VersionContent {
  const line = (reference: string, place: Place, of: BuiltPart, quantity = 1): FrozenLine => ({
    reference,
    place,
    quantity,
    note: '',
    part: {
      code: of.code,
      name: of.name,
      unit: partKinds[of.values.kind].unit,
      massMilligrams: 1000,
      values: of.values,
    },
  });
  return {
    format: 'coilyard-version/1',
    kit: {
      code: named.code,
      number: named.number,
      name: named.name,
      summary: 'A full medium wave receiver on a hand-wound coil. Takes two evenings and a flat screwdriver.',
      audience: 'Schools and clubs',
      ageFrom: 10,
      band: { code: 'MW-1', lo: 526500, hi: 1606500, firstCarrier: 531000, lastCarrier: 1602000, step: 9000 },
    },
    letter: named.letter,
    circuit: {
      winding: { turns: 68, pitch: null, aerialTap: null, detectorTap: null, tolerance: 0.03 },
      coupling: 'series-c',
      detectorAt: 'top',
      aerial: { vertical: 6, horizontal: 12, siteFactor: { nominal: 1 } },
      earth: { kind: 'resistance', r: { nominal: 30 } },
      stray: { nominal: 8e-12 },
      place: {
        field: 0.01,
        stations,
      },
    },
    guide: {
      intro: 'This set needs no battery.',
      steps: [
        {
          title: 'Wind the coil',
          text: 'Wind 68 turns side by side, and leave 150 mm of wire at each end.',
          uses: ['L1', 'W1'],
          check: 'The winding is 30 to 32 mm long.',
        },
        {
          title: 'Join the parts',
          text: 'Fasten each wire under its own screw, as the drawing shows.',
          uses: ['C1', 'C2', 'D1', 'R1', 'E1', 'A1'],
          check: '',
        },
      ],
      cautions: [...CautionCode.options],
    },
    lines: [
      line('L1', 'tuning coil', parts.former),
      line('W1', 'tuning coil', parts.wire, 16_000),
      line('C1', 'tuning capacitor', parts.capacitor),
      line('C2', 'coupling capacitor', parts.coupling),
      line('D1', 'detector', parts.detector),
      line('R1', 'return resistor', parts.resistor),
      line('E1', 'earphone', parts.earphone),
      line('A1', 'aerial', parts.aerial),
    ],
  };
}

/** Puts stock for so many boxes of a set into the store, by the deed. */
export async function stockFor(packer: Actor, parts: SetParts, boxes: number): Promise<void> {
  for (const one of Object.values(parts)) await lotOf(packer, one, one.values.kind === 'wire' ? boxes * 16_000 : boxes);
}

export async function lotOf(packer: Actor, of: BuiltPart, quantity: number, options: { accepted?: boolean } = {}) {
  const number = next();
  return receiveLot(packer, {
    partId: of.id,
    lotCode: `L-${number.toString().padStart(4, '0')}`,
    supplier: 'Pellstow Wireworks',
    binCode: `C-${(number % 90) + 1}`,
    quantity,
    unitCostMinor: 120,
    accepted: options.accepted ?? true,
  });
}

/** Delivery and tax rows as an installation has them. */
export async function deliveryAndTax(): Promise<void> {
  await reading()('delivery_methods').insert([
    {
      code: 'parcel',
      name: 'Parcel',
      promise: '2 to 3 working days',
      countries: 'GB',
      price_minor: 450,
      currency: 'GBP',
      position: 1,
    },
    {
      code: 'abroad',
      name: 'Parcel abroad',
      promise: '5 to 10 working days',
      countries: '*',
      price_minor: 1250,
      currency: 'GBP',
      position: 2,
    },
  ]);
  await reading()('tax_rates').insert({ country: 'GB', basis_points: 2000 });
}
