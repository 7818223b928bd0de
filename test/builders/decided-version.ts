import { newId } from '@/services/ids';
import { reading } from '@/services/record';

export type Decided = 'in-check' | 'held' | 'released' | 'withdrawn';

/** The row of a version that was sent to check, with whatever else a draft has. */
interface SentRow {
  [column: string]: unknown;
  id: string;
  created_at: number;
  content: string;
  content_hash: string;
  sent_by: string;
  sent_at: number;
  verdict: string;
}

/** Who signed a release, and under which engine and rules. */
interface Signature {
  person_id: string;
  engine_version: string;
  rules_version: string;
}

/** Rows of a version in some state, by the only way that the tables allow: draft, in check, signed, decided. */
export async function insertDecided(row: SentRow, state: Decided, signature: Signature): Promise<void> {
  const { content, content_hash, sent_by, sent_at, verdict, ...draft } = row;
  const versions = () => reading()('versions').where({ id: row.id });
  const sent = { content, content_hash, sent_by, sent_at, verdict };
  const empty = Object.fromEntries(Object.keys(sent).map((column) => [column, null]));
  await reading()('versions').insert({ ...draft, ...empty, state: 'draft' });
  await versions().update({ ...sent, state: 'in-check' });
  if (state === 'released' || state === 'withdrawn') {
    await reading()('sign_offs').insert({
      id: newId(),
      version_id: row.id,
      decision: 'released',
      at: row.created_at,
      content_hash,
      verdict,
      reasons: '{}',
      remark: 'Tried on one build.',
      ...signature,
    });
    await versions().update({ state: 'released' });
  }
  if (state === 'held' || state === 'withdrawn') await versions().update({ state });
}
