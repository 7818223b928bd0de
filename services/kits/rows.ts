import type { Knex } from 'knex';
import { KitId, LineId, PartId, PersonId, VersionId } from '../ids';
import { Currency, type Money } from '../money';
import { PartValues, Place, partKinds } from '../parts/schemas';
import { missing, refused } from '../problem';
import type { Tx } from '../record';
import { personIdOf } from '../access';
import { Circuit, type FrozenLine, Guide, KitBand, type NewKit, type VersionContent, VersionState } from './schemas';

export interface Kit extends NewKit {
  id: KitId;
}

export interface Version {
  id: VersionId;
  kitId: KitId;
  letter: string;
  state: VersionState;
  basedOnId: VersionId | null;
  circuit: Circuit;
  guide: Guide;
  saveNo: number;
  createdAt: number;
  updatedAt: number;
  /** Canonical text of the frozen content; null in a draft. */
  frozen: string | null;
  contentHash: string | null;
  sentBy: PersonId | null;
  sentAt: number | null;
  verdict: string | null;
}

export interface Line extends FrozenLine {
  id: LineId;
  versionId: VersionId;
  partId: PartId | null;
  position: number;
  saveNo: number;
  cost: Money | null;
  retired: boolean;
}

const kitColumns = ['id', 'code', 'number', 'name', 'summary', 'audience', 'age_from', 'band'] as const;
type KitRow = Record<'id' | 'code' | 'name' | 'summary' | 'audience' | 'band', string> & {
  number: number;
  age_from: number;
};

export const kitOf = (row: KitRow): Kit => ({
  id: KitId.parse(row.id),
  code: row.code,
  number: row.number,
  name: row.name,
  summary: row.summary,
  audience: row.audience,
  ageFrom: row.age_from,
  band: KitBand.parse(JSON.parse(row.band)),
});

export async function getKit(sql: Knex, id: KitId): Promise<Kit> {
  const row = await sql('kits')
    .select(...kitColumns)
    .where({ id })
    .first<KitRow | undefined>();
  if (!row) throw missing('There is no such kit. Look for it on the bench.');
  return kitOf(row);
}

export async function allKits(sql: Knex): Promise<Kit[]> {
  const rows: KitRow[] = await sql('kits')
    .select(...kitColumns)
    .orderBy('number');
  return rows.map(kitOf);
}

export async function insertKit(tx: Tx, kit: Kit): Promise<void> {
  await tx.sql('kits').insert({
    id: kit.id,
    code: kit.code,
    number: kit.number,
    name: kit.name,
    summary: kit.summary,
    audience: kit.audience,
    age_from: kit.ageFrom,
    band_code: kit.band.code,
    band: JSON.stringify(kit.band),
    created_by: personIdOf(tx.actor),
    created_at: tx.now,
  });
}

const versionColumns = [
  'id',
  'kit_id',
  'letter',
  'state',
  'based_on_id',
  'circuit',
  'guide',
  'save_no',
  'created_at',
  'updated_at',
  'content',
  'content_hash',
  'sent_by',
  'sent_at',
  'verdict',
] as const;

interface VersionRow {
  id: string;
  kit_id: string;
  letter: string;
  state: string;
  based_on_id: string | null;
  circuit: string;
  guide: string;
  save_no: number;
  created_at: number;
  updated_at: number;
  content: string | null;
  content_hash: string | null;
  sent_by: string | null;
  sent_at: number | null;
  verdict: string | null;
}

const versionOf = (row: VersionRow): Version => ({
  id: VersionId.parse(row.id),
  kitId: KitId.parse(row.kit_id),
  letter: row.letter,
  state: VersionState.parse(row.state),
  basedOnId: row.based_on_id === null ? null : VersionId.parse(row.based_on_id),
  circuit: Circuit.parse(JSON.parse(row.circuit)),
  guide: Guide.parse(JSON.parse(row.guide)),
  saveNo: row.save_no,
  createdAt: row.created_at,
  updatedAt: row.updated_at,
  frozen: row.content,
  contentHash: row.content_hash,
  sentBy: row.sent_by === null ? null : PersonId.parse(row.sent_by),
  sentAt: row.sent_at,
  verdict: row.verdict,
});

