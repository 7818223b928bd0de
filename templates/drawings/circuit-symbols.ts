import { at, circle, line, path, rect, words, type Paint, type Shape } from './shapes';

/** Symbols of the circuit drawing, in millimetres of paper. Each takes the middle of what it stands on. */
export const WIRE: Paint = { stroke: 'ink', line: 0.45 };
const PLATE: Paint = { stroke: 'ink', line: 0.8 };

export const wire = (d: string): Shape => path(d, WIRE);
export const joint = (x: number, y: number): Shape => circle(x, y, 0.9, { fill: 'ink' });

/** Three spread arms on a mast, the foot at (x, y). */
export const aerialSign = (x: number, y: number): Shape[] => [
  wire(`M${x} ${y}V${y - 12}M${x - 5} ${y - 12}L${x} ${y - 5}L${x + 5} ${y - 12}`),
];

export const earthSign = (x: number, y: number): Shape[] => [
  path(`M${x - 5} ${y}H${x + 5}M${x - 3} ${y + 1.8}H${x + 3}M${x - 1.2} ${y + 3.6}H${x + 1.2}`, PLATE),
];

/** A winding from top to bottom; its turns bulge to the right, or to the left. */
export function winding(
  x: number,
  top: number,
  bottom: number,
  options: { turns: number; bulge: 'right' | 'left' },
): Shape[] {
  const step = (bottom - top) / options.turns;
  const sweep = options.bulge === 'right' ? 1 : 0;
  const arcs = Array.from(
    { length: options.turns },
    () => `a${at(step / 2)} ${at(step / 2)} 0 0 ${sweep} 0 ${at(step)}`,
  );
  return [path(`M${x} ${top}${arcs.join('')}`, { stroke: 'copper', line: 0.8, roundEnds: true })];
}

/** Plates across an upright wire; with an arrow where it is tuned. Stands for 3 mm on the wire. */
export function capacitorUpright(x: number, y: number, kind: 'fixed' | 'variable' | 'trimmer'): Shape[] {
  const shapes: Shape[] = [path(`M${x - 4.5} ${y - 1}H${x + 4.5}M${x - 4.5} ${y + 1}H${x + 4.5}`, PLATE)];
  if (kind === 'variable') shapes.push(...arrow(x - 5, y + 5.5, x + 5.5, y - 6));
  if (kind === 'trimmer')
    shapes.push(path(`M${x - 4} ${y + 4.5}L${x + 4} ${y - 4.5}M${x + 2.6} ${y - 5.6}L${x + 5.4} ${y - 3.2}`, WIRE));
  return shapes;
}

/** Plates across a level wire. */
export const capacitorLevel = (x: number, y: number): Shape[] => [
  path(`M${x - 1} ${y - 4.5}V${y + 4.5}M${x + 1} ${y - 4.5}V${y + 4.5}`, PLATE),
];

/** A detector on a level wire, forward to the right. */
export const detectorLevel = (x: number, y: number): Shape[] => [
  path(`M${x - 3.5} ${y - 3.6}L${x + 3} ${y}L${x - 3.5} ${y + 3.6}Z`, { fill: 'ink' }),
  path(`M${x + 3} ${y - 3.8}V${y + 3.8}`, PLATE),
];

export const resistorUpright = (x: number, y: number): Shape[] => [
  rect(x - 2.2, y - 7, 4.4, 14, { fill: 'card', stroke: 'ink', line: 0.6 }),
];

/** An earphone across an upright wire: its capsule and its opening. */
export const earphoneUpright = (x: number, y: number): Shape[] => [
  rect(x - 2, y - 5.5, 4, 11, { fill: 'card', stroke: 'ink', line: 0.6 }),
  path(`M${x + 2} ${y - 7.5}h2.2v15h-2.2`, { fill: 'card', stroke: 'ink', line: 0.6 }),
];

/** An arrow across a part: tuned by hand. */
export function arrow(x1: number, y1: number, x2: number, y2: number): Shape[] {
  const length = Math.hypot(x2 - x1, y2 - y1);
  const [ux, uy] = [(x2 - x1) / length, (y2 - y1) / length];
  const [bx, by] = [x2 - ux * 2.4, y2 - uy * 2.4];
  return [
    line(at(x1), at(y1), at(x2), at(y2), WIRE),
    path(`M${at(bx - uy * 1.1)} ${at(by + ux * 1.1)}L${x2} ${y2}L${at(bx + uy * 1.1)} ${at(by - ux * 1.1)}`, WIRE),
  ];
}

export type Label = { ref: string; value: string };

/** Reference in bold, value under it, centred. */
export const labelUnder = (x: number, y: number, label: Label): Shape[] => [
  words(x, y, label.ref, { size: 3.8, anchor: 'middle', bold: true }),
  words(x, y + 5, label.value, { size: 3.6, anchor: 'middle' }),
];
