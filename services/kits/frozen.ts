import type { Knex } from 'knex';
import type { KitId, PersonId, VersionId } from '../ids';
import { refused } from '../problem';
import { sha256 } from '../record';
import { editorsOf, getVersion } from './rows';
import { VersionContent, type VersionState } from './schemas';

export interface Frozen {
  id: VersionId;
  kitId: KitId;
  letter: string;
  state: VersionState;
  content: VersionContent;
  contentHash: string;
  sentBy: PersonId | null;
  sentAt: number | null;
  editorIds: PersonId[];
  /** The verdict the server stored when it was sent, as JSON text. */
  verdict: string | null;
}

/**
 * The frozen version. Its hash is worked out again from its text each time: content that no longer has the hash it was
 * judged under is neither judged, sold, printed nor packed.
 */
export async function readFrozen(sql: Knex, versionId: VersionId): Promise<Frozen> {
  const version = await getVersion(sql, versionId);
  if (version.frozen === null || version.contentHash === null) {
    throw refused(`${version.letter} is still a draft. Send it to check first.`);
  }
  if (sha256(version.frozen) !== version.contentHash) {
    throw refused(
      `The content of version ${version.letter} no longer matches its hash ${version.contentHash.slice(0, 8)}. Nothing of it may be sold, printed or packed; tell the owner.`,
    );
  }
  const editors = await editorsOf(sql, versionId);
  return {
    id: version.id,
    kitId: version.kitId,
    letter: version.letter,
    state: version.state,
    content: VersionContent.parse(JSON.parse(version.frozen)),
    contentHash: version.contentHash,
    sentBy: version.sentBy,
    sentAt: version.sentAt,
    editorIds: editors.map(({ id }) => id),
    verdict: version.verdict,
  };
}

export async function frozenContent(
  sql: Knex,
  versionId: VersionId,
): Promise<Pick<Frozen, 'content' | 'contentHash' | 'state'>> {
  const { content, contentHash, state } = await readFrozen(sql, versionId);
  return { content, contentHash, state };
}

/** The kit's version that was released last and still is; null when there is none. */
export async function currentRelease(
  sql: Knex,
  kitId: KitId,
): Promise<{ versionId: VersionId; letter: string } | null> {
  const row = await sql('versions')
    .join('sign_offs', 'sign_offs.version_id', 'versions.id')
    .where({ 'versions.kit_id': kitId, 'versions.state': 'released', 'sign_offs.decision': 'released' })
    .orderBy([
      { column: 'sign_offs.at', order: 'desc' },
      { column: 'versions.created_at', order: 'desc' },
    ])
    .select({ versionId: 'versions.id', letter: 'versions.letter' })
    .first<{ versionId: VersionId; letter: string } | undefined>();
  return row ?? null;
}
