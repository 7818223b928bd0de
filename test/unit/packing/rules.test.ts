import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { VersionContent } from '@/services/kits/schemas';
import { amountText, barOf, closeBlockers, countPieces, mayMove, suggest } from '@/services/packing/rules';
import { expectedMass, massLimits, weighing } from '@/services/packing/mass';
import type { LotPlace } from '@/services/packing/schemas';
import { BinId, LotId, newId } from '@/services/ids';
import cases from '../../reference/kit-trade.checks.json';

type Line = VersionContent['lines'][number];

const line = (name: string, massMilligrams: number, quantity = 1, unit: 'each' | 'metre' = 'each'): Line => ({
  reference: 'X1',
  place: 'hardware',
  quantity,
  note: '',
  part: { code: 'X', name, unit, massMilligrams, values: { kind: 'hardware' } },
});
const content = {
  lines: [line('Card tube', 31_000), line('Brass terminal', 4200, 4), line('Enamelled wire', 1160, 18_000, 'metre')],
};

describe('the mass of a box', () => {
  it('counts wire by its length and adds a guide where no line is a print', () => {
    expect(expectedMass(content)).toBe(31_000 + 16_800 + 20_880 + 30_000);
  });

  it('may be off by two per cent, or by two grams where that is more', () => {
    expect(massLimits(50_000)).toEqual({ low: 48_000, high: 52_000 });
    expect(massLimits(900_000)).toEqual({ low: 882_000, high: 918_000 });
  });

  it('says how much is missing, which part weighs that, and asks for another weighing', () => {
    const view = weighing(98_680, 98_680 - 4200, content);
    expect(view.fits).toBe(false);
    expect(view.sentence).toBe(
      '4.2 g is missing. That is about one brass terminal. Look into the box, then weigh it again; it should read 96.7 to 100.7 g.',
    );
    expect(weighing(98_680, 130_000, content).sentence).toContain('31.3 g is too much. That is about one card tube.');
    expect(weighing(98_680, null, content).fits).toBe(false);
    expect(weighing(98_680, 98_100, content).fits).toBe(true);
  });

  it('always finds a missing part that weighs more than the tolerance', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 10_000, max: 2_000_000 }),
        fc.integer({ min: 1, max: 100_000 }),
        (expected, extra) => {
          const { low } = massLimits(expected);
          expect(weighing(expected, Math.max(1, low - extra), content).fits).toBe(false);
        },
      ),
    );
  });
});

describe('where to fetch from', () => {
  const lot = (lotCode: string, onHand: number): LotPlace => ({
    lotId: LotId.parse(newId()),
    lotCode,
    binId: BinId.parse(newId()),
    binCode: 'C-14',
    binPosition: 1,
    onHand,
  });

  it('a cut length comes from one reel that is long enough', () => {
    const lots = [lot('SHORT', 9000), lot('LONG', 40_000)];
    const wire = { unit: 'metre', needed: 18_000, packed: 0, toldEmptyBinId: null } as const;
    expect(suggest(lots, wire)?.lotCode).toBe('LONG');
    expect(suggest([lot('A', 9000), lot('B', 9000)], wire)).toBeNull();
  });

  it('passes by a bin that was found empty', () => {
    const [first, second] = [lot('FIRST', 5), lot('SECOND', 5)];
    const told = { unit: 'each', needed: 2, packed: 0, toldEmptyBinId: first.binId } as const;
    expect(suggest([first, second], told)).toBe(second);
  });
});

describe('closing a box', () => {
  const ready = {
    state: 'packing',
    bar: '',
    lines: [{ unit: 'each', needed: 2, packed: 2, name: 'Germanium detector', reference: 'D1' }],
    blockedLots: [],
    slipPrintedAt: 1,
    guidePrintedAt: 1,
    guideScannedAt: 1,
    mass: { weighed: 100, fits: true, sentence: '' },
  } as const;

  it('has no reason against it when all is in, printed, scanned and weighed', () => {
    expect(closeBlockers(ready)).toEqual([]);
  });

  it('names every reason at once', () => {
    const reasons = closeBlockers({
      ...ready,
      lines: [{ unit: 'each', needed: 2, packed: 1, name: 'Germanium detector', reference: 'D1' }],
      blockedLots: [{ lotCode: 'L-0007', name: 'Brass terminal' }],
      slipPrintedAt: null,
      guideScannedAt: null,
      mass: { weighed: null, fits: false, sentence: '' },
    });
    expect(reasons).toEqual([
      '1 piece to go: D1.',
      'Lot L-0007 (brass terminal) was blocked meanwhile. Put its pieces back and take another lot.',
      'The guide is not scanned. Scan the code on its cover.',
      'The packing slip is not printed.',
      'The box is not weighed.',
    ]);
  });

  it('is refused for a version that was withdrawn, and for an order that was paid back', () => {
    const box = {
      versionState: 'released',
      kitNumber: 4,
      letter: 'F',
      payment: 'paid',
      orderNumber: 'Y-4127',
    } as const;
    expect(barOf(box)).toBe('');
    expect(barOf({ ...box, versionState: 'withdrawn' })).toContain('4 F was withdrawn');
    expect(barOf({ ...box, versionState: 'held' })).toContain('not released');
    expect(barOf({ ...box, payment: 'refunded' })).toContain('Order Y-4127 is not paid any more');
  });
});

it('wire is one piece, whatever its length', () => {
  expect(
    countPieces([
      { unit: 'metre', needed: 18_000, packed: 0 },
      { unit: 'each', needed: 4, packed: 3 },
    ]),
  ).toEqual({
    packed: 3,
    needed: 5,
  });
  expect([
    amountText(14_200, 'metre'),
    amountText(350, 'metre'),
    amountText(2500, 'gram'),
    amountText(4, 'each'),
  ]).toEqual(['14.2 m', '350 mm', '2.5 g', '4']);
});

it('packing moves an order only as the trade does', () => {
  const states = ['placed', 'allocated', 'backordered', 'picking', 'packed', 'shipped', 'cancelled'] as const;
  const named: readonly string[] = states;
  const checked = cases.cases.filter(
    (one) => one.topic === 'order-transition' && 'from' in one.inputs && named.includes(String(one.inputs.from)),
  );
  const allowed = states.flatMap((from) => states.filter((to) => mayMove(from, to)).map((to) => `${from} ${to}`));
  expect(allowed).toEqual(['allocated picking', 'picking packed', 'packed picking', 'packed shipped']);
  for (const { inputs, expected } of checked) {
    if (!('from' in inputs) || !('to' in inputs) || expected === true) continue;
    expect(allowed).not.toContain(`${String(inputs.from)} ${String(inputs.to)}`);
  }
});
