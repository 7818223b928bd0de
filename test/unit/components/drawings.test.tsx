import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { SvgDrawing, type Scheme } from '@/templates/drawings/as-svg';
import { circuitDrawing, type CircuitView } from '@/templates/drawings/circuit-drawing';
import { cardDrawing, posterDrawing, stageDrawing, type KitLook } from '@/templates/drawings/kit-drawing';
import { isPartFamily, partDrawing, partFamilies } from '@/templates/drawings/part-drawing';
import { hatched } from '@/templates/drawings/reach-rail-drawing';
import type { Drawing, Shape } from '@/templates/drawings/shapes';
import { dialDrawing, foilTemplate, formerTemplate, pointsOf } from '@/templates/drawings/true-scale';
import { windingDrawing, windingSentence, type WindingView } from '@/templates/drawings/winding-drawing';

const tube: WindingView = {
  former: { form: 'tube', diameterMm: 63, lengthMm: 110, windingMm: 28 },
  turns: 63,
  taps: [
    { turn: 20, label: 'tap' },
    { turn: 40, label: 'tap' },
  ],
  startGoesTo: 'earth',
  endGoesTo: 'capacitor',
};

const circuit: CircuitView = {
  aerial: '18 m aerial',
  earth: 'good earth',
  coupling: { kind: 'series-c', label: { ref: 'C2', value: '47 pF' } },
  coil: { ref: 'L1', value: '235 μH' },
  tuning: { kind: 'capacitor', label: { ref: 'C1', value: '8 to 365 pF' } },
  padder: null,
  trimmer: null,
  detectorAt: 'top',
  detector: { ref: 'D1', value: 'germanium' },
  returnResistor: { ref: 'R1', value: '47 kΩ' },
  bypass: null,
  transformer: null,
  earphone: { ref: 'E1', value: '20 kΩ' },
};

const kits: KitLook[] = [
  { coil: { form: 'flat', spokes: 13, turns: 49 }, tuning: 'vanes', earphone: 'headset' },
  { coil: { form: 'tube', turns: 63, taps: [20] }, tuning: 'foil-plates', earphone: 'earpiece' },
  { coil: { form: 'rod' }, tuning: 'slider', earphone: 'earpiece' },
];

/** Everything drawn, groups opened. */
const flat = (shapes: readonly Shape[]): Exclude<Shape, { kind: 'group' }>[] =>
  shapes.flatMap((shape) => (shape.kind === 'group' ? flat(shape.shapes) : [shape]));
const textsOf = (drawing: Drawing) =>
  flat(drawing.shapes).flatMap((shape) => (shape.kind === 'text' ? [shape.text] : []));
const turnsOf = (drawing: Drawing) =>
  flat(drawing.shapes).filter(
    (shape) => shape.kind === 'path' && shape.stroke?.startsWith('copper') && / 0 0 1 /.test(shape.d),
  ).length;

const dial = dialDrawing({
  diameterMm: 90,
  shaftMm: 6,
  unit: 'kHz',
  marks: [0, 30, 60, 90, 120, 150, 180].map((angle, index) => ({
    angle,
    label: index % 2 === 0 ? String(500 + angle * 6) : null,
  })),
  stations: [
    { name: 'Vale', angle: 40 },
    { name: 'Cape', angle: 160 },
  ],
});

const everything: [string, Drawing][] = [
  ...partFamilies.filter(isPartFamily).map((family): [string, Drawing] => [family, partDrawing(family)]),
  ['winding', windingDrawing(tube)],
  ['circuit', circuitDrawing(circuit)],
  ['former', formerTemplate({ spokes: 13, diameterMm: 120, innerMm: 36, slotMm: 1.6 })],
  ['foil', foilTemplate({ widthMm: 120, heightMm: 80, tagMm: 12, plates: 2 })],
  ['dial', dial],
  ...kits.flatMap((kit, index): [string, Drawing][] => [
    [`poster ${index}`, posterDrawing(kit)],
    [`stage ${index}`, stageDrawing(kit, { callouts: true })],
    [`card ${index}`, cardDrawing(kit)],
  ]),
];

describe.each(everything)('the drawing of %s', (_, drawing) => {
  it('has no number that is not one', () => {
    // JSON writes a number that is none as null; a path carries it as a word.
    expect(/null|NaN|Infinity|undefined/.test(JSON.stringify(drawing.shapes))).toBe(false);
    expect(flat(drawing.shapes).length).toBeGreaterThan(1);
  });

  it('renders in every scheme without a style attribute', () => {
    for (const scheme of ['screen', 'plate', 'ink'] satisfies Scheme[]) {
      const markup = renderToStaticMarkup(<SvgDrawing drawing={drawing} scheme={scheme} width={100} />);
      expect(markup).toContain('<svg');
      expect(markup).not.toMatch(/ style=|NaN|undefined/);
    }
  });
});

