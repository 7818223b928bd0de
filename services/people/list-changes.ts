import { type Actor, must } from '../access';
import { parse } from '../problem';
import { hashOfChange, reading } from '../record';
import { type ChangeView, type ChangesView, ListChanges } from './schemas';

interface ChangeRow {
  seq: number;
  id: string;
  at: number;
  actor_id: string | null;
  actor_name: string;
  action: string;
  subject_kind: string;
  subject_id: string;
  before: string | null;
  after: string | null;
  reason: string | null;
  previous_hash: string;
  hash: string;
}

const columns = [
  'seq',
  'id',
  'at',
  'actor_id',
  'actor_name',
  'action',
  'subject_kind',
  'subject_id',
  'before',
  'after',
  'reason',
  'previous_hash',
  'hash',
] as const;

const pageLength = 50;

/** The record of changes, newest first, fifty lines a page; of one thing when it is named. */
export async function listChanges(actor: Actor, input: ListChanges): Promise<ChangesView> {
  must(actor, 'record.read');
  const { before, subjectKind, subjectId } = parse(ListChanges, input);
  const lines = reading()('changes')
    .orderBy('seq', 'desc')
    .limit(pageLength + 1);
  if (before !== undefined) lines.where('seq', '<', before);
  if (subjectKind !== undefined && subjectId !== undefined) {
    lines.where({ subject_kind: subjectKind, subject_id: subjectId });
  }
  const found = await lines.select<ChangeRow[]>(...columns);
  const shown = found.slice(0, pageLength);
  return { changes: shown.map(toView), older: found.length > pageLength ? (shown.at(-1)?.seq ?? null) : null };
}

const toView = (row: ChangeRow): ChangeView => ({
  seq: row.seq,
  at: row.at,
  who: row.actor_name,
  action: row.action,
  subject: { kind: row.subject_kind, id: row.subject_id },
  before: row.before,
  after: row.after,
  reason: row.reason,
  hash: row.hash,
});

export type ChainReport =
  { holds: true; lines: number; head: string } | { holds: false; seq: number; sentence: string };

/**
 * Walks the whole record and recomputes every hash; names the first line that was changed, moved or taken out. Open to
 * the owner and to the command that does it on the machine itself.
 */
export async function verifyChanges(actor: Actor): Promise<ChainReport> {
  must(actor, 'record.verify');
  const batch = 1000;
  let head = '';
  let seq = 0;
  for (;;) {
    const lines = await reading()('changes')
      .where('seq', '>', seq)
      .orderBy('seq')
      .limit(batch)
      .select<ChangeRow[]>(...columns);
    for (const { hash, ...line } of lines) {
      if (line.seq !== seq + 1) return broken(line.seq, `A line is missing before line ${line.seq}.`);
      if (line.previous_hash !== head) return broken(line.seq, `Line ${line.seq} does not follow from the one before.`);
      if (hashOfChange(line) !== hash) return broken(line.seq, `Line ${line.seq} was changed after it was written.`);
      head = hash;
      seq = line.seq;
    }
    if (lines.length < batch) return { holds: true, lines: seq, head };
  }
}

const broken = (seq: number, sentence: string): ChainReport => ({
  holds: false,
  seq,
  sentence: `${sentence} Compare it with the last backup and tell the owner.`,
});
