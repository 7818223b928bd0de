import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { visitor } from '@/services/access';
import { evaluateDesign } from '@/services/kits';
import { Verdict } from '@/services/receiver';
import { problemOf } from '../../builders/problems';

const design: unknown = JSON.parse(readFileSync('test/reference/designs/clears-series.json', 'utf8'));

describe('a design sent by another program', () => {
  it('gets its verdict, whoever sends it', async () => {
    const verdict = await evaluateDesign(visitor, { design, query: {} });
    expect(Verdict.parse(verdict)).toMatchObject({ outcome: 'clears', seed: 1, boxes: 2000 });
  });

  it('gets the same verdict for the same seed', async () => {
    const query = { seed: '7', boxes: '1000' };
    const [one, two] = [
      await evaluateDesign(visitor, { design, query }),
      await evaluateDesign(visitor, { design, query }),
    ];
    expect(one).toEqual(two);
    expect(one.seed).toBe(7);
  });

  it('gets every issue by its path when it cannot be evaluated', async () => {
    const broken = { ...(design as object), band: { lo: 2, hi: 1 }, extra: true };
    const problem = await problemOf(evaluateDesign(visitor, { design: broken, query: {} }));
    expect(problem.kind).toBe('invalid');
    expect(Object.keys(problem.fields ?? {}).length).toBeGreaterThan(1);
  });

  it.each([{ boxes: '10' }, { boxes: '999999' }, { seed: '-1' }, { colour: 'blue' }])(
    'is asked again for %o',
    async (query) => {
      expect((await problemOf(evaluateDesign(visitor, { design, query }))).kind).toBe('invalid');
    },
  );
});