describe('a winding drawing', () => {
  it('carries its measures, its taps and where its ends go', () => {
    expect(textsOf(windingDrawing(tube))).toEqual([
      '28 mm, 63 turns, 40 drawn',
      '63 mm',
      'tap, turn 20',
      'tap, turn 40',
      'start: earth',
      'end: capacitor',
    ]);
  });

  it('draws each turn up to forty and thins more', () => {
    expect(turnsOf(windingDrawing({ ...tube, turns: 23, taps: [] }))).toBe(23);
    expect(turnsOf(windingDrawing({ ...tube, turns: 93, taps: [] }))).toBe(40);
  });

  it('says the same in one sentence', () => {
    expect(windingSentence(tube)).toBe(
      'Coil: 63 turns on a 63 mm former, winding 28 mm long, tap at turn 20, tap at turn 40. Start goes to earth, end to capacitor.',
    );
  });
});

describe('a circuit drawing', () => {
  it('names every part of the version and none that is not fitted', () => {
    const texts = textsOf(circuitDrawing(circuit));
    for (const ref of ['L1', 'C1', 'C2', 'D1', 'R1', 'E1']) expect(texts).toContain(ref);
    const bare = textsOf(circuitDrawing({ ...circuit, coupling: { kind: 'direct' }, returnResistor: null }));
    expect(bare).not.toContain('R1');
    expect(bare).not.toContain('C2');
  });

  it('shows padder, trimmer, bypass and transformer where they are fitted', () => {
    const texts = textsOf(
      circuitDrawing({
        ...circuit,
        coupling: { kind: 'primary', label: { ref: 'L2', value: '12 turns' } },
        padder: { ref: 'C4', value: '470 pF' },
        trimmer: { ref: 'C5', value: '5 to 30 pF' },
        bypass: { ref: 'C3', value: '1 nF' },
        transformer: { ref: 'T1', value: '70 to 1' },
        detectorAt: 'tap',
      }),
    );
    for (const text of ['L2', 'C4, 470 pF', 'C5, 5 to 30 pF', 'C3', 'T1']) expect(texts).toContain(text);
  });

  it('stays inside the sheet for every coupling', () => {
    for (const coupling of [
      { kind: 'direct' },
      { kind: 'aerial-tap', label: 'turn 14' },
    ] satisfies CircuitView['coupling'][]) {
      for (const shape of flat(circuitDrawing({ ...circuit, coupling }).shapes)) {
        if (shape.kind !== 'text') continue;
        expect(shape.x).toBeGreaterThanOrEqual(0);
        expect(shape.x).toBeLessThanOrEqual(182);
      }
    }
  });
});

describe('a template to cut from', () => {
  it('keeps its millimetres on paper and brings a bar to measure', () => {
    expect(pointsOf(25.4)).toBe(72);
    const former = formerTemplate({ spokes: 13, diameterMm: 120, innerMm: 36, slotMm: 1.6 });
    expect(flat(former.shapes)).toContainEqual(expect.objectContaining({ kind: 'circle', r: 60 }));
    for (const drawing of [former, dial]) {
      expect(textsOf(drawing).join()).toContain('This bar is 50 mm long');
      expect(flat(drawing.shapes).some((shape) => shape.kind === 'path' && shape.d.includes('h50'))).toBe(true);
    }
  });

  it('of a dial names its figures and stations', () => {
    expect(textsOf(dial)).toEqual(expect.arrayContaining(['500', '1580', 'Vale', 'Cape', 'kHz']));
  });
});

describe('hatching for paper', () => {
  it('stays inside its box and is never under 3 points wide', () => {
    const [box, lines] = hatched(10, 20, 0.2, 16);
    expect(box).toMatchObject({ kind: 'rect', width: 3 });
    const numbers = lines?.kind === 'path' ? [...lines.d.matchAll(/[ML]([\d.]+) ([\d.]+)/g)] : [];
    expect(numbers.length).toBeGreaterThan(2);
    for (const [, x, y] of numbers) {
      expect(Number(x)).toBeGreaterThanOrEqual(10);
      expect(Number(x)).toBeLessThanOrEqual(13);
      expect(Number(y)).toBeGreaterThanOrEqual(20);
      expect(Number(y)).toBeLessThanOrEqual(36);
    }
  });
});
