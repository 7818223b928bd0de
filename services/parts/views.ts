import { type Actor, must } from '../access';
import { PartId } from '../ids';
import { missing, parse } from '../problem';
import { reading } from '../record';
import { type Part, type Stock, type StockedRow, kindsAt, partOf, selectStocked, stockOf } from './rows';
import { ListParts, type PartPage, type PartView } from './schemas';

const PAGE = 50;

/** Parts in the order of their codes, a page at a time. */
export async function listParts(actor: Actor, input: ListParts = {}): Promise<PartPage> {
  must(actor, 'part.read');
  const { kind, place, q, after, retired = false } = parse(ListParts, input);
  const query = selectStocked(reading())
    .orderBy('parts.code')
    .limit(PAGE + 1);
  if (!retired) query.whereNull('parts.retired_at');
  if (kind) query.where('parts.kind', kind);
  if (place) query.whereIn('parts.kind', kindsAt(place));
  if (after) query.where('parts.code', '>', after);
  const words = wordsOf(q);
  if (words === null) return { parts: [], next: null };
  for (const word of words) {
    query.where((either) => either.whereLike('parts.code', `%${word}%`).orWhereLike('parts.name', `%${word}%`));
  }
  const rows: StockedRow[] = await query;
  const page = rows.slice(0, PAGE).map((row) => viewOf(partOf(row), stockOf(row)));
  return { parts: page, next: rows.length > PAGE ? (page.at(-1)?.code ?? null) : null };
}

export async function readPart(actor: Actor, id: string): Promise<PartView> {
  must(actor, 'part.read');
  const partId = PartId.safeParse(id);
  const row: StockedRow | undefined = partId.success
    ? await selectStocked(reading()).where('parts.id', partId.data).first()
    : undefined;
  if (!row) throw missing('There is no such part. Look for it in the list of parts.');
  return viewOf(partOf(row), stockOf(row));
}

export interface PartUse {
  versionId: string;
  kitName: string;
  kitNumber: number;
  letter: string;
  state: string;
  references: string[];
}

/** Every version that has the part on one of its lines, newest first. */
export async function readUse(actor: Actor, id: PartId): Promise<PartUse[]> {
  must(actor, 'part.read');
  const rows: {
    versionId: string;
    kitName: string;
    kitNumber: number;
    letter: string;
    state: string;
    reference: string;
  }[] = await reading()('lines')
    .join('versions', 'versions.id', 'lines.version_id')
    .join('kits', 'kits.id', 'versions.kit_id')
    .where('lines.part_id', id)
    .select({
      versionId: 'versions.id',
      kitName: 'kits.name',
      kitNumber: 'kits.number',
      letter: 'versions.letter',
      state: 'versions.state',
      reference: 'lines.reference',
    })
    .orderBy([
      { column: 'kits.number' },
      { column: 'versions.created_at', order: 'desc' },
      { column: 'lines.reference' },
    ])
    .limit(200);
  const uses = new Map<string, PartUse>();
  for (const { reference, ...version } of rows) {
    const use = uses.get(version.versionId) ?? { ...version, references: [] };
    use.references.push(reference);
    uses.set(version.versionId, use);
  }
  return [...uses.values()];
}

export const viewOf = (part: Part, stock: Stock): PartView => ({
  id: part.id,
  code: part.code,
  kind: part.values.kind,
  name: part.name,
  unit: part.unit,
  massMilligrams: part.massMilligrams,
  cost: part.cost,
  note: part.note,
  values: part.values,
  saveNo: part.saveNo,
  retired: part.retiredAt !== null,
  stock,
});

/** The words to look for, all of them; LIKE's wildcards part words like blanks. Null when only such signs were typed. */
function wordsOf(q = ''): string[] | null {
  const words = q.split(/[\s%_]+/).filter((word) => word !== '');
  return q.trim() !== '' && words.length === 0 ? null : words;
}
