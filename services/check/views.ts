import type { Knex } from 'knex';
import { type Actor, can, must, personIdOf } from '../access';
import { VersionId } from '../ids';
import { JUDGED, evaluateApart, readFrozen, readVersion, storedVerdict } from '../kits';
import { differences } from '../kits/rules';
import { VersionContent, VersionState } from '../kits/schemas';
import { missing } from '../problem';
import { reading } from '../record';
import { Verdict } from '../receiver';
import { clearedRules } from './cleared';
import { findSignOff } from './rows';
import type { Queue, QueueEntry, Sheet, SignOff } from './schemas';

/** What waits, oldest first, and what was held, newest first. */
export async function readQueue(actor: Actor): Promise<Queue> {
  must(actor, 'version.check');
  const waiting = await entries(actor, 'in-check', 'asc');
  return { waiting, held: (await entries(actor, 'held', 'desc')).slice(0, 12) };
}

/** Versions of one decided state, newest decision first. */
export async function listDecided(actor: Actor, state: 'released' | 'held' | 'withdrawn'): Promise<QueueEntry[]> {
  must(actor, 'version.read');
  const all = await entries(actor, state, 'desc');
  return all.sort((a, b) => (b.decision?.at ?? 0) - (a.decision?.at ?? 0));
}

interface EntryRow {
  id: string;
  letter: string;
  state: string;
  content: string;
  verdict: string | null;
  sent_at: number;
  sender: string;
  own: number | null;
}

async function entries(actor: Actor, state: VersionState, order: 'asc' | 'desc'): Promise<QueueEntry[]> {
  const sql = reading();
  const rows: EntryRow[] = await sql('versions')
    .join('people', 'people.id', 'versions.sent_by')
    .leftJoin('version_editors', (join) =>
      join
        .on('version_editors.version_id', 'versions.id')
        .andOnVal('version_editors.person_id', personIdOf(actor) ?? ''),
    )
    .where('versions.state', state)
    .select({
      id: 'versions.id',
      letter: 'versions.letter',
      state: 'versions.state',
      content: 'versions.content',
      verdict: 'versions.verdict',
      sent_at: 'versions.sent_at',
      sender: 'people.name',
      own: 'version_editors.at',
    })
    .orderBy('versions.sent_at', order)
    .limit(200);
  const list: QueueEntry[] = [];
  for (const row of rows) list.push(await entryOf(sql, row));
  return list;
}

async function entryOf(sql: Knex, row: EntryRow): Promise<QueueEntry> {
  const versionId = VersionId.parse(row.id);
  const { kit } = VersionContent.parse(JSON.parse(row.content));
  const decided = await findSignOff(sql, versionId);
  return {
    versionId,
    kitNumber: kit.number,
    kitName: kit.name,
    letter: row.letter,
    state: VersionState.parse(row.state),
    band: kit.band,
    reach: storedVerdict(row.verdict)?.reach ?? null,
    sentBy: row.sender,
    sentAt: row.sent_at,
    own: row.own !== null,
    decision: decided ? { by: decided.name, at: decided.at, remark: decided.remark } : null,
  };
}

/** The check sheet of a frozen version, worked out again from its content. */
export async function readSheet(actor: Actor, id: string): Promise<Sheet> {
  must(actor, 'version.read');
  const versionId = VersionId.safeParse(id);
  if (!versionId.success) throw missing('There is no such version. Look for it in the queue.');
  const sql = reading();
  const row = await sql('versions').where({ id: versionId.data }).first<{ state: string } | undefined>('state');
  if (row?.state === 'draft') throw missing('This version is a draft, so there is nothing to check yet.');
  const frozen = await readFrozen(sql, versionId.data);
  const evaluation = await evaluateApart(frozen.content, { ...JUDGED, withContour: true });
  const view = await readVersion(actor, versionId.data);
  const decided = await findSignOff(sql, versionId.data);
  const sender = await sql('people').select('name').where({ id: frozen.sentBy }).first<{ name: string } | undefined>();
  return {
    versionId: versionId.data,
    state: frozen.state,
    letter: frozen.letter,
    content: frozen.content,
    contentHash: frozen.contentHash,
    sentBy: sender?.name ?? '',
    sentAt: frozen.sentAt ?? 0,
    editors: view.editors.map(({ name }) => name),
    own: view.own,
    mayJudge: can(actor, 'version.release', frozen),
    verdict: evaluation.verdict,
    contour: evaluation.contour,
    findings: evaluation.findings,
    cleared: clearedRules(evaluation.verdict, frozen.content, evaluation.findings),
    basedOn: await basis(sql, versionId.data, frozen.content),
    decision: decided
      ? {
          kind: decided.decision,
          by: decided.name,
          at: decided.at,
          remark: decided.remark,
          reasons: reasonsOf(decided.reasons),
        }
      : null,
  };
}

/** What differs from the version it was started from, where that one was frozen too. */
async function basis(sql: Knex, versionId: VersionId, content: VersionContent): Promise<Sheet['basedOn']> {
  const row = await sql('versions as this')
    .join('versions as base', 'base.id', 'this.based_on_id')
    .where('this.id', versionId)
    .select({ letter: 'base.letter', content: 'base.content' })
    .first<{ letter: string; content: string | null } | undefined>();
  if (!row || row.content === null) return null;
  return { letter: row.letter, differences: differences(VersionContent.parse(JSON.parse(row.content)), content) };
}

/** The release of a version as it was signed; null for one that was never released. */
export async function readSignOff(sql: Knex, versionId: VersionId): Promise<SignOff | null> {
  const row = await findSignOff(sql, versionId, 'released');
  if (!row) return null;
  return {
    by: row.name,
    at: row.at,
    contentHash: row.content_hash,
    engineVersion: row.engine_version,
    rulesVersion: row.rules_version,
    verdict: Verdict.parse(JSON.parse(row.verdict)),
    reasons: reasonsOf(row.reasons),
  };
}

function reasonsOf(text: string): Record<string, string> {
  const parsed: unknown = JSON.parse(text);
  if (typeof parsed !== 'object' || parsed === null) return {};
  return Object.fromEntries(Object.entries(parsed).map(([key, reason]) => [key, String(reason)]));
}
