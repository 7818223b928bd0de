import { type Actor, must } from '../access';
import { VersionId } from '../ids';
import { parse } from '../problem';
import { reading } from '../record';
import { editorsOf, getKit, getVersion } from './rows';

export interface VersionForMail {
  kitName: string;
  letter: string;
  recipients: { name: string; email: string }[];
  remark: string;
}

/** What a letter about a held or released version says, and to whom: everybody who worked on it. */
export async function readVersionForMail(actor: Actor, id: string): Promise<VersionForMail> {
  must(actor, 'mail.send');
  const versionId = parse(VersionId, id);
  const sql = reading();
  const version = await getVersion(sql, versionId);
  const kit = await getKit(sql, version.kitId);
  const editors = await editorsOf(sql, versionId);
  const last = await sql('sign_offs')
    .select('remark')
    .where({ version_id: versionId })
    .orderBy('at', 'desc')
    .first<{ remark: string } | undefined>();
  return {
    kitName: kit.name,
    letter: version.letter,
    recipients: editors.map(({ name, email }) => ({ name, email })),
    remark: last?.remark ?? '',
  };
}
