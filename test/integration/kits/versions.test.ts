import { beforeAll, describe, expect, it } from 'vitest';
import { VersionId, newId } from '@/services/ids';
import {
  addLine,
  createKit,
  listVersions,
  readVersion,
  removeLine,
  saveCircuit,
  saveGuide,
  saveLine,
  startVersion,
} from '@/services/kits';
import { changePart, readPart } from '@/services/parts';
import { testDatabase } from '../../builders/database';
import { problemOf } from '../../builders/problems';
import { aVersion, addSomeParts, partIdOf, someKit, someStaff } from '../../builders/versions';

const db = testDatabase();
type Staff = Awaited<ReturnType<typeof someStaff>>;
let isolde: Staff;
let piers: Staff;
let packer: Staff;

beforeAll(async () => {
  isolde = await someStaff(db.sql, 'Isolde Hark', ['designer']);
  piers = await someStaff(db.sql, 'Piers Lindow', ['designer', 'checker']);
  packer = await someStaff(db.sql, 'Bryn Orne', ['packer']);
  await addSomeParts(isolde);
});

describe('a kit', () => {
  it('begins with an empty draft A', async () => {
    const { versionId } = await createKit(isolde, someKit(1));
    const view = await readVersion(packer, versionId);
    expect(view).toMatchObject({ letter: 'A', state: 'draft', lines: [], contentHash: null });
    expect(view.editors.map((editor) => editor.name)).toEqual(['Isolde Hark']);
  });

  it('has a code and number of its own', async () => {
    const problem = await problemOf(createKit(isolde, { ...someKit(1), code: 'K1B' }));
    expect(problem.fields).toEqual({ number: 'No. 1 is another kit. Choose another number.' });
  });

  it('is refused a band that no capacitor can tune', async () => {
    const band = { ...someKit(2).band, lo: 150_000, firstCarrier: 153_000, hi: 2_000_000, lastCarrier: 1_999_000 };
    expect((await problemOf(createKit(isolde, { ...someKit(2), band }))).fields).toHaveProperty('band.hi');
  });

  it('is made by designers only', async () => {
    expect((await problemOf(createKit(packer, someKit(3)))).kind).toBe('forbidden');
  });
});

