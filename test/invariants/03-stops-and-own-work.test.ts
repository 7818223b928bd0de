import { beforeAll, describe, expect, it } from 'vitest';
import { hold, readSheet, release, sendToCheck } from '@/services/check';
import { readVersion, saveGuide, startVersion } from '@/services/kits';
import { findingKey, notesIn, stopsIn } from '@/services/kits/rules';
import { CautionCode } from '@/services/kits/schemas';
import { testDatabase } from '../builders/database';
import { problemOf } from '../builders/problems';
import { aVersion, addSomeParts, someStaff } from '../builders/versions';

// Invariant 3: a stop on the frozen content means not released, and nobody releases own work. No role changes that.
const db = testDatabase();
type Staff = Awaited<ReturnType<typeof someStaff>>;
let isolde: Staff;
let walter: Staff;
let everything: Staff;

beforeAll(async () => {
  isolde = await someStaff(db.sql, 'Isolde Hark', ['designer']);
  walter = await someStaff(db.sql, 'Walter Tarrow', ['checker']);
  everything = await someStaff(db.sql, 'Maud Orrin', ['owner', 'checker', 'designer', 'packer']);
  await addSomeParts(isolde);
});

const signed = async (versionId: string) => {
  const sheet = await readSheet(walter, versionId);
  const reasons = Object.fromEntries(
    notesIn(sheet.findings).map((note) => [findingKey(note), 'Looked at, and right for this kit.']),
  );
  return { sheet, asked: { versionId: sheet.versionId, contentHash: sheet.contentHash, reasons, remark: '' } };
};

const stopped = {
  'too few turns for the low end': { version: () => aVersion().withTurns(40), code: 'BAND-LOW' },
  'too many turns for the high end': {
    version: () => aVersion().withTurns(110).withQuantity('L1', 25_000),
    code: 'BAND-HIGH',
  },
  'a capacitor that covers half the band': { version: () => aVersion().withPart('C1', 'C-220'), code: 'BAND-LOW' },
  'an earphone of 32 ohm': { version: () => aVersion().withPart('E1', 'E-32'), code: 'PHONE-Z' },
  'wire cut too short': { version: () => aVersion().withQuantity('L1', 9_000), code: 'WIRE-SHORT' },
  'a guide without a caution': {
    version: () => {
      const { guide } = aVersion().plain();
      return aVersion().withGuide({ ...guide, cautions: CautionCode.options.filter((code) => code !== 'power-lines') });
    },
    code: 'GUIDE-MISS',
  },
  'a guide that leaves out a part': {
    version: () => {
      const { guide } = aVersion().plain();
      return aVersion().withGuide({ ...guide, steps: guide.steps.filter((step) => !step.uses.includes('D1')) });
    },
    code: 'GUIDE-MISS',
  },
};

describe('a version with a stop', () => {
  it.each(Object.entries(stopped))(
    'with %s is not released, by a checker or by the owner',
    async (_what, { version, code }) => {
      const { view } = await version().saved(isolde);
      await sendToCheck(isolde, { versionId: view.id, basedOn: view.saveNo });
      const { sheet, asked } = await signed(view.id);
      expect(stopsIn(sheet.findings).map((finding) => finding.code)).toContain(code);
      for (const checker of [walter, everything]) {
        const problem = await problemOf(release(checker, asked));
        expect(problem.kind).toBe('refused');
        expect(problem.message).toMatch(/stops? it/);
      }
      expect((await readVersion(walter, view.id)).state).toBe('in-check');
      expect(await db.sql('sign_offs').where({ version_id: view.id })).toEqual([]);
    },
  );

  it('is not released by SQL either, since nobody signed for it', async () => {
    const { view } = await aVersion().withTurns(40).saved(isolde);
    await sendToCheck(isolde, { versionId: view.id, basedOn: view.saveNo });
    await expect(db.sql('versions').where({ id: view.id }).update({ state: 'released' })).rejects.toThrow();
  });
});

describe('own work', () => {
  it('is not released by who drew it, whatever other roles that person has', async () => {
    const { view } = await aVersion().saved(everything);
    await sendToCheck(everything, { versionId: view.id, basedOn: view.saveNo });
    const { asked } = await signed(view.id);
    expect((await problemOf(release(everything, asked))).kind).toBe('forbidden');
    expect((await release(walter, asked)).state).toBe('released');
  });

  it('is not released by somebody who changed one word of it long ago', async () => {
    const { view } = await aVersion().saved(isolde);
    const guide = { ...view.content.guide, intro: 'Two evenings, and a flat screwdriver.' };
    const touched = await saveGuide(everything, { versionId: view.id, guide, basedOn: view.saveNo });
    const back = await saveGuide(isolde, { versionId: view.id, guide: view.content.guide, basedOn: touched.saveNo });
    await sendToCheck(isolde, { versionId: view.id, basedOn: back.saveNo });
    const { asked } = await signed(view.id);
    expect((await problemOf(release(everything, asked))).kind).toBe('forbidden');
  });

  it('is not judged by who sent it to check, even without having drawn a line of it', async () => {
    const { view } = await aVersion().saved(isolde);
    await sendToCheck(everything, { versionId: view.id, basedOn: view.saveNo });
    const { asked } = await signed(view.id);
    expect((await problemOf(release(everything, asked))).kind).toBe('forbidden');
    const remark = 'The low end is out of reach.';
    const held = hold(everything, { versionId: view.id, contentHash: asked.contentHash, remark });
    expect((await problemOf(held)).kind).toBe('forbidden');
  });

  it('stays own work in a version that somebody else starts from it', async () => {
    const { view, kitId } = await aVersion().saved(everything);
    const { versionId } = await startVersion(isolde, { kitId, fromVersionId: view.id });
    const next = await readVersion(isolde, versionId);
    await sendToCheck(isolde, { versionId, basedOn: next.saveNo });
    const { asked } = await signed(versionId);
    expect((await problemOf(release(everything, asked))).kind).toBe('forbidden');
  });

  it('is not released by people without the role of a checker', async () => {
    const { view } = await aVersion().saved(isolde);
    await sendToCheck(isolde, { versionId: view.id, basedOn: view.saveNo });
    const { asked } = await signed(view.id);
    const owner = await someStaff(db.sql, 'Another owner', ['owner', 'packer', 'designer']);
    for (const person of [isolde, owner]) expect((await problemOf(release(person, asked))).kind).toBe('forbidden');
  });
});
