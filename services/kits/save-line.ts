import { type Actor, must } from '../access';
import { LineId, newId } from '../ids';
import { getPartOfLine, placeRefusal } from './line-part';
import { conflict, invalid, parse, refused } from '../problem';
import { type Tx, record, write } from '../record';
import {
  type StoredLine,
  type Version,
  deleteLine,
  getDraft,
  getLine,
  getVersion,
  insertLine,
  linesOf,
  noteEditor,
  updateDraft,
  updateLine,
} from './rows';
import { NewLine, RemoveLine, SaveLine, type VersionView } from './schemas';
import { viewOf } from './views';

/** Adds a line to a draft. A place may hold several parts: former and wire make one coil. */
export async function addLine(actor: Actor, input: NewLine): Promise<VersionView> {
  must(actor, 'version.edit');
  const asked = parse(NewLine, input);
  return write(actor, async (tx) => {
    const version = await getDraft(tx.sql, asked.versionId);
    const lines = await linesOf(tx.sql, version.id);
    refuseTaken(lines, asked.reference, null);
    await refuseMisplaced(tx, asked);
    const position = 1 + Math.max(0, ...lines.map((line) => line.position));
    const line: StoredLine = { ...asked, id: LineId.parse(newId()), position, saveNo: 1 };
    await insertLine(tx.sql, line);
    return changed(tx, version, 'line.added', { line: line.id, after: line });
  });
}

/** Saves a line; a save by somebody else since `basedOn` is a conflict that carries the version as it is now. */
export async function saveLine(actor: Actor, input: SaveLine): Promise<VersionView> {
  must(actor, 'version.edit');
  const { lineId, basedOn, ...asked } = parse(SaveLine, input);
  return write(actor, async (tx) => {
    const before = await getLine(tx.sql, lineId);
    const version = await getDraft(tx.sql, before.versionId);
    refuseTaken(await linesOf(tx.sql, version.id), asked.reference, lineId);
    await refuseMisplaced(tx, asked);
    const line: StoredLine = {
      ...asked,
      id: lineId,
      versionId: version.id,
      position: before.position,
      saveNo: basedOn + 1,
    };
    if (!(await updateLine(tx.sql, line, basedOn))) {
      throw conflict(`Somebody changed line ${before.reference} meanwhile. Read what changed, then save again.`, {
        version: await viewOf(tx.sql, tx.actor, version),
      });
    }
    const { part: _part, cost: _cost, retired: _retired, ...stored } = before;
    return changed(tx, version, 'line.saved', { line: lineId, before: stored, after: line });
  });
}

export async function removeLine(actor: Actor, input: RemoveLine): Promise<VersionView> {
  must(actor, 'version.edit');
  const { lineId } = parse(RemoveLine, input);
  return write(actor, async (tx) => {
    const { part: _part, cost: _cost, retired: _retired, ...before } = await getLine(tx.sql, lineId);
    const version = await getDraft(tx.sql, before.versionId);
    await deleteLine(tx.sql, lineId);
    return changed(tx, version, 'line.removed', { line: lineId, before });
  });
}

async function changed(
  tx: Tx,
  version: Version,
  action: string,
  change: { line: LineId; before?: StoredLine; after?: StoredLine },
): Promise<VersionView> {
  // The write lock is held since the version was read, so nobody can have come between.
  if (!(await updateDraft(tx, version.id, version.saveNo))) throw refused('The version was sent to check meanwhile.');
  await noteEditor(tx, version.id);
  await record(tx, action, {
    subject: { kind: 'version', id: version.id },
    ...(change.before && { before: change.before }),
    ...(change.after && { after: change.after }),
  });
  return viewOf(tx.sql, tx.actor, await getVersion(tx.sql, version.id));
}

function refuseTaken(lines: readonly { id: LineId; reference: string }[], reference: string, own: LineId | null): void {
  if (lines.some((line) => line.reference === reference && line.id !== own)) {
    throw invalid(`${reference} is taken.`, { reference: `${reference} names another line. Take the next number.` });
  }
}

async function refuseMisplaced(tx: Tx, { partId, place }: Pick<StoredLine, 'partId' | 'place'>): Promise<void> {
  if (partId === null) return;
  const sentence = placeRefusal(await getPartOfLine(tx.sql, partId), place);
  if (sentence !== null) throw invalid(sentence, { partId: sentence });
}
