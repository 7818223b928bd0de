import { type Tx, canonicalJson, sha256 } from '../record';
import { personIdOf } from '../access';
import type { VersionId } from '../ids';
import type { VersionContent } from './schemas';
import { contentOf, getDraft, getKit, getVersion, linesOf, noteEditor } from './rows';
import type { Knex } from 'knex';

/** A draft's content as it stands, with the number of its last save and the codes of retired parts in it. */
export async function readDraft(
  sql: Knex,
  versionId: VersionId,
): Promise<{ content: VersionContent; saveNo: number; retired: string[] }> {
  const version = await getDraft(sql, versionId);
  const lines = await linesOf(sql, versionId);
  return {
    content: contentOf(await getKit(sql, version.kitId), version, lines),
    saveNo: version.saveNo,
    retired: lines.flatMap((line) => (line.retired && line.part ? [line.part.code] : [])),
  };
}

/** Puts the draft in check under the hash of its canonical text. False when it changed since `saveNo`. */
export async function freezeVersion(
  tx: Tx,
  frozen: { versionId: VersionId; saveNo: number; content: VersionContent; verdict: unknown },
): Promise<{ contentHash: string } | null> {
  const text = canonicalJson(frozen.content);
  const contentHash = sha256(text);
  const changed = await tx
    .sql('versions')
    .where({ id: frozen.versionId, save_no: frozen.saveNo, state: 'draft' })
    .update({
      state: 'in-check',
      content: text,
      content_hash: contentHash,
      sent_by: personIdOf(tx.actor),
      sent_at: tx.now,
      verdict: canonicalJson(frozen.verdict),
    });
  if (changed !== 1) return null;
  // Whoever sends it stands for it: such a person is told how it was judged, and does not judge it.
  await noteEditor(tx, frozen.versionId);
  return { contentHash };
}

/** Takes a version that nobody has judged back to draft. */
export async function thawVersion(tx: Tx, versionId: VersionId): Promise<boolean> {
  const version = await getVersion(tx.sql, versionId);
  const changed = await tx
    .sql('versions')
    .where({ id: versionId, state: 'in-check' })
    .update({
      state: 'draft',
      content: null,
      content_hash: null,
      sent_by: null,
      sent_at: null,
      verdict: null,
      save_no: version.saveNo + 1,
      updated_at: tx.now,
    });
  return changed === 1;
}

/** Sets the state that a decision gives; false when somebody decided before. */
export async function setState(
  tx: Tx,
  versionId: VersionId,
  from: 'in-check' | 'released',
  to: 'held' | 'released' | 'withdrawn',
): Promise<boolean> {
  return (await tx.sql('versions').where({ id: versionId, state: from }).update({ state: to })) === 1;
}
