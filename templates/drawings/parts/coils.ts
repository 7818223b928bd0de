import { at, circle, ellipse, group, onCircle, path, rect, type Shape, type Tone } from '../shapes';

const COPPERS: readonly Tone[] = ['copper', 'copper-lite', 'copper-deep'];
/** Above so many, turns are thinned; the true count is written beside the drawing. */
export const MOST_TURNS_DRAWN = 40;

export type FlatCoil = { spokes: number; turns: number };

/**
 * A basket coil seen from the front: spokes first, then the turns over and under them.
 * Radii are in the proportion of a real former: hub 0.28, winding 0.33 to 0.93 of the spoke's end.
 */
export function flatCoil(cx: number, cy: number, r: number, coil: FlatCoil, lineWidth: number): Shape[] {
  const { spokes } = coil;
  const turns = Math.min(coil.turns, MOST_TURNS_DRAWN);
  const shapes: Shape[] = [];
  const step = 360 / spokes;
  const halfWidth = r * Math.min(0.048, 0.5 / spokes);
  for (let index = 0; index < spokes; index += 1) {
    const angle = index * step;
    // Straight spokes: the same half width at the hub and at the end, as an angle at either radius.
    const spread = (radius: number) => (Math.asin(halfWidth / radius) * 180) / Math.PI;
    const hub = r * 0.27;
    const [ax, ay] = onCircle(cx, cy, hub, angle - spread(hub));
    const [bx, by] = onCircle(cx, cy, r, angle - spread(r));
    const [ex, ey] = onCircle(cx, cy, r, angle + spread(r));
    const [fx, fy] = onCircle(cx, cy, hub, angle + spread(hub));
    shapes.push(
      path(`M${ax} ${ay}L${bx} ${by}L${ex} ${ey}L${fx} ${fy}Z`, { fill: 'card', stroke: 'ink', line: lineWidth }),
    );
  }
  const inner = 0.34 * r;
  const outer = 0.93 * r;
  const pitch = (outer - inner) / turns;
  for (let turn = 0; turn < turns; turn += 1) {
    shapes.push(
      path(woundTurn({ cx, cy, spokes, step, turn, inner, pitch }), {
        stroke: COPPERS[turn % 3] ?? 'copper',
        line: at(Math.max(pitch * 0.6, lineWidth * 0.6)),
        roundEnds: true,
      }),
    );
  }
  return [
    ...shapes,
    circle(cx, cy, at(r * 0.28), { fill: 'card', stroke: 'ink', line: lineWidth }),
    circle(cx, cy, at(r * 0.17), { stroke: 'ink', line: at(lineWidth * 0.7) }),
    circle(cx, cy, at(r * 0.055), { fill: 'ink' }),
  ];
}

type WoundTurn = { cx: number; cy: number; spokes: number; step: number; turn: number; inner: number; pitch: number };

/** One turn: it passes over two gaps, dips behind a spoke, and the next turn starts one spoke on, as on an odd former. */
function woundTurn({ cx, cy, spokes, step, turn, inner, pitch }: WoundTurn): string {
  const parts: string[] = [];
  for (let index = 0; index < spokes; index += 1) {
    const isBehind = (index + turn) % 2 === 0;
    const gap = isBehind ? 0.14 : 0;
    const from = onCircle(cx, cy, inner + pitch * (turn + index / spokes), (index + gap) * step);
    const to = onCircle(
      cx,
      cy,
      inner + pitch * (turn + (index + 1) / spokes),
      (index + 1 - (isBehind ? 0 : 0.14)) * step,
    );
    parts.push(`M${from[0]} ${from[1]}L${to[0]} ${to[1]}`);
  }
  return parts.join('');
}

export type TubeCoil = {
  turns: number;
  taps?: readonly number[];
  /** Turns drawn at most. */
  most?: number;
};

export type TubeBox = {
  x: number;
  y: number;
  /** Length of the tube and its diameter as drawn. */
  length: number;
  diameter: number;
  /** Where the winding starts and how long it is, from the tube's left end. */
  from: number;
  winding: number;
};

