import type { Knex } from 'knex';
import type { Actor, Role } from '@/services/access';
import { PersonId, type KitId, type VersionId, newId } from '@/services/ids';
import { addLine, createKit, readVersion, saveCircuit, saveGuide } from '@/services/kits';
import { firstCircuit } from '@/services/kits/rules';
import { CautionCode, type Circuit, type Guide, type VersionContent, type VersionView } from '@/services/kits/schemas';
import { addPart, listParts } from '@/services/parts';
import { type NewPart, type Place, partKinds } from '@/services/parts/schemas';

/** Somebody of the yard with these roles, in the database and as an actor. */
export async function someStaff(sql: Knex, name: string, roles: Role[]): Promise<Extract<Actor, { kind: 'staff' }>> {
  const id = PersonId.parse(newId());
  const email = `${name.toLowerCase().replaceAll(' ', '.')}.${id.slice(0, 6)}@yard.example`;
  await sql('people').insert({
    id,
    kind: 'staff',
    email,
    name,
    password_hash: null,
    totp_secret: null,
    totp_step: 0,
    session_version: 1,
    created_at: 0,
    disabled_at: null,
  });
  for (const role of roles) await sql('person_roles').insert({ person_id: id, role });
  return { kind: 'staff', id, name, email, roles };
}

const maker = (nominal: number, tol?: number) => ({
  nominal,
  origin: 'maker' as const,
  ...(tol !== undefined && { tol }),
});
const part = (
  code: string,
  name: string,
  minor: number,
  massMilligrams: number,
  values: NewPart['values'],
): NewPart => ({
  code,
  name,
  massMilligrams,
  cost: { minor, currency: 'GBP' },
  note: '',
  values,
});

/** Parts of a set that clears the whole medium wave, and some that spoil it. */
export const someParts: NewPart[] = [
  part('F-50', 'Card tube, 50 mm', 110, 22_000, {
    kind: 'coil-former',
    outerDiameter: maker(0.05, 0.01),
    length: 0.09,
    wall: 'thin',
  }),
  part('W-500', 'Enamelled wire, 0.5 mm', 18, 1_800, {
    kind: 'wire',
    bare: 0.0005,
    overall: 0.000534,
    covering: 'enamel',
  }),
  part('C-500', 'Variable capacitor, 500 pF', 940, 95_000, {
    kind: 'variable-capacitor',
    min: maker(1.2e-11, 0.05),
    max: maker(5e-10, 0.03),
    law: 'capacitance',
    turnDegrees: 180,
  }),
  part('C-220', 'Variable capacitor, 220 pF', 420, 40_000, {
    kind: 'variable-capacitor',
    min: maker(1e-11, 0.1),
    max: maker(2.2e-10, 0.05),
    law: 'capacitance',
    turnDegrees: 180,
  }),
  part('CC-12', 'Mica capacitor, 12 pF', 35, 900, { kind: 'fixed-capacitor', c: maker(1.2e-11, 0.05) }),
  part('D-GE', 'Germanium diode, glass', 60, 300, {
    kind: 'detector',
    detectorClass: 'germanium',
    saturationCurrent: maker(2e-7),
    idealityFactor: maker(1.3),
    seriesResistance: maker(7),
    junctionCapacitance: maker(8e-13),
    measured: true,
  }),
  part('E-HM', 'Headset, high impedance', 1250, 160_000, {
    kind: 'earphone',
    earphoneKind: 'magnetic',
    rDc: maker(4000),
    r: maker(18_000),
    x: 16_000,
    threshold: 3e-14,
  }),
  part('E-32', 'Earphone, 32 ohm', 150, 12_000, {
    kind: 'earphone',
    earphoneKind: 'dynamic',
    rDc: maker(32),
    r: maker(32),
    x: 5,
  }),
  part('A-40', 'Aerial wire, 40 m', 520, 300_000, { kind: 'aerial-wire', length: 40, radius: 0.001 }),
  part('G-5', 'Earth lead, 5 m', 140, 60_000, { kind: 'earth-lead', length: 5 }),
  part('P-7', 'Build guide', 90, 35_000, { kind: 'print' }),
];

export async function addSomeParts(actor: Actor): Promise<void> {
  for (const one of someParts) await addPart(actor, one);
}

export async function partIdOf(actor: Actor, code: string) {
  const found = (await listParts(actor, { q: code })).parts.find((one) => one.code === code);
  if (!found) throw new Error(`No part ${code} in the test's store.`);
  return found.id;
}

export interface PlannedLine {
  reference: string;
  place: Place;
  code: string;
  quantity: number;
}

