import { at, circle, ellipse, line, onCircle, path, rect, type Shape } from '../shapes';

/** A glass detector: band at the cathode end, the whisker inside. */
export function detector(): Shape[] {
  return [
    line(4, 40, 96, 40, { stroke: 'ink', line: 1.7 }),
    rect(27, 31, 46, 18, { fill: 'card', stroke: 'ink', line: 1.5, radius: 8 }),
    rect(60, 31, 6, 18, { fill: 'ink' }),
    path('M34 40h7l3-4 3 8 3-4', { stroke: 'copper', line: 1.6 }),
  ];
}

export function resistor(): Shape[] {
  const band = (x: number, fill: 'copper' | 'ink' | 'enamel' | 'copper-deep') => rect(x, 31, 3.4, 18, { fill });
  return [
    line(4, 40, 96, 40, { stroke: 'ink', line: 1.7 }),
    rect(26, 31, 48, 18, { fill: 'well', stroke: 'ink', line: 1.5, radius: 7.5 }),
    band(34.5, 'copper'),
    band(43, 'ink'),
    band(51.5, 'enamel'),
    band(63, 'copper-deep'),
  ];
}

/** A crystal earpiece for the ear canal, with its lead. */
export function earpiece(): Shape[] {
  return [
    path('M62 47C70 66 38 60 46 78', { stroke: 'copper', line: 2.2, roundEnds: true }),
    path('M50 20h-13a7 8 0 0 0 0 21h13Z', { fill: 'well', stroke: 'ink', line: 1.5 }),
    rect(48, 9, 11, 43, { fill: 'card', stroke: 'ink', line: 1.5, radius: 4 }),
    rect(59, 14, 11, 33, { fill: 'enamel', stroke: 'ink', line: 1.5, radius: 3.5 }),
  ];
}

/** Two thin high-impedance capsules on a steel band; never padded. */
export function headset(): Shape[] {
  const capsule = (x: number, towards: number): Shape[] => [
    rect(x - 3, 34, 6, 24, { fill: 'enamel', stroke: 'ink', line: 1.4, radius: 2 }),
    rect(at(x + towards * 5 - 2.5), 37, 5, 18, { fill: 'card', stroke: 'ink', line: 1.3, radius: 1.5 }),
  ];
  return [
    path('M24 36A26 27 0 0 1 76 36', { stroke: 'ink', line: 4 }),
    path('M24 36A26 27 0 0 1 76 36', { stroke: 'card', line: 1.6 }),
    ...capsule(24, 1),
    ...capsule(76, -1),
    path('M24 58C24 72 50 64 50 78M76 58C76 72 50 64 50 78', { stroke: 'copper', line: 1.8 }),
  ];
}

/** A wire between two masts with insulators, and the lead-in. */
export function aerial(): Shape[] {
  return [
    path('M14 74V10M86 74V15', { stroke: 'ink', line: 3 }),
    path('M14 42L8 74M86 45L92 74', { stroke: 'ink', line: 1 }),
    path('M14 13L24 16.500M86 17.500L77 20', { stroke: 'ink', line: 1 }),
    path('M24 16.500Q50 31 77 20', { stroke: 'copper', line: 2 }),
    path('M29 19Q31 48 36 74', { stroke: 'copper', line: 2 }),
    ellipse(24, 16.5, 5, 3.6, { fill: 'card', stroke: 'ink', line: 1.4 }),
    ellipse(77, 20, 5, 3.6, { fill: 'card', stroke: 'ink', line: 1.4 }),
  ];
}

/** An earth rod in the ground with its clip and lead. */
export function earth(): Shape[] {
  return [
    path('M14 36H86M22 36l-7 9M36 36l-7 9M72 36l-7 9M86 36l-7 9', { stroke: 'ink', line: 1.3 }),
    path('M45 10h10V66l-5 8l-5-8Z', { fill: 'copper', stroke: 'ink', line: 1.4 }),
    rect(37, 16, 26, 7.5, { fill: 'card', stroke: 'ink', line: 1.4, radius: 3 }),
    path('M63 19.500q19-2 24-15', { stroke: 'copper', line: 2.2 }),
  ];
}

export function terminal(): Shape[] {
  const knurls = [32, 38, 44, 50, 56, 62, 68].map((x) => line(x, 22, x, 36, { stroke: 'ink', line: 1 }));
  return [
    rect(46, 10, 8, 62, { fill: 'copper', stroke: 'ink', line: 1.3 }),
    rect(27, 20, 46, 18, { fill: 'copper-lite', stroke: 'ink', line: 1.4, radius: 4 }),
    ...knurls,
    path('M25 46h50l-6 12H31Z', { fill: 'card', stroke: 'ink', line: 1.4 }),
  ];
}

