import { foilPlates, fixedCapacitor, vanes } from './parts/capacitors';
import { flatCoil, reel, rod, transformer, tubeCoil } from './parts/coils';
import {
  aerial,
  board,
  box,
  detector,
  earpiece,
  earth,
  guide,
  headset,
  knob,
  packet,
  resistor,
  screw,
  terminal,
  tool,
} from './parts/small';
import type { Drawing, Shape } from './shapes';

/** One silhouette a family; made to be read at 40 px and at 400 px. */
const silhouettes = {
  'coil-flat': () => flatCoil(50, 40, 38, { spokes: 11, turns: 9 }, 1.3),
  'coil-tube': () => tubeCoil({ x: 14, y: 21, length: 72, diameter: 36, from: 10, winding: 54 }, { turns: 14 }, 1.5),
  vanes: () => vanes(46, 43, 28, { depth: 3, turn: 28, line: 1.4 }),
  'foil-plates': foilPlates,
  detector,
  earpiece,
  headset,
  aerial,
  earth,
  terminal,
  reel,
  resistor,
  'fixed-capacitor': fixedCapacitor,
  transformer,
  rod,
  board,
  knob,
  screw,
  guide,
  packet,
  box,
  tool,
} as const satisfies Record<string, () => Shape[]>;

export type PartFamily = keyof typeof silhouettes;

export const partFamilies = Object.keys(silhouettes);

export function isPartFamily(name: string): name is PartFamily {
  return Object.hasOwn(silhouettes, name);
}

/** The silhouette of a family in its 100 by 80 box. `title` null where the part's name stands beside it. */
export function partDrawing(family: PartFamily, title: string | null = null): Drawing {
  return { width: 100, height: 80, title, shapes: silhouettes[family]() };
}
