import type { Knex } from 'knex';
import { VersionId } from '../ids';
import { Verdict } from '../receiver';
import { allFindings, differences } from './rules';
import { type Version, findVersion } from './rows';
import { VersionContent, type VersionView } from './schemas';

interface HoldRow {
  version_id: string;
  name: string;
  at: number;
  remark: string;
  verdict: string;
}

/**
 * What the check room said when it held this version or one it descends from, the nearest first, and what has changed
 * since. A descendant of a version that was released after the hold owes it no answer.
 */
export async function heldBefore(sql: Knex, version: Version, content: VersionContent): Promise<VersionView['held']> {
  let ancestor: Version | null = version;
  for (let steps = 0; ancestor && steps < 30; steps++) {
    const row: HoldRow | undefined = await sql('sign_offs')
      .join('people', 'people.id', 'sign_offs.person_id')
      .where({ 'sign_offs.version_id': ancestor.id, 'sign_offs.decision': 'held' })
      .select('sign_offs.version_id', 'people.name', 'sign_offs.at', 'sign_offs.remark', 'sign_offs.verdict')
      .first();
    if (row && ancestor.frozen !== null) return heldView(row, ancestor.letter, ancestor.frozen, content);
    if (ancestor.state === 'released' || ancestor.state === 'withdrawn') return null;
    ancestor = ancestor.basedOnId === null ? null : await findVersion(sql, VersionId.parse(ancestor.basedOnId));
  }
  return null;
}

function heldView(row: HoldRow, letter: string, frozen: string, content: VersionContent): VersionView['held'] {
  const heldContent = VersionContent.parse(JSON.parse(frozen));
  const verdict = Verdict.parse(JSON.parse(row.verdict));
  return {
    letter,
    by: row.name,
    at: row.at,
    remark: row.remark,
    findings: allFindings(verdict, heldContent)
      .filter(({ severity }) => severity !== 'info')
      .map(({ code, severity, message }) => ({ code, severity, message })),
    changes: differences(heldContent, content),
  };
}
