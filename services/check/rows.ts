import type { Knex } from 'knex';
import { personIdOf } from '../access';
import { newId, type VersionId } from '../ids';
import { type Tx, canonicalJson } from '../record';
import { ENGINE_VERSION, type Verdict, defaultRules } from '../receiver';

export type Decision = 'released' | 'held' | 'withdrawn';

export async function insertSignOff(
  tx: Tx,
  signOff: {
    versionId: VersionId;
    decision: Decision;
    contentHash: string;
    verdict: Verdict;
    reasons: Readonly<Record<string, string>>;
    remark: string;
  },
): Promise<void> {
  await tx.sql('sign_offs').insert({
    id: newId(),
    version_id: signOff.versionId,
    decision: signOff.decision,
    person_id: personIdOf(tx.actor),
    at: tx.now,
    content_hash: signOff.contentHash,
    engine_version: ENGINE_VERSION,
    rules_version: defaultRules.version,
    verdict: canonicalJson(signOff.verdict),
    reasons: JSON.stringify(signOff.reasons),
    remark: signOff.remark,
  });
}

export interface SignOffRow {
  decision: Decision;
  name: string;
  at: number;
  content_hash: string;
  engine_version: string;
  rules_version: string;
  verdict: string;
  reasons: string;
  remark: string;
}

/** The version's last decision, or its last of one kind. */
export async function findSignOff(
  sql: Knex,
  versionId: VersionId,
  decision?: Decision,
): Promise<SignOffRow | undefined> {
  return sql('sign_offs')
    .join('people', 'people.id', 'sign_offs.person_id')
    .where({ 'sign_offs.version_id': versionId, ...(decision && { 'sign_offs.decision': decision }) })
    .select(
      'sign_offs.decision',
      'people.name',
      'sign_offs.at',
      'sign_offs.content_hash',
      'sign_offs.engine_version',
      'sign_offs.rules_version',
      'sign_offs.verdict',
      'sign_offs.reasons',
      'sign_offs.remark',
    )
    .orderBy('sign_offs.at', 'desc')
    .first();
}
