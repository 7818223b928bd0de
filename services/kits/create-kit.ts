import { type Actor, must } from '../access';
import { KitId, VersionId, newId } from '../ids';
import { invalid, parse } from '../problem';
import { record, write } from '../record';
import { insertKit, insertVersion, noteEditor } from './rows';
import { firstCircuit, letterAfter } from './rules';
import { NewKit } from './schemas';

/** Makes a kit with an empty draft A. Its code and number are never used again. */
export async function createKit(actor: Actor, input: NewKit): Promise<{ kitId: KitId; versionId: VersionId }> {
  must(actor, 'kit.create');
  const about = parse(NewKit, input);
  const kit = { id: KitId.parse(newId()), ...about };
  const versionId = VersionId.parse(newId());
  return write(actor, async (tx) => {
    const taken: { code: string; number: number }[] = await tx
      .sql('kits')
      .select('code', 'number')
      .where({ code: kit.code })
      .orWhere({ number: kit.number });
    if (taken.length > 0) {
      throw invalid('Another kit has this code or number.', {
        ...(taken.some(({ code }) => code === kit.code) && {
          code: `${kit.code} names another kit. Choose another code.`,
        }),
        ...(taken.some(({ number }) => number === kit.number) && {
          number: `No. ${kit.number} is another kit. Choose another number.`,
        }),
      });
    }
    await insertKit(tx, kit);
    await insertVersion(tx, {
      id: versionId,
      kitId: kit.id,
      letter: letterAfter(null),
      state: 'draft',
      basedOnId: null,
      circuit: firstCircuit(),
      guide: { intro: '', steps: [], cautions: [] },
      saveNo: 1,
      createdAt: tx.now,
      updatedAt: tx.now,
      frozen: null,
      contentHash: null,
      sentBy: null,
      sentAt: null,
      verdict: null,
    });
    await noteEditor(tx, versionId);
    await record(tx, 'kit.created', { subject: { kind: 'kit', id: kit.id }, after: kit });
    await record(tx, 'version.started', {
      subject: { kind: 'version', id: versionId },
      after: { kit: kit.code, letter: 'A' },
    });
    return { kitId: kit.id, versionId };
  });
}
