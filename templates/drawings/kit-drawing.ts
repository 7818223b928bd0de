import { foilPlates, vanes } from './parts/capacitors';
import { flatCoil, MOST_TURNS_DRAWN, placed, rod, tubeCoil, type TubeBox } from './parts/coils';
import { detector, earpiece, headset, terminal } from './parts/small';
import { at, circle, line, path, rect, words, type Drawing, type Shape } from './shapes';

/** A former and the winding on it, metres. */
type Tube = { length: number; diameter: number; wound: number };

/** What of a kit decides how it looks. */
export type KitLook = {
  coil:
    | { form: 'flat'; spokes: number; turns: number }
    | { form: 'tube'; turns: number; taps: readonly number[]; tube?: Tube }
    | { form: 'rod' };
  tuning: 'vanes' | 'foil-plates' | 'slider';
  /** Largest capacitance of the vanes, farads: a larger capacitor is drawn larger. */
  largest?: number;
  earphone: 'earpiece' | 'headset';
};

/** The kit unpacked on the shop's front: meant for the `plate` scheme, 720 by 404. */
export function posterDrawing(kit: KitLook): Drawing {
  const wire = (d: string): Shape => path(d, { stroke: 'copper', line: 3, roundEnds: true });
  const round = { cx: 404, cy: 200, r: 184 };
  const box = kit.coil.form === 'tube' ? tubeBox(kit.coil.tube, round) : null;
  const crown = box ? at(box.y) : 128;
  const foot = box ? at(box.y + box.diameter + box.diameter * 0.28) : 318;
  const [left, right] = box ? [at(box.x + box.from), at(box.x + box.from + box.winding)] : [268, 538];
  return {
    width: 720,
    height: 404,
    title: null,
    shapes: [
      ...(kit.coil.form === 'flat'
        ? [
            wire('M60 60C180 20 330 40 392 90'),
            wire('M392 352C360 392 290 398 214 344'),
            wire('M648 271C648 372 588 384 532 338'),
          ]
        : [
            wire(`M60 60C180 20 300 ${Math.min(30, crown - 40)} ${at((left + right) / 2)} ${crown}`),
            wire(`M${left - 4} ${foot}C${left - 10} ${foot + 54} ${left - 20} ${Math.min(396, foot + 70)} 208 352`),
            wire(`M648 282C648 372 ${right + 10} ${Math.min(400, foot + 78)} ${right + 4} ${foot}`),
          ]),
      ...bigCoil(kit.coil, round, 1.6),
      ...tuner(kit.tuning, { x: 150, y: 296, r: 80, depth: 5, turn: 24 }),
      placed(32, 88, 1.2, detector(), -12),
      placed(14, 24, 0.9, terminal()),
      ...(kit.earphone === 'headset' ? [placed(578, 168, 1.32, headset())] : [placed(588, 190, 1.25, earpiece())]),
    ],
  };
}

/**
 * The kit put together on its board, 660 by 436, with numbers: 1 coil, 2 tuning, 3 detector, 4 earphone, 5 terminals.
 * The page lists the parts under the same numbers.
 */
export function stageDrawing(kit: KitLook, options: { callouts: boolean }): Drawing {
  return {
    width: 660,
    height: 436,
    title: null,
    shapes: [
      rect(44, 304, 572, 96, { fill: 'card', stroke: 'ink', line: 1.5, radius: 4 }),
      ...[324, 348, 378].map((y, index) =>
        path(`M60 ${y}q136 ${index % 2 === 0 ? 12 : -12} 272 0t272 0`, { stroke: 'ink', line: 0.8, opacity: 0.4 }),
      ),
      ...stageCoil(kit.coil),
      placed(42, 262, 0.9, terminal()),
      placed(524, 262, 0.9, terminal()),
      ...tuner(kit.tuning, {
        x: kit.tuning === 'vanes' ? 470 : 448,
        y: 258,
        r: kit.tuning === 'vanes' ? 76 : 62,
        depth: 6,
        turn: 28,
      }),
      placed(414, 325, 1.1, detector()),
      ...(kit.earphone === 'headset' ? [placed(532, 40, 1.15, headset())] : [placed(552, 36, 1.2, earpiece())]),
      ...(options.callouts ? callouts(kit) : []),
    ],
  };
}

/** The kit in a card's drawing ground, 286 by 150: its coil and what tunes it. */
export function cardDrawing(kit: KitLook): Drawing {
  const knobSide: Shape[] =
    kit.tuning === 'vanes'
      ? vanes(222, 106, at(30 * vaneScale(kit.largest)), { depth: 3, turn: 28, line: 1.3 })
      : kit.tuning === 'foil-plates'
        ? [placed(180, 62, 0.9, foilPlates())]
        : [];
  const coil: Shape[] =
    kit.coil.form === 'flat'
      ? flatCoil(144, 75, 64, kit.coil, 1.3)
      : kit.coil.form === 'tube'
        ? wound(cardTube(kit.coil.tube), kit.coil, 1.5)
        : [placed(40, -2, 1.9, rod())];
  const phone = kit.earphone === 'headset' ? placed(226, 6, 0.5, headset()) : placed(232, 10, 0.46, earpiece());
  return { width: 286, height: 150, title: null, shapes: [...coil, ...knobSide, phone] };
}

