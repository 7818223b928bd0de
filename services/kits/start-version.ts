import { type Actor, must } from '../access';
import { LineId, VersionId, newId } from '../ids';
import { parse, refused } from '../problem';
import { record, write } from '../record';
import {
  getKit,
  getVersion,
  inheritEditors,
  insertLine,
  insertVersion,
  linesOf,
  noteEditor,
  versionsOfKit,
} from './rows';
import { firstCircuit, latestLetter, letterAfter } from './rules';
import { StartVersion } from './schemas';

/** Starts the kit's next version, with the circuit, guide and lines of an earlier one, or empty. */
export async function startVersion(actor: Actor, input: StartVersion): Promise<{ versionId: VersionId }> {
  must(actor, 'version.edit');
  const { kitId, fromVersionId } = parse(StartVersion, input);
  return write(actor, async (tx) => {
    const kit = await getKit(tx.sql, kitId);
    const from = fromVersionId === null ? null : await getVersion(tx.sql, fromVersionId);
    if (from && from.kitId !== kitId)
      throw refused('A version starts from one of its own kit. Choose one of its letters.');
    const siblings = await versionsOfKit(tx.sql, kitId);
    const letter = letterAfter(latestLetter(siblings.map((one) => one.letter)));
    const versionId = VersionId.parse(newId());
    await insertVersion(tx, {
      id: versionId,
      kitId,
      letter,
      state: 'draft',
      basedOnId: from?.id ?? null,
      circuit: from?.circuit ?? firstCircuit(),
      guide: from?.guide ?? { intro: '', steps: [], cautions: [] },
      saveNo: 1,
      createdAt: tx.now,
      updatedAt: tx.now,
      frozen: null,
      contentHash: null,
      sentBy: null,
      sentAt: null,
      verdict: null,
    });
    for (const line of from ? await linesOf(tx.sql, from.id) : []) {
      await insertLine(tx.sql, { ...line, id: LineId.parse(newId()), versionId, saveNo: 1 });
    }
    if (from) await inheritEditors(tx, from.id, versionId);
    await noteEditor(tx, versionId);
    await record(tx, 'version.started', {
      subject: { kind: 'version', id: versionId },
      after: { kit: kit.code, letter, from: from?.letter ?? null },
    });
    return { versionId };
  });
}