export async function findVersion(sql: Knex, id: VersionId): Promise<Version | null> {
  const row = await sql('versions')
    .select(...versionColumns)
    .where({ id })
    .first<VersionRow | undefined>();
  return row ? versionOf(row) : null;
}

export async function getVersion(sql: Knex, id: VersionId): Promise<Version> {
  const version = await findVersion(sql, id);
  if (!version) throw missing('There is no such version. Look for it on the bench.');
  return version;
}

/** The version, refused with the way on when it is no draft. */
export async function getDraft(sql: Knex, id: VersionId): Promise<Version> {
  const version = await getVersion(sql, id);
  if (version.state !== 'draft') {
    throw refused(
      `${version.letter} was sent to check and keeps its content. Start a new version from it to change something.`,
    );
  }
  return version;
}

export async function versionsOfKit(sql: Knex, kitId: KitId): Promise<Version[]> {
  const rows: VersionRow[] = await sql('versions')
    .select(...versionColumns)
    .where({ kit_id: kitId })
    .orderBy([{ column: 'created_at' }, { column: 'letter' }]);
  return rows.map(versionOf);
}

export async function allVersions(sql: Knex): Promise<Version[]> {
  const rows: VersionRow[] = await sql('versions')
    .select(...versionColumns)
    .orderBy([{ column: 'created_at' }, { column: 'letter' }]);
  return rows.map(versionOf);
}

export async function insertVersion(tx: Tx, version: Version): Promise<void> {
  await tx.sql('versions').insert({
    id: version.id,
    kit_id: version.kitId,
    letter: version.letter,
    state: version.state,
    based_on_id: version.basedOnId,
    circuit: JSON.stringify(version.circuit),
    guide: JSON.stringify(version.guide),
    save_no: version.saveNo,
    created_by: personIdOf(tx.actor),
    created_at: tx.now,
    updated_at: tx.now,
    content: null,
    content_hash: null,
    sent_by: null,
    sent_at: null,
    verdict: null,
  });
}

/** Saves parts of a draft under a new number; false when it is no draft any more or somebody saved after `basedOn`. */
export async function updateDraft(
  tx: Tx,
  id: VersionId,
  basedOn: number,
  change: { circuit?: Circuit; guide?: Guide } = {},
): Promise<boolean> {
  const changed = await tx
    .sql('versions')
    .where({ id, save_no: basedOn, state: 'draft' })
    .update({
      ...(change.circuit && { circuit: JSON.stringify(change.circuit) }),
      ...(change.guide && { guide: JSON.stringify(change.guide) }),
      save_no: basedOn + 1,
      updated_at: tx.now,
    });
  return changed === 1;
}

/** Everybody who ever edited the version; whoever is on the list may not judge it. */
export async function noteEditor(tx: Tx, versionId: VersionId): Promise<void> {
  const personId = personIdOf(tx.actor);
  if (personId === null) return;
  await tx
    .sql('version_editors')
    .insert({ version_id: versionId, person_id: personId, at: tx.now })
    .onConflict(['version_id', 'person_id'])
    .ignore();
}

/** What was drawn in the version this one starts from is still its drawers' work. */
export async function inheritEditors(tx: Tx, from: VersionId, to: VersionId): Promise<void> {
  const editors: { person_id: string }[] = await tx
    .sql('version_editors')
    .select('person_id')
    .where({ version_id: from });
  for (const { person_id } of editors) {
    await tx
      .sql('version_editors')
      .insert({ version_id: to, person_id, at: tx.now })
      .onConflict(['version_id', 'person_id'])
      .ignore();
  }
}

export async function editorsOf(
  sql: Knex,
  versionId: VersionId,
): Promise<{ id: PersonId; name: string; email: string }[]> {
  const rows: { id: string; name: string; email: string }[] = await sql('version_editors')
    .join('people', 'people.id', 'version_editors.person_id')
    .where('version_editors.version_id', versionId)
    .select('people.id', 'people.name', 'people.email')
    .orderBy([{ column: 'version_editors.at' }, { column: 'people.name' }]);
  return rows.map((row) => ({ ...row, id: PersonId.parse(row.id) }));
}