describe('a draft', () => {
  it('shows its lines by place and reference, whatever order they were typed in', async () => {
    const { view } = await aVersion().saved(isolde);
    expect(view.content.lines.map((line) => line.reference).join(' ')).toBe('F1 L1 C1 C2 D1 E1 W1 G1 P1');
  });

  it('refuses a part that cannot do what the place asks', async () => {
    const { versionId } = await createKit(isolde, someKit(4));
    const partId = await partIdOf(isolde, 'D-GE');
    const line = { versionId, place: 'earphone' as const, partId, reference: 'E1', quantity: 1, note: '' };
    const problem = await problemOf(addLine(isolde, line));
    expect(problem.fields?.['partId']).toBe(
      'D-GE is a detector; it cannot be the earphone. Choose another place or part.',
    );
  });

  it('takes each reference once', async () => {
    const { view } = await aVersion().saved(isolde);
    const line = {
      versionId: view.id,
      place: 'hardware' as const,
      partId: null,
      reference: 'c1',
      quantity: 1,
      note: '',
    };
    expect((await problemOf(addLine(isolde, line))).fields).toHaveProperty('reference');
  });

  it('keeps what another person saved when two edit the same line, and hands both values on', async () => {
    const { view } = await aVersion().saved(isolde);
    const wire = view.lines.find((line) => line.reference === 'L1');
    if (!wire) throw new Error('no wire');
    const { id, saveNo, position: _p, part: _a, costMinor: _c, retired: _r, ...asked } = wire;
    await saveLine(piers, { ...asked, lineId: id, basedOn: saveNo, quantity: 14_000 });
    const problem = await problemOf(saveLine(isolde, { ...asked, lineId: id, basedOn: saveNo, quantity: 15_000 }));
    expect(problem.kind).toBe('conflict');
    expect(JSON.stringify(problem.current)).toContain('14000');
    expect((await readVersion(isolde, view.id)).lines.find((line) => line.reference === 'L1')?.quantity).toBe(14_000);
  });

  it('does the same for circuit and guide', async () => {
    const { view } = await aVersion().saved(isolde);
    const circuit = { ...view.content.circuit, coupling: 'direct' as const };
    await saveCircuit(piers, { versionId: view.id, circuit, basedOn: view.saveNo });
    const guide = { ...view.content.guide, intro: 'Another introduction.' };
    const problem = await problemOf(saveGuide(isolde, { versionId: view.id, guide, basedOn: view.saveNo }));
    expect(problem.kind).toBe('conflict');
    expect((await readVersion(isolde, view.id)).content.circuit.coupling).toBe('direct');
  });

  it('names every person who edited it', async () => {
    const { view } = await aVersion().saved(isolde);
    const [line] = view.lines;
    if (!line) throw new Error('no line');
    await removeLine(piers, { lineId: line.id });
    const after = await readVersion(isolde, view.id);
    expect(after.editors.map((editor) => editor.name).sort()).toEqual(['Isolde Hark', 'Piers Lindow']);
    expect(after.lines).toHaveLength(view.lines.length - 1);
  });

  it('follows a part whose value is changed', async () => {
    const { view } = await aVersion().saved(isolde);
    const part = await readPart(isolde, await partIdOf(isolde, 'G-5'));
    const changed = { partId: part.id, basedOn: part.saveNo, name: part.name, massMilligrams: part.massMilligrams };
    await changePart(isolde, { ...changed, cost: part.cost, note: '', values: { kind: 'earth-lead', length: 7 } });
    const after = await readVersion(isolde, view.id);
    expect(after.content.lines.find((line) => line.reference === 'G1')?.part?.values).toEqual({
      kind: 'earth-lead',
      length: 7,
    });
  });

  it('costs each line by its pieces or its metres', async () => {
    const { view } = await aVersion().saved(isolde);
    // 13.5 m at 18 pence a metre
    expect(view.lines.find((line) => line.reference === 'L1')?.costMinor).toBe(243);
    expect(view.lines.find((line) => line.reference === 'C1')?.costMinor).toBe(940);
  });
});

describe('the next version', () => {
  it('starts from an earlier one with its lines, circuit and guide, under the next letter', async () => {
    const { view, kitId } = await aVersion().withTurns(71).saved(isolde);
    const { versionId } = await startVersion(piers, { kitId, fromVersionId: view.id });
    const next = await readVersion(piers, versionId);
    expect(next.letter).toBe('B');
    expect({ ...next.content, letter: 'A' }).toEqual(view.content);
    expect(next.siblings.map((one) => one.letter)).toEqual(['A', 'B']);
  });

  it('is still the work of those who drew the first', async () => {
    const { view, kitId } = await aVersion().saved(isolde);
    const { versionId } = await startVersion(piers, { kitId, fromVersionId: view.id });
    const next = await readVersion(piers, versionId);
    expect(next.editors.map((editor) => editor.name).sort()).toEqual(['Isolde Hark', 'Piers Lindow']);
  });

  it('cannot start from another kit', async () => {
    const one = await aVersion().saved(isolde);
    const other = await aVersion().saved(isolde);
    const problem = await problemOf(startVersion(isolde, { kitId: one.kitId, fromVersionId: other.versionId }));
    expect(problem.kind).toBe('refused');
  });
});

describe('the bench', () => {
  it('lists each version with the reach of its verdict, or what it still lacks', async () => {
    const good = await aVersion().saved(isolde);
    const empty = await createKit(isolde, someKit(9));
    const kits = await listVersions(packer);
    const reach = kits.find((kit) => kit.kitId === good.kitId)?.versions[0]?.summary?.reach;
    expect(reach?.nominal.lo).toBeLessThan(526_500);
    expect(reach?.nominal.hi).toBeGreaterThan(1_606_500);
    expect(kits.find((kit) => kit.kitId === empty.kitId)?.versions[0]?.lacks).toContain('Choose a detector.');
  });

  it('knows nothing of a version that is not there', async () => {
    expect((await problemOf(readVersion(isolde, VersionId.parse(newId())))).kind).toBe('missing');
    expect((await problemOf(readVersion(isolde, 'anything'))).kind).toBe('missing');
  });
});
