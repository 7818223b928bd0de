import { flatCoil, MOST_TURNS_DRAWN, tubeCoil } from './parts/coils';
import { at, line, onCircle, path, words, type Drawing, type Shape } from './shapes';

/** Lengths in millimetres. */
export type WindingView = {
  former:
    | { form: 'tube'; diameterMm: number; lengthMm: number; windingMm: number }
    | { form: 'flat'; spokes: number; diameterMm: number; innerMm: number };
  turns: number;
  taps: readonly { turn: number; label: string }[];
  /** Where each end goes, such as "earth" and "capacitor". */
  startGoesTo: string;
  endGoesTo: string;
};

/** A4 between its margins is 182 mm wide; the box of the drawing is that, in millimetres of paper. */
const WIDTH = 182;
const TEXT = 4;
const INK = { stroke: 'ink', line: 0.32 } as const;

/** A coil to be wound, with its measures in mm and its taps; the tube in its real proportions. */
export function windingDrawing(view: WindingView): Drawing {
  return view.former.form === 'tube' ? tubeWinding(view, view.former) : flatWinding(view, view.former);
}

type Tube = Extract<WindingView['former'], { form: 'tube' }>;
type Flat = Extract<WindingView['former'], { form: 'flat' }>;

function tubeWinding(view: WindingView, former: Tube): Drawing {
  // As large as fits: 118 mm along, 46 mm across.
  const scale = Math.min(118 / former.lengthMm, 46 / former.diameterMm);
  const length = at(former.lengthMm * scale);
  const diameter = at(former.diameterMm * scale);
  const winding = at(former.windingMm * scale);
  const x = at((WIDTH - length) / 2 + 4);
  const y = 24;
  const bottom = y + diameter;
  const from = at((length - winding) / 2);
  const left = at(x + from);
  const right = at(left + winding);
  const coil = tubeCoil(
    { x, y, length, diameter, from, winding },
    { turns: view.turns, taps: view.taps.map((tap) => tap.turn) },
    0.4,
  );
  const tail = diameter * 0.3;
  const measureY = at(bottom + tail + 3);
  const thinned = view.turns > MOST_TURNS_DRAWN ? `, ${MOST_TURNS_DRAWN} drawn` : '';
  return {
    width: WIDTH,
    height: at(measureY + 12),
    title: windingSentence(view),
    shapes: [
      ...coil,
      line(left, at(bottom + tail * 0.5), left, measureY + 1.5, INK),
      line(right, at(bottom + tail * 0.5), right, measureY + 1.5, INK),
      ...arrow(left, measureY, right, measureY),
      words(at((left + right) / 2), measureY + 6, `${former.windingMm} mm, ${view.turns} turns${thinned}`, middle),
      line(x - 16, y, x - 4, y, INK),
      line(x - 16, bottom, x - 4, bottom, INK),
      ...arrow(x - 13, y, x - 13, bottom),
      words(x - 16, at(y + diameter / 2), `${former.diameterMm} mm`, { ...middle, turn: -90 }),
      ...tapLabels(view, left, winding, y),
      path(`M${left} ${y - 1}C${left - 4} ${y - 8} ${left - 9} ${y - 11} ${left - 14} ${y - 12}`, INK),
      words(left - 15, y - 11, `start: ${view.startGoesTo}`, { size: TEXT, anchor: 'end', bold: true }),
      path(
        `M${right} ${bottom}C${right + 5} ${bottom + 6} ${right + 10} ${bottom + 8} ${right + 16} ${bottom + 8}`,
        INK,
      ),
      words(right + 17, bottom + 9.5, `end: ${view.endGoesTo}`, { size: TEXT, bold: true }),
    ],
  };
}

const middle = { size: TEXT, anchor: 'middle', bold: true } as const;

