import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { evaluate, InvalidInput, seek, type SeekAsk, type SeekCursor, type Seeker } from '@/services/receiver';
import { billOf, designFrom, settled } from '@/services/receiver/seek/ask';
import { listed, type Candidate } from '@/services/receiver/seek/ranking';
import { everyChoice, fieldOf } from '@/services/receiver/seek/windings';
import { anAsk, STOCK } from './stock-lists';

function finished(seeker: Seeker): Seeker {
  while (!seeker.step().done);
  return seeker;
}

/** What clears by working every combination out, with nothing of the search but the names of what is combined. */
function clearing(asked: SeekAsk): Candidate[] {
  const ask = settled(asked);
  const clears: Candidate[] = [];
  for (const choice of everyChoice(ask, fieldOf(ask))) {
    const bill = billOf(ask, choice);
    if (bill.cost > (ask.mostCost ?? Infinity) || (ask.inStoreOnly === true && bill.builds < 1)) continue;
    const verdict = evaluate(designFrom(ask, choice), { seed: ask.seed, boxes: ask.boxes });
    const margin = Math.min(verdict.margins.lo, verdict.margins.hi);
    if (verdict.outcome === 'clears') clears.push({ choice, ...bill, margin, exact: true });
  }
  return clears;
}

const inFull = (ask: SeekAsk): Candidate[] => listed(settled(ask), clearing(ask));

const some = <T>(list: readonly T[], least = 1, most = 2) =>
  fc.shuffledSubarray([...list], { minLength: least, maxLength: most });

/** A few parts each and a few turns, so that every combination can be worked out. */
const smallAsk: fc.Arbitrary<SeekAsk> = fc
  .record({
    formers: some(STOCK.formers, 1, 1),
    wires: some(STOCK.wires),
    capacitors: some(STOCK.capacitors),
    couplings: some(STOCK.couplings, 1, 1),
    detectors: some(STOCK.detectors),
    earphones: some(STOCK.earphones),
    returns: some(STOCK.returns, 1, 1),
    least: fc.integer({ min: 40, max: 110 }),
    form: fc.constantFrom('direct' as const, 'series-c' as const, 'aerial-tap' as const),
    detectorAt: fc.constantFrom(['top'] as const, ['tap'] as const, ['top', 'tap'] as const),
    rank: fc.constantFrom('cost' as const, 'margin' as const, 'stock' as const),
    inStoreOnly: fc.boolean(),
    most: fc.integer({ min: 1, max: 6 }),
    windingsEach: fc.integer({ min: 1, max: 3 }),
  })
  .map(({ least, form, detectorAt, rank, inStoreOnly, most, windingsEach, ...lists }) =>
    anAsk({
      lists,
      couplings: [form],
      detectorAt,
      tapPlaces: 3,
      turns: { least, most: least + 2 },
      rank,
      inStoreOnly,
      most,
      windingsEach,
      boxes: 400,
    }),
  );

/** Lists in which much clears: the bounds and the ranks then decide, not the rules. */
const rich = anAsk({
  lists: {
    ...STOCK,
    formers: STOCK.formers.slice(0, 1),
    wires: STOCK.wires.slice(0, 1),
    capacitors: STOCK.capacitors.filter(({ code }) => code !== 'C-365'),
    couplings: STOCK.couplings.slice(0, 1),
    detectors: STOCK.detectors.slice(0, 2),
    earphones: STOCK.earphones.slice(0, 2),
    returns: STOCK.returns.slice(0, 1),
  },
  couplings: ['series-c', 'aerial-tap'],
  tapPlaces: 4,
  turns: { least: 70, most: 74 },
  boxes: 400,
});

const plain = (list: readonly Candidate[]) =>
  list.map(({ choice, cost, builds, margin }) => ({ choice, cost, builds, margin }));

