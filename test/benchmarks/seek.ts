import { seek, type SeekAsk, type StockPart } from '@/services/receiver';
import { anAsk, STOCK } from '../unit/receiver/stock-lists';
import { cpuSeconds, heading, line, thousands } from './measure';

const several = <T>(
  list: readonly StockPart<T>[],
  count: number,
  change: (values: T, by: number) => T,
): StockPart<T>[] =>
  Array.from({ length: count }, (_, i) => {
    const part = list[i % list.length];
    if (part === undefined) throw new RangeError('An empty list has no parts.');
    const round = Math.floor(i / list.length);
    return {
      code: `${part.code}/${round}`,
      cost: part.cost + 7 * round,
      stock: part.stock,
      values: change(part.values, 1 + round * 0.07),
    };
  });

/** A store of some size: formers, wires and small parts multiplied out from the invented one. */
const wide = anAsk({
  lists: {
    ...STOCK,
    formers: several(STOCK.formers, 8, (tube, by) => ({ ...tube, diameter: Number(tube.diameter) * by })),
    wires: several(STOCK.wires, 6, (wire, by) => ({
      bare: Number(wire.bare) * by,
      overall: Number(wire.overall) * by,
    })),
    couplings: several(STOCK.couplings, 8, (c) => c),
    returns: several(STOCK.returns, 6, (r) => r),
  },
});

/** Most processor time given to one search. */
const LIMIT = 20;

export function seekBenchmarks(): void {
  heading('Seek, combinations decided a second of processor time (200 k are asked)');
  const asks: [what: string, ask: SeekAsk][] = [
    ['small store, by cost', anAsk()],
    ['small store, by margin', anAsk({ rank: 'margin' })],
    ['wide store, capacitors to the aerial, by cost', { ...wide, couplings: ['direct', 'series-c'] }],
    ['wide store, taps too, by cost', wide],
    ['wide store, taps too, parts in store', { ...wide, rank: 'stock', inStoreOnly: true }],
  ];
  for (const [what, ask] of asks) {
    let spent = 0;
    let seeker: ReturnType<typeof seek> | null = null;
    spent += cpuSeconds(() => (seeker = seek(ask)));
    const now = (): ReturnType<typeof seek> => seeker ?? seek(ask);
    while (!now().progress().done && spent < LIMIT) {
      spent += cpuSeconds(() => {
        for (let i = 0; i < 20; i += 1) now().step();
      });
    }
    const { byBound, inFull, total } = now().progress().combinations;
    const end = now().progress().done ? `all ${thousands(total)}` : `stopped after ${LIMIT} s of ${thousands(total)}`;
    line(
      what,
      thousands((byBound + inFull) / spent),
      `by bound ${thousands(byBound)}, in full ${inFull}, ${end}, ${spent.toFixed(1)} s`,
    );
  }
}
