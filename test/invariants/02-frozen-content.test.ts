import { beforeAll, describe, expect, it } from 'vitest';
import { readSheet, release, sendToCheck } from '@/services/check';
import { addLine, frozenContent, removeLine, saveCircuit, saveGuide, saveLine } from '@/services/kits';
import { findingKey, notesIn } from '@/services/kits/rules';
import type { VersionView } from '@/services/kits/schemas';
import { newId } from '@/services/ids';
import { canonicalJson, sha256 } from '@/services/record';
import { testDatabase } from '../builders/database';
import { problemOf } from '../builders/problems';
import { aVersion, addSomeParts, someStaff } from '../builders/versions';

// Invariant 2: a released version's content never changes, and its hash is worked out again wherever it counts.
const db = testDatabase();
type Staff = Awaited<ReturnType<typeof someStaff>>;
let isolde: Staff;
let walter: Staff;
let released: VersionView;

beforeAll(async () => {
  isolde = await someStaff(db.sql, 'Isolde Hark', ['designer']);
  walter = await someStaff(db.sql, 'Walter Tarrow', ['checker']);
  await addSomeParts(isolde);
  released = await release1();
});

async function release1(): Promise<VersionView> {
  const { view } = await aVersion().saved(isolde);
  await sendToCheck(isolde, { versionId: view.id, basedOn: view.saveNo });
  const sheet = await readSheet(walter, view.id);
  const reasons = Object.fromEntries(notesIn(sheet.findings).map((note) => [findingKey(note), 'Right for this kit.']));
  return release(walter, { versionId: view.id, contentHash: sheet.contentHash, reasons });
}

describe('a released version', () => {
  it('has the hash of its canonical text', () => {
    expect(sha256(canonicalJson(released.content))).toBe(released.contentHash);
  });

  it('is not changed by any deed', async () => {
    const [line] = released.lines;
    if (!line) throw new Error('no line');
    const { place, partId, quantity, note, id, saveNo } = line;
    const basedOn = released.saveNo;
    const deeds = [
      saveCircuit(isolde, {
        versionId: released.id,
        circuit: { ...released.content.circuit, coupling: 'direct' },
        basedOn,
      }),
      saveGuide(isolde, {
        versionId: released.id,
        guide: { ...released.content.guide, intro: 'Other words.' },
        basedOn,
      }),
      addLine(isolde, { versionId: released.id, place, partId, reference: 'X9', quantity, note }),
      saveLine(isolde, { lineId: id, place, partId, reference: 'X9', quantity: 3, note, basedOn: saveNo }),
      removeLine(isolde, { lineId: id }),
    ];
    for (const deed of deeds) expect((await problemOf(deed)).kind).toBe('refused');
    expect((await frozenContent(db.sql, released.id)).content).toEqual(released.content);
  });

  it.each([
    ['content', '{}'],
    ['content_hash', 'a'.repeat(64)],
    ['circuit', '{}'],
    ['guide', '{}'],
    ['letter', 'C'],
    ['verdict', '{}'],
    ['sent_at', 1],
    ['state', 'draft'],
    ['state', 'in-check'],
    ['state', 'held'],
  ])('keeps its %s against SQL from our own connection', async (column, value) => {
    await expect(
      db
        .sql('versions')
        .where({ id: released.id })
        .update({ [column]: value }),
    ).rejects.toThrow();
  });

  it('keeps its lines and its signature against SQL too', async () => {
    const lines = db.sql('lines').where({ version_id: released.id });
    await expect(lines.clone().update({ quantity: 2 })).rejects.toThrow('keeps its lines');
    await expect(lines.clone().delete()).rejects.toThrow('keeps its lines');
    const signOffs = db.sql('sign_offs').where({ version_id: released.id });
    await expect(signOffs.clone().update({ content_hash: 'b'.repeat(64) })).rejects.toThrow('append-only');
    await expect(signOffs.clone().delete()).rejects.toThrow('append-only');
    await expect(db.sql('versions').where({ id: released.id }).delete()).rejects.toThrow();
  });

  it('is not written by SQL beside the check room', async () => {
    const row = await db.sql('versions').where({ id: released.id }).first();
    const forged = { ...row, id: newId(), letter: 'Z' };
    await expect(db.sql('versions').insert(forged)).rejects.toThrow('begins as a draft');
  });

  it('is neither sold nor printed when its text was changed behind the triggers', async () => {
    const other = await release1();
    await db.sql.raw('drop trigger versions_frozen');
    const text = canonicalJson(other.content).replace('"turns":72', '"turns":73');
    await db.sql('versions').where({ id: other.id }).update({ content: text });
    const problem = await problemOf(frozenContent(db.sql, other.id));
    expect(problem.kind).toBe('refused');
    expect(problem.message).toContain('no longer matches its hash');
  });
});
