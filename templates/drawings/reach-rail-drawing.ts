import {
  axisFor,
  pinFit,
  place,
  shortfall,
  shownDifference,
  shownEdge,
  shownKHz,
  type Axis,
  type ReachView,
} from './reach-axis';
import { contourPath, railLayouts } from './reach-layout';
import { reachSentence } from './reach-sentence';
import { at, circle, line, path, rect, words, type Drawing, type Shape } from './shapes';

/** The rail for paper: the bench size, in points, at a fixed width, in one ink with a hatched shortfall. */
export function reachRailDrawing(view: ReachView, width: number): Drawing {
  const { height, axis: axisY, bar, bracket, contour, scale, ends } = railLayouts.print;
  const axis = axisFor(view.band);
  const x = (f: number) => at(place(axis, f) * width);
  const chance =
    contour && view.contour
      ? contourPath({ axis, contour: view.contour, across: width, top: contour.top, foot: contour.foot })
      : null;
  const [low, high] = [x(view.band.lo), x(view.band.hi)];
  const short = shortfall(view);
  const box = (lo: number, hi: number) => [x(lo), bar.top, at(x(hi) - x(lo)), bar.height] as const;
  const shapes: Shape[] = [
    line(0, axisY, width, axisY, { stroke: 'edge', line: 1 }),
    ...(chance ? [path(chance.area, { fill: 'enamel-wash' }), path(chance.line, { stroke: 'ink', line: 1.2 })] : []),
    ...(view.nominal
      ? [rect(...box(view.nominal.lo, view.nominal.hi), { fill: 'card', stroke: 'ink', line: 1.2 })]
      : []),
    ...(view.worst ? [rect(...box(view.worst.lo, view.worst.hi), { fill: 'ink' })] : []),
    ...(short.low > 0 ? hatched(...box(view.band.lo, view.band.lo + short.low)) : []),
    ...(short.high > 0 ? hatched(...box(view.band.hi - short.high, view.band.hi)) : []),
    path(`M${low + 8} ${bracket.top}H${low}V${bracket.foot}H${low + 8}`, { stroke: 'ink', line: 2.4 }),
    path(`M${high - 8} ${bracket.top}H${high}V${bracket.foot}H${high - 8}`, { stroke: 'ink', line: 2.4 }),
    ...(view.stations ?? []).filter(({ f }) => f >= axis.lo && f <= axis.hi).flatMap(({ f }) => pin(view, f, x(f))),
    ...(scale ? scaleWords(axis, x, scale) : []),
  ];
  if (ends) {
    const lowWords =
      short.low > 0
        ? `band ${shownEdge(view.band.lo)}, short by ${shownDifference(short.low)}`
        : `band ${shownEdge(view.band.lo)}`;
    const highWords = `${short.high > 0 ? `short by ${shownDifference(short.high)}, ` : ''}${shownEdge(view.band.hi)} kHz`;
    shapes.push(
      words(low, ends.at, lowWords, { size: 11, bold: true }),
      words(high, ends.at, highWords, { size: 11, anchor: 'end', bold: true }),
    );
  }
  return { width, height, title: reachSentence(view), shapes };
}

function pin(view: ReachView, f: number, x: number): Shape[] {
  const { pin: layout } = railLayouts.print;
  if (!layout) return [];
  const head = layout.foot + layout.radius;
  const fit = pinFit(view, f);
  const r = layout.radius - 0.6;
  return [
    line(x, layout.top, x, layout.foot, { stroke: 'ink', line: 1.2 }),
    circle(x, head, r, { fill: fit === 'worst' ? 'ink' : 'card', stroke: 'ink', line: 1.2 }),
    ...(fit === 'nominal'
      ? [path(`M${at(x - r)} ${head}A${r} ${r} 0 0 0 ${at(x + r)} ${head}Z`, { fill: 'ink' })]
      : []),
  ];
}

function scaleWords(axis: Axis, x: (f: number) => number, scale: { at: number; size: number }): Shape[] {
  return axis.ticks.map((f, index) =>
    words(x(f), scale.at, `${shownKHz(f)}${index === axis.ticks.length - 1 ? ' kHz' : ''}`, {
      size: 9,
      anchor: 'middle',
      face: 'figures',
      fill: 'ink2',
    }),
  );
}

/** A box with lines at 45 degrees, cut to it, since paper has no patterns. Never drawn under 3 points wide. */
export function hatched(left: number, top: number, width: number, height: number): Shape[] {
  const GAP = 3.6;
  const wide = Math.max(3, width);
  const parts: string[] = [];
  for (let foot = GAP; foot < wide + height; foot += GAP) {
    // The line x + y = foot, from the left or lower edge to the upper or right one.
    const x1 = Math.max(0, foot - height);
    const y1 = Math.min(height, foot);
    const x2 = Math.min(wide, foot);
    const y2 = Math.max(0, foot - wide);
    parts.push(`M${at(left + x1)} ${at(top + y1)}L${at(left + x2)} ${at(top + y2)}`);
  }
  return [
    rect(left, top, wide, height, { fill: 'card', stroke: 'crimson', line: 1 }),
    path(parts.join(''), { stroke: 'crimson', line: 1 }),
  ];
}
