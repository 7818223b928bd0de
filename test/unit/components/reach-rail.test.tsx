import fc from 'fast-check';
import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { ReachRail } from '@/components/charts/reach-rail';
import { ReachTable } from '@/components/charts/reach-table';
import { axisFor, frequencyAt, pinFit, place, shortfall, type ReachView } from '@/templates/drawings/reach-axis';
import { contourPath, stationRows } from '@/templates/drawings/reach-layout';
import { reachRailDrawing } from '@/templates/drawings/reach-rail-drawing';
import { reachSentence } from '@/templates/drawings/reach-sentence';

const khz = (lo: number, hi: number) => ({ lo: lo * 1000, hi: hi * 1000 });

const short: ReachView = {
  band: khz(531, 1602),
  nominal: khz(525, 1781),
  worst: khz(547, 1673),
  stations: [
    { name: 'Inside', f: 747_000 },
    { name: 'Between', f: 540_000 },
    { name: 'Outside', f: 500_000 },
  ],
};

describe('the sentence of a rail', () => {
  it('says band, nominal, worst case and what is missing', () => {
    expect(reachSentence(short)).toBe(
      'Band 531 to 1602 kHz. Nominal 525 to 1781, worst case 547 to 1673. Short by 16 kHz at the low end, at worst case.',
    );
  });

  it('names both ends where both are short', () => {
    expect(reachSentence({ ...short, worst: khz(547, 1500) })).toContain(
      'Short by 16 kHz at the low end and 102 kHz at the high end, at worst case.',
    );
  });

  it('says that a wide reach covers the band', () => {
    expect(reachSentence({ ...short, worst: khz(513, 1654) })).toContain('Covers the band at worst case.');
  });

  it('says so when the set tunes nothing or the corners are not worked out', () => {
    expect(reachSentence({ ...short, nominal: null, worst: null })).toContain('tunes nothing');
    expect(reachSentence({ ...short, worst: null })).toContain('Worst case is not worked out yet');
  });

  it('does not round a small shortfall to nothing', () => {
    expect(reachSentence({ ...short, worst: { lo: 531_200, hi: 1_700_000 } })).toContain('Short by under 1 kHz');
  });
});

describe('the pins of a rail', () => {
  it('are full inside the worst case, half inside nominal only, hollow outside', () => {
    expect((short.stations ?? []).map((station) => pinFit(short, station.f))).toEqual(['worst', 'nominal', 'outside']);
  });

  it('are drawn as they fit', () => {
    const markup = renderToStaticMarkup(<ReachRail {...short} />);
    expect([...markup.matchAll(/data-fit="([a-z]+)"/g)].map((match) => match[1])).toEqual([
      'worst',
      'nominal',
      'outside',
    ]);
  });

  it('leave out stations beyond the ends of the axis', () => {
    const markup = renderToStaticMarkup(<ReachRail {...short} stations={[{ name: 'Far', f: 200_000 }]} />);
    expect(markup).not.toContain('data-fit');
  });
});

describe('the axis of a rail', () => {
  it('has the same ends for every kit of a waveband', () => {
    expect(axisFor(khz(531, 1602))).toMatchObject(khz(480, 1800));
    expect(axisFor(khz(900, 1602))).toMatchObject(khz(480, 1800));
    expect(axisFor(khz(148.5, 283.5))).toMatchObject(khz(120, 330));
  });

  it('takes its ends from the band on short wave, with room at both', () => {
    const axis = axisFor(khz(5900, 6200));
    expect(axis.lo).toBeLessThan(5_900_000);
    expect(axis.hi).toBeGreaterThan(6_200_000);
    expect(axis.ticks.length).toBeGreaterThanOrEqual(3);
  });

  it('rises with frequency, stays on the rail, and can be read back', () => {
    const axis = axisFor(khz(531, 1602));
    fc.assert(
      fc.property(fc.double({ min: 480_000, max: 1_800_000, noNaN: true }), (f) => {
        const at = place(axis, f);
        expect(at).toBeGreaterThan(0);
        expect(at).toBeLessThan(1);
        expect(frequencyAt(axis, at)).toBeCloseTo(f, 3);
        expect(place(axis, f * 1.01)).toBeGreaterThanOrEqual(at);
      }),
    );
  });

  it('gives every tick of any band a place of its own', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e5, max: 2.5e7, noNaN: true }),
        fc.double({ min: 1.002, max: 12, noNaN: true }),
        (lo, ratio) => {
          const axis = axisFor({ lo, hi: lo * ratio });
          const places = axis.ticks.map((f) => place(axis, f));
          expect(places.length).toBeGreaterThan(1);
          expect(places.every((at, index) => index === 0 || at > (places[index - 1] ?? 1))).toBe(true);
        },
      ),
    );
  });
});

describe('a shortfall', () => {
  it('is never negative and never wider than the band', () => {
    const edge = fc.double({ min: 3e5, max: 3e6, noNaN: true });
    fc.assert(
      fc.property(edge, edge, (a, b) => {
        const { low, high } = shortfall({ ...short, worst: { lo: Math.min(a, b), hi: Math.max(a, b) } });
        expect(low).toBeGreaterThanOrEqual(0);
        expect(high).toBeGreaterThanOrEqual(0);
        expect(Math.max(low, high)).toBeLessThanOrEqual(1_071_000);
      }),
    );
  });

  it('is hatched on the screen and on paper, with its words', () => {
    const markup = renderToStaticMarkup(<ReachRail {...short} />);
    expect(markup).toContain('short by 16');
    expect(markup).toMatch(/fill="url\(#/);
    const paper = JSON.stringify(reachRailDrawing(short, 515));
    expect(paper).toContain('band 531, short by 16');
  });

  it('of nothing leaves no hatch', () => {
    const markup = renderToStaticMarkup(<ReachRail {...short} worst={khz(513, 1654)} />);
    expect(markup).not.toMatch(/fill="url\(#/);
    expect(markup).not.toContain('short by');
  });
});

describe('the chance over a rail', () => {
  it('runs in steps from the foot to full height', () => {
    const axis = axisFor(short.band);
    const contour = { f: [500_000, 550_000, 1_000_000], share: [0, 0.5, 1] };
    const paths = contourPath({ axis, contour, across: 1000, top: 0, foot: 28 });
    expect(paths?.line).toMatch(/^M[\d.]+ 28H[\d.]+V14H[\d.]+V0$/);
  });
});

describe('station names', () => {
  it('stand in two rows and leave out what would overlap', () => {
    const axis = axisFor(short.band);
    const crowd = Array.from({ length: 40 }, (_, index) => ({ name: 'Long station name', f: 600_000 + index * 5_000 }));
    const rows = stationRows(axis, crowd, 1100);
    expect(rows).toHaveLength(40);
    const shown = rows.filter((station) => station.row !== null);
    expect(shown.length).toBeGreaterThan(1);
    for (const row of [0, 1]) {
      const places = shown.filter((station) => station.row === row).map((station) => station.at * 1100);
      expect(places.every((at, index) => index === 0 || at - (places[index - 1] ?? 0) > 100)).toBe(true);
    }
  });
});

describe('the table beside a rail', () => {
  it('lists the same figures and each station in words', () => {
    const markup = renderToStaticMarkup(<ReachTable {...short} />);
    for (const words of ['547', '1673', 'short by 16 kHz', 'Between', 'inside at nominal only', 'out of reach']) {
      expect(markup).toContain(words);
    }
  });
});