describe('seek', () => {
  test('lists what working every combination out lists, whatever the parts, circuit and rank', () => {
    fc.assert(
      fc.property(smallAsk, (ask) => {
        expect(plain(finished(seek(ask)).results())).toEqual(plain(inFull(ask)));
      }),
      { numRuns: 12 },
    );
  });

  test('lists the same where much clears, by each rank and with several windings of the same parts', () => {
    const clears = clearing(rich);
    expect(clears.length).toBeGreaterThan(30);
    for (const rank of ['cost', 'margin', 'stock'] as const) {
      for (const windingsEach of [1, 4]) {
        const ask: SeekAsk = { ...rich, rank, most: 6, windingsEach };
        expect(plain(finished(seek(ask)).results())).toEqual(plain(listed(settled(ask), clears)));
      }
    }
  });

  test('lists designs that clear every rule, the best first, each as a design file', () => {
    const seeker = finished(seek(anAsk({ most: 8 })));
    const results = seeker.results();
    expect(results).toHaveLength(8);
    for (const { design } of results) expect(evaluate(design).outcome).toBe('clears');
    expect(results.map(({ cost }) => cost)).toEqual(results.map(({ cost }) => cost).sort((a, b) => a - b));
    const { byBound, inFull: judged, waiting, total } = seeker.progress().combinations;
    expect([byBound + judged, waiting]).toEqual([total, 0]);
    expect(judged).toBeLessThan(total / 1000);
  });

  test('keeps to the parts in store, the cost and the former asked for', () => {
    const results = finished(seek(anAsk({ inStoreOnly: true, mostCost: 1000, former: 'F-50', most: 30 }))).results();
    expect(results.length).toBeGreaterThan(0);
    for (const { choice, cost, builds } of results) {
      expect(choice[0]).toBe(0);
      expect(cost).toBeLessThanOrEqual(1000);
      expect(builds).toBeGreaterThanOrEqual(1);
    }
  });

  test('stopped at any step and taken up from its stored cursor it ends with the same list', () => {
    const whole = plain(finished(seek(rich)).results());
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 1, max: 9 }), { minLength: 1, maxLength: 6 }), (pauses) => {
        let seeker = seek(rich);
        for (const pause of pauses) {
          for (let i = 0; i < pause; i += 1) seeker.step();
          const stored: SeekCursor = JSON.parse(JSON.stringify(seeker.cursor()));
          seeker = seek(rich, stored);
        }
        expect(plain(finished(seeker).results())).toEqual(whole);
      }),
      { numRuns: 12 },
    );
  });

  test('tells how far it is, never back', () => {
    const seeker = seek(rich);
    let before = seeker.progress();
    while (!before.done) {
      const now = seeker.step();
      expect(now.windings.done).toBeGreaterThanOrEqual(before.windings.done);
      expect(now.windings.total).toBe(before.windings.total);
      before = now;
    }
    expect(before.windings.done).toBe(before.windings.total);
  });

  test('finds nothing where a list is empty, and says so at once', () => {
    const seeker = seek(anAsk({ lists: { ...STOCK, earphones: [] } }));
    expect(seeker.progress()).toMatchObject({ done: true, combinations: { total: 0 } });
    expect(seeker.results()).toEqual([]);
  });

  test('names the list and the part that cannot be', () => {
    const [first] = STOCK.capacitors;
    const wrong = {
      code: 'C-0',
      cost: 1,
      stock: 1,
      values: { kind: 'capacitor', min: 5e-10, max: 1e-10, law: 'capacitance' },
    } as const;
    const lists = { ...STOCK, capacitors: first === undefined ? [] : [first, wrong] };
    let issues: unknown = null;
    try {
      seek(anAsk({ lists }));
    } catch (error) {
      issues = error instanceof InvalidInput ? error.issues : error;
    }
    expect(issues).toEqual([
      { path: 'capacitors.C-0.tuning.max', message: 'Give a largest capacitance above the smallest.' },
    ]);
  });

  test('refuses a cursor of another search', () => {
    const cursor = seek(rich).cursor();
    expect(() => seek(anAsk(), cursor)).toThrow('begin a new one');
  });
});
