import { type Actor, must } from '../access';
import { conflict, parse } from '../problem';
import { type Tx, record, write } from '../record';
import { type Version, getDraft, getVersion, noteEditor, updateDraft } from './rows';
import { SaveCircuit, SaveGuide, type VersionView } from './schemas';
import { viewOf } from './views';

/** Saves winding, coupling and assumptions; a save by somebody else since `basedOn` is a conflict. */
export async function saveCircuit(actor: Actor, input: SaveCircuit): Promise<VersionView> {
  must(actor, 'version.edit');
  const { versionId, circuit, basedOn } = parse(SaveCircuit, input);
  return write(actor, async (tx) => {
    const before = await getDraft(tx.sql, versionId);
    if (!(await updateDraft(tx, versionId, basedOn, { circuit }))) throw await meanwhile(tx, before);
    return saved(tx, before, 'circuit.saved', { before: before.circuit, after: circuit });
  });
}

export async function saveGuide(actor: Actor, input: SaveGuide): Promise<VersionView> {
  must(actor, 'version.edit');
  const { versionId, guide, basedOn } = parse(SaveGuide, input);
  return write(actor, async (tx) => {
    const before = await getDraft(tx.sql, versionId);
    if (!(await updateDraft(tx, versionId, basedOn, { guide }))) throw await meanwhile(tx, before);
    return saved(tx, before, 'guide.saved', { before: before.guide, after: guide });
  });
}

const meanwhile = async (tx: Tx, version: Version) =>
  conflict('Somebody changed this version meanwhile. Read what changed, then save again.', {
    version: await viewOf(tx.sql, tx.actor, version),
  });

async function saved(
  tx: Tx,
  { id }: Version,
  action: string,
  change: { before: unknown; after: unknown },
): Promise<VersionView> {
  await noteEditor(tx, id);
  await record(tx, action, { subject: { kind: 'version', id }, ...change });
  return viewOf(tx.sql, tx.actor, await getVersion(tx.sql, id));
}
