import { beforeAll, describe, expect, it } from 'vitest';
import { visitor } from '@/services/access';
import { addPart, changePart, listParts, readPart, retirePart } from '@/services/parts';
import { testDatabase } from '../../builders/database';
import { problemOf } from '../../builders/problems';
import { addSomeParts, partIdOf, someParts, someStaff } from '../../builders/versions';

const db = testDatabase();
let designer: Awaited<ReturnType<typeof someStaff>>;
let packer: Awaited<ReturnType<typeof someStaff>>;

beforeAll(async () => {
  designer = await someStaff(db.sql, 'Isolde Hark', ['designer']);
  packer = await someStaff(db.sql, 'Bryn Orne', ['packer']);
  await addSomeParts(designer);
});

describe('the catalogue of parts', () => {
  it('finds a part by a piece of its name or code, whatever the case', async () => {
    const { parts } = await listParts(packer, { q: 'germanium' });
    expect(parts.map((part) => part.code)).toEqual(['D-GE']);
    expect((await listParts(packer, { q: 'c-2' })).parts.map((part) => part.code)).toContain('C-220');
  });

  it('lists only what may stand in a place', async () => {
    const { parts } = await listParts(packer, { place: 'tuning coil' });
    expect(parts.map((part) => part.code)).toEqual(['F-50', 'W-500']);
  });

  it('takes wildcards as plain signs', async () => {
    expect((await listParts(packer, { q: '%' })).parts).toEqual([]);
  });

  it('goes through a long list page by page, each part once and in the order of codes', async () => {
    const [first] = someParts;
    if (!first) throw new Error('no parts');
    for (let n = 0; n < 120; n++) {
      await addPart(designer, { ...first, code: `Z-${String(n).padStart(3, '0')}`, name: `Tube number ${n}` });
    }
    const seen: string[] = [];
    let after: string | null = null;
    do {
      const page: Awaited<ReturnType<typeof listParts>> = await listParts(packer, {
        ...(after !== null && { after }),
        q: 'tube',
      });
      seen.push(...page.parts.map((part) => part.code));
      after = page.next;
    } while (after !== null);
    expect(seen).toEqual([...new Set(seen)].sort());
    expect(seen.filter((code) => code.startsWith('Z-'))).toHaveLength(120);
  });

  it('is closed to visitors and read-only for packers', async () => {
    expect((await problemOf(listParts(visitor))).kind).toBe('forbidden');
    const [first] = someParts;
    if (!first) throw new Error('no parts');
    expect((await problemOf(addPart(packer, { ...first, code: 'X-1' }))).kind).toBe('forbidden');
  });

  it('refuses a code that is in use, at its field', async () => {
    const [first] = someParts;
    if (!first) throw new Error('no parts');
    expect((await problemOf(addPart(designer, first))).fields).toHaveProperty('code');
  });

  it('names the field of an absurd value', async () => {
    const problem = await problemOf(
      addPart(designer, {
        code: 'W-26',
        name: 'Wire by its gauge number',
        massMilligrams: 100,
        cost: { minor: 10, currency: 'GBP' },
        note: '',
        values: { kind: 'wire', bare: 0.026, overall: 0.03, covering: 'enamel' },
      }),
    );
    expect(problem.kind).toBe('invalid');
    expect(Object.keys(problem.fields ?? {}).join()).toContain('bare');
  });

  it('keeps both values when two people save the same part', async () => {
    const part = await readPart(designer, await partIdOf(designer, 'CC-12'));
    const change = {
      partId: part.id,
      basedOn: part.saveNo,
      massMilligrams: 900,
      cost: part.cost,
      note: '',
      values: part.values,
    };
    await changePart(designer, { ...change, name: 'Mica capacitor, 12 pF, silvered' });
    const problem = await problemOf(changePart(designer, { ...change, name: 'Mica, 12 pF' }));
    expect(problem.kind).toBe('conflict');
    expect(problem.current).toMatchObject({ name: 'Mica capacitor, 12 pF, silvered', saveNo: part.saveNo + 1 });
  });

  it('records who changed a value, from what and to what', async () => {
    const id = await partIdOf(designer, 'CC-12');
    const rows = await db.sql('changes').where({ subject_id: id }).orderBy('seq');
    expect(rows.map((row: { action: string }) => row.action)).toEqual(['part.added', 'part.changed']);
    expect(rows[1]).toMatchObject({ actor_name: 'Isolde Hark' });
  });

  it('leaves a retired part out of the list, and takes it back', async () => {
    const part = await readPart(designer, await partIdOf(designer, 'E-32'));
    const retired = await retirePart(designer, { partId: part.id, basedOn: part.saveNo, retired: true });
    expect((await listParts(designer, { q: 'E-32' })).parts).toEqual([]);
    await retirePart(designer, { partId: part.id, basedOn: retired.saveNo, retired: false });
    expect((await listParts(designer, { q: 'E-32' })).parts).toHaveLength(1);
  });
});