/** A card shows every coil to one scale, so that a wide tube looks wide beside a slim one: 1.12 units a millimetre. */
function cardTube(tube: Tube = usualTube): TubeBox {
  const scale = Math.min(1120, 172 / tube.length, 84 / tube.diameter);
  const [length, diameter, winding] = [tube.length * scale, tube.diameter * scale, tube.wound * scale];
  return { x: at(118 - length / 2), y: at(78 - diameter / 2), length, diameter, from: (length - winding) / 2, winding };
}

/** Proportions where no former is known. */
const usualTube: Tube = { length: 0.11, diameter: 0.05, wound: 0.08 };

/** A coil of this tube in the room of a round one, its foot where the round one's tube would have it. */
function tubeBox(tube: Tube = usualTube, { cx, cy, r }: { cx: number; cy: number; r: number }): TubeBox {
  const scale = Math.min((r * 1.9) / tube.length, (r * 1.16) / tube.diameter);
  const [length, diameter, winding] = [tube.length * scale, tube.diameter * scale, tube.wound * scale];
  return {
    x: at(cx - length / 2),
    y: at(cy + r * 0.42 - diameter),
    length,
    diameter,
    from: (length - winding) / 2,
    winding,
  };
}

/** No turns closer than three lines and a half, where they would run into a grey. */
const wound = (box: TubeBox, coil: { turns: number; taps: readonly number[] }, lineWidth: number) =>
  tubeCoil(box, { ...coil, most: Math.min(MOST_TURNS_DRAWN, Math.floor(box.winding / (lineWidth * 3.5))) }, lineWidth);

/** An area follows the capacitance; 365 pF is drawn at full size. */
const vaneScale = (farads = 3.65e-10) => Math.min(1.15, Math.max(0.6, Math.sqrt(farads / 3.65e-10)));

function bigCoil(coil: KitLook['coil'], round: { cx: number; cy: number; r: number }, lineWidth: number): Shape[] {
  const { cx, cy, r } = round;
  switch (coil.form) {
    case 'flat':
      return flatCoil(cx, cy, r, coil, lineWidth);
    case 'tube':
      return wound(tubeBox(coil.tube, { cx, cy, r }), coil, lineWidth);
    case 'rod':
      return [placed(cx - r * 1.1, cy - r * 0.9, at((r * 2.2) / 100), rod())];
  }
}

function stageCoil(coil: KitLook['coil']): Shape[] {
  if (coil.form === 'flat') {
    return [
      ...bigCoil(coil, { cx: 236, cy: 185, r: 156 }, 1.5),
      path('M92 190C88 220 94 240 92 270', { stroke: 'copper', line: 2.4, roundEnds: true }),
      path('M392 222C398 190 416 196 414 236', { stroke: 'copper', line: 2.4, roundEnds: true }),
    ];
  }
  const room = { cx: 226, cy: 214, r: 150 };
  const coilShapes = bigCoil(coil, room, 1.5);
  // The turns drawn are fewer than those wound: the true count stands under them.
  return coil.form === 'tube'
    ? [...coilShapes, words(room.cx, 294, `${coil.turns} turns`, { size: 13, anchor: 'middle', face: 'figures' })]
    : coilShapes;
}

type TunerPlace = { x: number; y: number; r: number; depth: number; turn: number };

function tuner(kind: KitLook['tuning'], { x, y, r, depth, turn }: TunerPlace): Shape[] {
  switch (kind) {
    case 'vanes':
      return vanes(x, y, r, { depth, turn, line: 1.3 });
    case 'foil-plates':
      return [placed(at(x - r * 1.3), at(y - r * 0.9), at(r / 38), foilPlates())];
    case 'slider':
      return slider(x, y, r);
  }
}

/** A contact on its bar: the coil is tuned by where it touches. */
function slider(x: number, y: number, r: number): Shape[] {
  return [
    rect(at(x - r * 1.2), y - 5, at(r * 2.4), 10, { fill: 'copper-lite', stroke: 'ink', line: 1.4, radius: 3 }),
    rect(at(x - r * 0.2), y - 16, at(r * 0.4), 32, { fill: 'enamel', stroke: 'ink', line: 1.4, radius: 4 }),
    path(`M${x} ${y + 16}v18`, { stroke: 'copper', line: 3 }),
  ];
}

function callouts(kit: KitLook): Shape[] {
  const coilAt = kit.coil.form === 'flat' ? { toX: 118, toY: 106 } : { toX: 168, toY: 168 };
  const tunerAt = kit.tuning === 'vanes' ? { toX: 450, toY: 190 } : { toX: 448, toY: 246 };
  const marks = [
    { number: 1, x: 60, y: 60, ...coilAt },
    { number: 2, x: 400, y: 96, ...tunerAt },
    { number: 3, x: 374, y: 388, toX: 432, toY: 370 },
    { number: 4, x: 546, y: 56, toX: 592, toY: 76 },
    { number: 5, x: 40, y: 252, toX: 74, toY: 284 },
  ];
  return marks.flatMap(({ number, x, y, toX, toY }) => [
    line(x, y, toX, toY, { stroke: 'ink', line: 1 }),
    circle(x, y, 12, { fill: 'card', stroke: 'ink', line: 1.4 }),
    words(x, y + 4.5, String(number), { size: 13, anchor: 'middle', face: 'figures', bold: true }),
  ]);
}
