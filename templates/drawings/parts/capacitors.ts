import { at, circle, group, path, rect, type Shape } from '../shapes';

/**
 * A variable capacitor: fixed vanes below, turning vanes above, set back behind each other.
 * `turn` is how far the moving set stands open, degrees.
 */
export function vanes(
  cx: number,
  cy: number,
  r: number,
  options: { depth: number; turn: number; line: number },
): Shape[] {
  const { depth, turn, line } = options;
  const setback = r * 0.0675;
  const shapes: Shape[] = [
    rect(at(cx - r * 1.08), at(cy - r * 0.5), at(r * 2.42), at(r * 0.58), {
      fill: 'well',
      stroke: 'ink',
      line,
      radius: 3,
    }),
  ];
  for (let vane = depth - 1; vane >= 0; vane -= 1) {
    const x = at(cx + vane * setback);
    const y = at(cy - vane * setback * 1.1);
    const moving = r * 0.92;
    shapes.push(
      path(`M${at(x - r)} ${y}A${r} ${r} 0 0 0 ${at(x + r)} ${y}Z`, { fill: 'card', stroke: 'ink', line }),
      group({ dx: x, dy: y, turn: -turn }, [
        path(`M${-moving} 0A${moving} ${moving} 0 0 1 ${moving} 0Z`, {
          fill: vane === 0 ? 'enamel' : 'well',
          stroke: 'ink',
          line,
        }),
      ]),
    );
  }
  return [
    ...shapes,
    circle(cx, cy, at(r * 0.2), { fill: 'card', stroke: 'ink', line: line * 1.15 }),
    circle(cx, cy, at(r * 0.1), { fill: 'copper', stroke: 'ink', line: line * 0.8 }),
  ];
}

/** Two foil plates with a sheet of paper between, one slid over the other. */
export function foilPlates(): Shape[] {
  return [
    path('M14 50L40 62L90 50L64 38Z', { fill: 'edge', stroke: 'ink', line: 1.3 }),
    path('M8 40L40 54L94 41L62 27Z', { fill: 'card', stroke: 'ink', line: 1.3 }),
    path('M22 34L48 45L82 36L56 25Z', { fill: 'enamel', stroke: 'ink', line: 1.3 }),
    path('M48 45c2 10-6 14-4 22', { stroke: 'copper', line: 2 }),
  ];
}

/** A small fixed capacitor: a disc on two leads. */
export function fixedCapacitor(): Shape[] {
  return [
    path('M40 46C40 60 34 60 34 76M60 46C60 60 66 60 66 76', { stroke: 'ink', line: 1.7 }),
    circle(50, 33, 21, { fill: 'well', stroke: 'ink', line: 1.5 }),
    path('M44 25v16M56 25v16M44 33H36M56 33h8', { stroke: 'enamel', line: 2.2 }),
  ];
}