interface LineRow {
  id: string;
  version_id: string;
  reference: string;
  place: string;
  part_id: string | null;
  quantity: number;
  note: string;
  position: number;
  save_no: number;
  code: string | null;
  name: string | null;
  mass_milligrams: number | null;
  values: string | null;
  cost_minor: number | null;
  currency: string | null;
  retired_at: number | null;
}

function lineOf(row: LineRow): Line {
  return {
    id: LineId.parse(row.id),
    versionId: VersionId.parse(row.version_id),
    reference: row.reference,
    place: Place.parse(row.place),
    quantity: row.quantity,
    note: row.note,
    position: row.position,
    saveNo: row.save_no,
    partId: row.part_id === null ? null : PartId.parse(row.part_id),
    ...partOfLine(row),
  };
}

function partOfLine(row: LineRow): Pick<Line, 'part' | 'cost' | 'retired'> {
  if (row.code === null || row.name === null || row.values === null) return { part: null, cost: null, retired: false };
  const values = PartValues.parse(JSON.parse(row.values));
  return {
    part: {
      code: row.code,
      name: row.name,
      unit: partKinds[values.kind].unit,
      massMilligrams: row.mass_milligrams ?? 0,
      values,
    },
    cost: { minor: row.cost_minor ?? 0, currency: Currency.parse(row.currency) },
    retired: row.retired_at !== null,
  };
}

function selectLines(sql: Knex): Knex.QueryBuilder {
  return sql('lines')
    .leftJoin('parts', 'parts.id', 'lines.part_id')
    .select(
      'lines.id',
      'lines.version_id',
      'lines.reference',
      'lines.place',
      'lines.part_id',
      'lines.quantity',
      'lines.note',
      'lines.position',
      'lines.save_no',
      'parts.code',
      'parts.name',
      'parts.mass_milligrams',
      'parts.values',
      'parts.cost_minor',
      'parts.currency',
      'parts.retired_at',
    )
    .orderBy([{ column: 'lines.position' }, { column: 'lines.reference' }]);
}

export async function linesOf(sql: Knex, versionId: VersionId): Promise<Line[]> {
  const rows: LineRow[] = await selectLines(sql).where('lines.version_id', versionId);
  return rows.map(lineOf);
}

export async function getLine(sql: Knex, id: LineId): Promise<Line> {
  const row: LineRow | undefined = await selectLines(sql).where('lines.id', id).first();
  if (!row) throw missing('This line is no longer there. Somebody removed it meanwhile.');
  return lineOf(row);
}

export type StoredLine = Pick<
  Line,
  'id' | 'versionId' | 'reference' | 'place' | 'partId' | 'quantity' | 'note' | 'position' | 'saveNo'
>;

const lineRow = (line: StoredLine) => ({
  reference: line.reference,
  place: line.place,
  part_id: line.partId,
  quantity: line.quantity,
  note: line.note,
  position: line.position,
  save_no: line.saveNo,
});

export async function insertLine(sql: Knex, line: StoredLine): Promise<void> {
  await sql('lines').insert({ id: line.id, version_id: line.versionId, ...lineRow(line) });
}

export async function updateLine(sql: Knex, line: StoredLine, basedOn: number): Promise<boolean> {
  return (await sql('lines').where({ id: line.id, save_no: basedOn }).update(lineRow(line))) === 1;
}

export async function deleteLine(sql: Knex, id: LineId): Promise<void> {
  await sql('lines').where({ id }).delete();
}

/** What a version is made of, as it stands now: kit, letter, circuit, guide and lines with their parts' values. */
export function contentOf(kit: Kit, version: Version, lines: readonly Line[]): VersionContent {
  const { id: _id, ...about } = kit;
  return {
    format: 'coilyard-version/1',
    kit: about,
    letter: version.letter,
    circuit: version.circuit,
    guide: version.guide,
    lines: lines
      .map(({ reference, place, quantity, note, part }) => ({ reference, place, quantity, note, part }))
      .sort((a, b) => placeOrder(a.place) - placeOrder(b.place) || byReference(a.reference, b.reference)),
  };
}

/** Lines stand by place and reference, so that the order they were typed in makes no difference. */
const placeOrder = (place: Place) => Place.options.indexOf(place);
const byReference = (a: string, b: string) => a.length - b.length || (a < b ? -1 : a > b ? 1 : 0);
