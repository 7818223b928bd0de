import { at, circle, line, onCircle, path, rect, words, type Drawing, type Shape } from './shapes';

/** Drawings whose units are millimetres of paper: print them at this width and measure the bar. */
export const pointsOf = (millimetres: number) => (millimetres * 72) / 25.4;

const INK = { stroke: 'ink', line: 0.3 } as const;
const CUT = { stroke: 'ink', line: 0.3, dash: '2 1.2' } as const;

/** Held against a ruler before anything is cut: 50 mm in tens. */
function measuringBar(x: number, y: number): Shape[] {
  const ticks = [0, 10, 20, 30, 40, 50].map((mm) => `M${x + mm} ${y}v${mm % 50 === 0 ? -3 : -2}`);
  return [
    path(`M${x} ${y}h50${ticks.join('')}`, INK),
    words(x + 25, y + 4, 'This bar is 50 mm long. If yours is not, print at 100 %.', { size: 2.8, anchor: 'middle' }),
  ];
}

export type DialMark = {
  /** Degrees of the half turn, 0 at the left end. */
  angle: number;
  /** Figure beside a long mark; null for a short one. */
  label: string | null;
};

export type DialView = {
  diameterMm: number;
  /** Hole for the shaft. */
  shaftMm: number;
  unit: string;
  marks: readonly DialMark[];
  stations: readonly { name: string; angle: number }[];
};

/**
 * A half-round scale to cut out and glue under the knob, with 5 mm under the half turn for its end figures.
 * Station names stand inside, figures outside.
 */
export function dialDrawing({ diameterMm, shaftMm, unit, marks, stations }: DialView): Drawing {
  const r = diameterMm / 2;
  const width = Math.max(diameterMm + 16, 96);
  const cx = width / 2;
  const cy = r + 10;
  const turned = (angle: number) => angle - 90;
  const shapes: Shape[] = marks.flatMap(({ angle, label }) => {
    const [x1, y1] = onCircle(cx, cy, r - (label === null ? 2.2 : 4), turned(angle));
    const [x2, y2] = onCircle(cx, cy, r, turned(angle));
    const mark = line(x1, y1, x2, y2, { ...INK, line: label === null ? 0.25 : 0.5 });
    if (label === null) return [mark];
    const [tx, ty] = onCircle(cx, cy, r - 6.4, turned(angle));
    return [mark, words(tx, at(ty + 1), label, { size: 2.9, anchor: 'middle', face: 'figures', turn: turned(angle) })];
  });
  const named = stations.flatMap(({ name, angle }) => {
    const [x, y] = onCircle(cx, cy, r - 10.5, turned(angle));
    const isLeft = angle < 90;
    const [tx, ty] = onCircle(cx, cy, r - 12.5, turned(angle));
    return [
      circle(x, y, 0.7, { fill: 'copper' }),
      words(tx, at(ty + 0.8), name, {
        size: 2.6,
        anchor: isLeft ? 'start' : 'end',
        turn: isLeft ? angle : angle - 180,
      }),
    ];
  });
  return {
    width: at(width),
    height: at(cy + 24),
    title: `Dial scale of ${marks.length} marks, ${diameterMm} mm across, with ${stations.length} stations.`,
    shapes: [
      path(`M${cx - r} ${cy + 5}V${cy}A${r} ${r} 0 0 1 ${cx + r} ${cy}V${cy + 5}Z`, CUT),
      ...shapes,
      ...named,
      circle(cx, cy, shaftMm / 2, CUT),
      words(cx, cy - shaftMm / 2 - 3, unit, { size: 2.9, anchor: 'middle' }),
      ...measuringBar(cx - 25, cy + 16),
    ],
  };
}

export type FormerTemplate = { spokes: number; diameterMm: number; innerMm: number; slotMm: number };

/** A flat former to saw out: its outline, its slots and its centre. */
export function formerTemplate({ spokes, diameterMm, innerMm, slotMm }: FormerTemplate): Drawing {
  const width = Math.max(diameterMm + 10, 90);
  const [cx, cy] = [width / 2, diameterMm / 2 + 5];
  const slots = Array.from({ length: spokes }, (_, index) => {
    const degrees = (360 / spokes) * index;
    const spread = (radius: number) => (Math.asin(slotMm / 2 / radius) * 180) / Math.PI;
    const [outer, inner] = [diameterMm / 2, innerMm / 2];
    const points = [
      onCircle(cx, cy, outer, degrees - spread(outer)),
      onCircle(cx, cy, inner, degrees - spread(inner)),
      onCircle(cx, cy, inner, degrees + spread(inner)),
      onCircle(cx, cy, outer, degrees + spread(outer)),
    ];
    return path(`M${points.map(([x, y]) => `${x} ${y}`).join('L')}`, CUT);
  });
  return {
    width: at(width),
    height: at(diameterMm + 26),
    title: `Flat former, true to scale: ${spokes} slots, ${diameterMm} mm across, slots ${slotMm} mm wide down to ${innerMm} mm.`,
    shapes: [
      circle(cx, cy, diameterMm / 2, INK),
      ...slots,
      path(`M${cx - 4} ${cy}h8M${cx} ${cy - 4}v8`, INK),
      words(cx, cy + 9, `${spokes} slots, ${slotMm} mm wide`, { size: 3.2, anchor: 'middle' }),
      ...measuringBar(cx - 25, diameterMm + 16),
    ],
  };
}

export type FoilTemplate = { widthMm: number; heightMm: number; tagMm: number; plates: 1 | 2 };

/** Foil plates to cut, each with the tag that its wire is folded into. */
export function foilTemplate({ widthMm, heightMm, tagMm, plates }: FoilTemplate): Drawing {
  const gap = 10;
  const left = 5;
  const across = Math.max(widthMm + tagMm + 10, 70);
  const shapes = Array.from({ length: plates }, (_, index): Shape[] => {
    const y = 5 + index * (heightMm + gap);
    return [
      rect(left, y, widthMm, heightMm, CUT),
      path(`M${left + widthMm} ${y + 4}h${tagMm}v${tagMm}h-${tagMm}`, CUT),
      words(left + widthMm / 2, y + heightMm / 2, `plate ${index + 1}: ${widthMm} by ${heightMm} mm`, {
        size: 3.2,
        anchor: 'middle',
      }),
    ];
  });
  const height = 5 + plates * (heightMm + gap);
  return {
    width: at(across),
    height: at(height + 12),
    title: `Foil plates, true to scale: ${plates} of ${widthMm} by ${heightMm} mm with a tag of ${tagMm} mm.`,
    shapes: [...shapes.flat(), ...measuringBar(left + 12, height + 3)],
  };
}