const goodLines: PlannedLine[] = [
  { reference: 'F1', place: 'tuning coil', code: 'F-50', quantity: 1 },
  { reference: 'L1', place: 'tuning coil', code: 'W-500', quantity: 13_500 },
  { reference: 'C1', place: 'tuning capacitor', code: 'C-500', quantity: 1 },
  { reference: 'C2', place: 'coupling capacitor', code: 'CC-12', quantity: 1 },
  { reference: 'D1', place: 'detector', code: 'D-GE', quantity: 1 },
  { reference: 'E1', place: 'earphone', code: 'E-HM', quantity: 1 },
  { reference: 'W1', place: 'aerial', code: 'A-40', quantity: 1 },
  { reference: 'G1', place: 'earth', code: 'G-5', quantity: 1 },
  { reference: 'P1', place: 'print', code: 'P-7', quantity: 1 },
];

const goodCircuit = (): Circuit => {
  const first = firstCircuit();
  return {
    ...first,
    winding: { ...first.winding, turns: 72, pitch: 0.00055, tolerance: 0.02 },
    aerial: { vertical: 8, horizontal: 30, siteFactor: { nominal: 1.1, tol: 0.1 } },
    earth: { kind: 'resistance', r: { nominal: 40 } },
    stray: { nominal: 4e-12, tol: 0.5 },
  };
};

const guideFor = (lines: readonly PlannedLine[]): Guide => ({
  intro: 'One evening at the kitchen table, and the set plays without a battery.',
  steps: lines
    .filter(({ place }) => place !== 'print')
    .map(({ reference }) => ({
      title: `Fit ${reference}`,
      text: `Lay ${reference} where the drawing shows it and fasten it.`,
      uses: [reference],
      check: '',
    })),
  cautions: [...CautionCode.options],
});

let count = 0;

/** A version that clears everything, until something else is said. `.plain()` serves rules, `.saved()` goes through deeds. */
export function aVersion() {
  let lines = goodLines;
  let circuit = goodCircuit();
  let guide: Guide | null = null;

  const self = {
    /** Another part on one of its lines. */
    withPart(reference: string, code: string) {
      lines = lines.map((line) => (line.reference === reference ? { ...line, code } : line));
      return self;
    },
    withQuantity(reference: string, quantity: number) {
      lines = lines.map((line) => (line.reference === reference ? { ...line, quantity } : line));
      return self;
    },
    without(reference: string) {
      lines = lines.filter((line) => line.reference !== reference);
      return self;
    },
    withTurns(turns: number) {
      circuit = { ...circuit, winding: { ...circuit.winding, turns } };
      return self;
    },
    withCircuit(change: Partial<Circuit>) {
      circuit = { ...circuit, ...change };
      return self;
    },
    withGuide(next: Guide) {
      guide = next;
      return self;
    },
    plain(): VersionContent {
      return {
        format: 'coilyard-version/1',
        kit: someKit(7),
        letter: 'A',
        circuit,
        guide: guide ?? guideFor(lines),
        lines: lines.map(({ reference, place, code, quantity }) => {
          const found = someParts.find((one) => one.code === code);
          if (!found) throw new Error(`No part ${code} among the test's parts.`);
          const { name, massMilligrams, values } = found;
          const unit = partKinds[values.kind].unit;
          return { reference, place, quantity, note: '', part: { code, name, unit, massMilligrams, values } };
        }),
      };
    },
    /** Draws it as this designer: a new kit with this version as its draft A. The parts must be there already. */
    async saved(actor: Actor): Promise<{ kitId: KitId; versionId: VersionId; view: VersionView }> {
      const made = await createKit(actor, someKit(100 + ++count));
      for (const { code, ...line } of lines) {
        await addLine(actor, { ...line, versionId: made.versionId, partId: await partIdOf(actor, code), note: '' });
      }
      let view = await readVersion(actor, made.versionId);
      view = await saveCircuit(actor, { versionId: view.id, circuit, basedOn: view.saveNo });
      view = await saveGuide(actor, { versionId: view.id, guide: guide ?? guideFor(lines), basedOn: view.saveNo });
      return { ...made, view };
    },
  };
  return self;
}

export const someKit = (number: number) => ({
  code: `K${number}`,
  number,
  name: `Kit ${number}`,
  summary: 'The whole medium wave on one coil and a big air capacitor.',
  audience: 'Builders who have made one set before',
  ageFrom: 12,
  band: { code: 'MW-1', lo: 526_500, hi: 1_606_500, firstCarrier: 531_000, lastCarrier: 1_602_000, step: 9_000 },
});