/** A single-layer coil on a tube, in side view with its left end open. */
export function tubeCoil(box: TubeBox, coil: TubeCoil, lineWidth: number): Shape[] {
  const { x, y, length, diameter, from, winding } = box;
  const ry = diameter / 2;
  const rx = at(ry * 0.32);
  const drawn = Math.max(1, Math.min(coil.turns, coil.most ?? MOST_TURNS_DRAWN));
  const pitch = winding / drawn;
  const bottom = y + diameter;
  const shapes: Shape[] = [
    path(`M${x} ${y}H${x + length}A${rx} ${ry} 0 0 1 ${x + length} ${bottom}H${x}A${rx} ${ry} 0 0 1 ${x} ${y}Z`, {
      fill: 'card',
      stroke: 'ink',
      line: lineWidth,
    }),
  ];
  for (let turn = 0; turn < drawn; turn += 1) {
    const tx = at(x + from + pitch * (turn + 0.5));
    shapes.push(
      path(`M${tx} ${y}A${rx} ${ry} 0 0 1 ${tx} ${bottom}`, {
        stroke: COPPERS[turn % 3] ?? 'copper',
        line: at(pitch * 0.8),
      }),
    );
  }
  for (const tap of coil.taps ?? []) {
    const tx = at(x + from + winding * (tap / coil.turns));
    const rise = ry * 0.2 + lineWidth * 4;
    shapes.push(
      path(
        `M${at(tx - pitch / 2)} ${y}C${tx - rise * 0.3} ${at(y - rise)} ${tx + rise * 0.3} ${at(y - rise)} ${at(tx + pitch / 2)} ${y}`,
        {
          stroke: 'copper',
          line: lineWidth * 1.1,
        },
      ),
      circle(tx, at(y - rise * 0.8), lineWidth * 1.6, { fill: 'copper' }),
    );
  }
  const tail = at(ry * 0.6);
  const left = at(x + from);
  const right = at(x + from + winding);
  return [
    ...shapes,
    ellipse(x, y + ry, rx, ry, { fill: 'well', stroke: 'ink', line: lineWidth }),
    ellipse(x, y + ry, at(rx * 0.72), at(ry * 0.8), { fill: 'card', stroke: 'ink', line: lineWidth * 0.7 }),
    path(
      `M${left} ${bottom}c-${at(tail * 0.1)} ${at(tail * 0.4)} -${at(tail * 0.25)} ${at(tail * 0.5)} -${at(tail * 0.15)} ${tail}`,
      {
        stroke: 'copper',
        line: lineWidth * 1.2,
      },
    ),
    path(
      `M${right} ${bottom}c${at(tail * 0.1)} ${at(tail * 0.4)} ${at(tail * 0.25)} ${at(tail * 0.5)} ${at(tail * 0.15)} ${tail}`,
      {
        stroke: 'copper',
        line: lineWidth * 1.2,
      },
    ),
  ];
}

/** A ferrite rod with its coil, lying. */
export function rod(): Shape[] {
  return [
    rect(8, 32, 84, 16, { fill: 'ink2', stroke: 'ink', line: 1.4, radius: 8 }),
    ...Array.from({ length: 9 }, (_, turn) =>
      rect(30 + turn * 4.4, 29.5, 3.4, 21, {
        fill: COPPERS[turn % 3] ?? 'copper',
        stroke: 'ink',
        line: 0.6,
        radius: 1.6,
      }),
    ),
    path('M31 50c-1 8-6 8-5 15M68 50c1 8 6 8 5 15', { stroke: 'copper', line: 1.8 }),
  ];
}

/** A reel of wire with its loose end. */
export function reel(): Shape[] {
  const lines = Array.from({ length: 10 }, (_, index) =>
    path(`M27 ${at(20.5 + index * 4.4)}h46`, { stroke: index % 2 === 0 ? 'copper-deep' : 'copper-lite', line: 2 }),
  );
  return [
    rect(27, 17, 46, 47, { fill: 'copper', stroke: 'ink', line: 1.3 }),
    ...lines,
    rect(20, 9, 8, 63, { fill: 'card', stroke: 'ink', line: 1.5, radius: 2.5 }),
    rect(72, 9, 8, 63, { fill: 'card', stroke: 'ink', line: 1.5, radius: 2.5 }),
    path('M64 64q7 15 23 9', { stroke: 'copper', line: 2, roundEnds: true }),
  ];
}

/** An audio transformer: laminations with two windings on the middle leg. */
export function transformer(): Shape[] {
  const laminations = Array.from({ length: 7 }, (_, index) =>
    path(`M18 ${22 + index * 6}h64`, { stroke: 'ink', line: 0.7, opacity: 0.5 }),
  );
  const winding = (x: number) =>
    Array.from({ length: 5 }, (_, turn) =>
      rect(x + turn * 3.6, 20, 3, 40, { fill: COPPERS[turn % 3] ?? 'copper', stroke: 'ink', line: 0.5, radius: 1.5 }),
    );
  return [
    rect(18, 14, 64, 52, { fill: 'well', stroke: 'ink', line: 1.5, radius: 2 }),
    ...laminations,
    rect(28, 20, 44, 40, { fill: 'card', stroke: 'ink', line: 1.2 }),
    ...winding(30),
    ...winding(52),
    path('M32 60v14M44 60v14M56 60v14M68 60v14', { stroke: 'copper', line: 1.8 }),
  ];
}

/** Places shapes made for a 100 by 80 box elsewhere. */
export const placed = (dx: number, dy: number, scale: number, shapes: readonly Shape[], turn = 0): Shape =>
  group({ dx, dy, scale, turn }, shapes);