/** A wooden board in plan, grain and four holes. */
export function board(): Shape[] {
  const grain = [26, 33, 40, 47, 54].map((y, index) =>
    path(`M11 ${y}q19 ${index % 2 === 0 ? -2.5 : 2.5} 39 0t39 0`, { stroke: 'ink', line: 0.8, opacity: 0.5 }),
  );
  const holes = [
    [14, 24],
    [86, 24],
    [14, 56],
    [86, 56],
  ] as const;
  return [
    rect(7, 18, 86, 44, { fill: 'well', stroke: 'ink', line: 1.5, radius: 2.5 }),
    ...grain,
    ...holes.map(([x, y]) => circle(x, y, 2.4, { fill: 'card', stroke: 'ink', line: 1.1 })),
  ];
}

export function knob(): Shape[] {
  const marks = Array.from({ length: 24 }, (_, index) => {
    const [x1, y1] = onCircle(50, 40, 27, index * 15);
    const [x2, y2] = onCircle(50, 40, 31, index * 15);
    return line(x1, y1, x2, y2, { stroke: 'ink', line: 1 });
  });
  return [
    circle(50, 40, 32, { fill: 'card', stroke: 'ink', line: 1.5 }),
    ...marks,
    circle(50, 40, 22, { fill: 'enamel', stroke: 'ink', line: 1.4 }),
    path('M50 40L61 24', { stroke: 'card', line: 2.6 }),
  ];
}

/** A wood screw lying: slotted head, thread, point. */
export function screw(): Shape[] {
  const thread = Array.from({ length: 8 }, (_, index) => {
    const x = 38 + index * 5.4;
    return path(`M${at(x)} 33l-3.500 14`, { stroke: 'ink', line: 1.2 });
  });
  return [
    path('M30 34H78L92 40L78 46H30Z', { fill: 'card', stroke: 'ink', line: 1.4 }),
    ...thread,
    path('M30 34L16 22C10 32 10 48 16 58L30 46Z', { fill: 'copper-lite', stroke: 'ink', line: 1.4 }),
    path('M13 40h8', { stroke: 'ink', line: 2 }),
  ];
}

export function guide(): Shape[] {
  return [
    path('M18 20q16-8 32 0q16-8 32 0v46q-16-8-32 0q-16-8-32 0Z', { fill: 'card', stroke: 'ink', line: 1.5 }),
    path('M50 20v46', { stroke: 'ink', line: 1.3 }),
    path('M26 32h16M26 41h16M58 32h16M58 41h16', { stroke: 'enamel', line: 1.8 }),
  ];
}

/** A packet of small pieces: screws, washers, spare wire. */
export function packet(): Shape[] {
  return [
    path('M22 18h56v50H22Z', { fill: 'card', stroke: 'ink', line: 1.5 }),
    path('M22 18l6-6h44l6 6', { fill: 'well', stroke: 'ink', line: 1.5 }),
    circle(50, 24, 2.2, { fill: 'well', stroke: 'ink', line: 1.1 }),
    path('M36 38h8M40 38v18M36 44l8 3M36 50l8 3', { stroke: 'ink', line: 1.6 }),
    circle(60, 47, 8, { stroke: 'ink', line: 1.6, fill: 'copper-lite' }),
    circle(60, 47, 3, { stroke: 'ink', line: 1.4, fill: 'card' }),
  ];
}

/** A box with its lid, for kits and shipments. */
export function box(): Shape[] {
  return [
    path('M12 30L50 44V74L12 60Z', { fill: 'well', stroke: 'ink', line: 1.5 }),
    path('M88 30L50 44V74L88 60Z', { fill: 'card', stroke: 'ink', line: 1.5 }),
    path('M12 30L50 16L88 30L50 44Z', { fill: 'card', stroke: 'ink', line: 1.5 }),
    path('M58 49l22-8v10l-22 8Z', { fill: 'enamel', stroke: 'ink', line: 1.2 }),
  ];
}

/** A screwdriver: the one tool most kits ask for. */
export function tool(): Shape[] {
  return [
    path('M8 40h44', { stroke: 'ink', line: 3 }),
    path('M4 36h8v8H4Z', { fill: 'card', stroke: 'ink', line: 1.3 }),
    rect(50, 30, 44, 20, { fill: 'enamel', stroke: 'ink', line: 1.5, radius: 8 }),
    path('M60 36h26M60 44h26', { stroke: 'card', line: 1.6 }),
  ];
}