/** Labels stand over their taps; where two would touch, the later one moves to the upper row. */
function tapLabels(view: WindingView, left: number, winding: number, y: number): Shape[] {
  const LETTER = TEXT * 0.56; // mean advance of the bold text face
  let lastEnd = -Infinity;
  return [...view.taps]
    .sort((a, b) => a.turn - b.turn)
    .flatMap((tap) => {
      const x = at(left + winding * (tap.turn / view.turns));
      const text = `${tap.label}, turn ${tap.turn}`;
      const half = (text.length * LETTER) / 2;
      const isRaised = x - half < lastEnd + 2;
      if (!isRaised) lastEnd = x + half;
      const foot = isRaised ? 5 : 11;
      return [line(x, foot, x, y - 6, INK), words(x, foot - 1, text, middle)];
    });
}

function flatWinding(view: WindingView, former: Flat): Drawing {
  const r = 40;
  const cx = WIDTH / 2;
  const cy = 44;
  const labels = [...view.taps]
    .sort((a, b) => a.turn - b.turn)
    .map((tap, index) => {
      const radius = r * (0.34 + (0.93 - 0.34) * (tap.turn / view.turns));
      const [x, y] = onCircle(cx, cy, radius, 60 + index * 34);
      const endX = cx + r + 10;
      const endY = 24 + index * 12;
      return [
        line(x, y, endX, endY, INK),
        words(endX + 1, endY + 1.4, `${tap.label}, turn ${tap.turn}`, { size: TEXT, bold: true }),
      ];
    });
  const [startX, startY] = onCircle(cx, cy, r * 0.34, 270);
  const [finishX, finishY] = onCircle(cx, cy, r * 0.93, 230);
  return {
    width: WIDTH,
    height: 106,
    title: windingSentence(view),
    shapes: [
      ...flatCoil(cx, cy, r, { spokes: former.spokes, turns: view.turns }, 0.4),
      line(startX, startY, cx - r - 10, 24, INK),
      words(cx - r - 11, 25.4, `start: ${view.startGoesTo}`, { size: TEXT, anchor: 'end', bold: true }),
      line(finishX, finishY, cx - r - 10, 74, INK),
      words(cx - r - 11, 75.4, `end: ${view.endGoesTo}`, { size: TEXT, anchor: 'end', bold: true }),
      ...labels.flat(),
      ...arrow(cx - r, 90, cx + r, 90),
      line(cx - r, cy, cx - r, 92, { ...INK, dash: '1 1' }),
      line(cx + r, cy, cx + r, 92, { ...INK, dash: '1 1' }),
      words(cx, 97, `${former.diameterMm} mm over ${former.spokes} spokes, hub ${former.innerMm} mm`, middle),
      words(cx, 103, `${view.turns} turns`, middle),
    ],
  };
}

export function windingSentence(view: WindingView): string {
  const { former, turns, taps } = view;
  const on =
    former.form === 'tube'
      ? `a ${former.diameterMm} mm former, winding ${former.windingMm} mm long`
      : `a flat former of ${former.spokes} spokes, ${former.diameterMm} mm across`;
  const at = taps.length === 0 ? '' : `, ${taps.map((tap) => `${tap.label} at turn ${tap.turn}`).join(', ')}`;
  return `Coil: ${turns} turns on ${on}${at}. Start goes to ${view.startGoesTo}, end to ${view.endGoesTo}.`;
}

/** A measure line with an open head at each end. */
function arrow(x1: number, y1: number, x2: number, y2: number): Shape[] {
  const isLevel = y1 === y2;
  const h = 1.6;
  const w = 1;
  const heads = isLevel
    ? `M${x1 + h} ${y1 - w}L${x1} ${y1}L${x1 + h} ${y1 + w}M${x2 - h} ${y2 - w}L${x2} ${y2}L${x2 - h} ${y2 + w}`
    : `M${x1 - w} ${y1 + h}L${x1} ${y1}L${x1 + w} ${y1 + h}M${x2 - w} ${y2 - h}L${x2} ${y2}L${x2 + w} ${y2 - h}`;
  return [line(x1, y1, x2, y2, INK), path(heads, INK)];
}
