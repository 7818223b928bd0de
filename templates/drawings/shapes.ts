/**
 * The vocabulary of every drawing: plain data in the units of its own box, coloured by token names, so that one
 * drawing serves the screen (as-svg.tsx, light, dark, on enamel, one ink) and paper (as-pdf.tsx).
 */
export type Tone =
  | 'none'
  | 'ink'
  | 'ink2'
  | 'card'
  | 'well'
  | 'edge'
  | 'rule'
  | 'enamel'
  | 'enamel-wash'
  | 'copper'
  | 'copper-lite'
  | 'copper-deep'
  | 'crimson';

export type Paint = {
  fill?: Tone;
  stroke?: Tone;
  /** Line width in the units of the box. */
  line?: number;
  dash?: string;
  roundEnds?: boolean;
  opacity?: number;
};

export type TextShape = {
  kind: 'text';
  x: number;
  y: number;
  text: string;
  size: number;
  anchor?: 'start' | 'middle' | 'end';
  face?: 'text' | 'figures' | 'display';
  bold?: boolean;
  /** Degrees, round (x, y). */
  turn?: number;
};

export type Geometry =
  | { kind: 'path'; d: string }
  | { kind: 'rect'; x: number; y: number; width: number; height: number; radius?: number }
  | { kind: 'circle'; cx: number; cy: number; r: number }
  | { kind: 'ellipse'; cx: number; cy: number; rx: number; ry: number }
  | { kind: 'line'; x1: number; y1: number; x2: number; y2: number }
  | TextShape;

export type Move = {
  /** Shift in the units of the box, after turning and scaling. */
  dx?: number;
  dy?: number;
  scale?: number;
  /** Degrees, clockwise, round the origin. */
  turn?: number;
};

export type Shape = (Geometry & Paint) | { kind: 'group'; move: Move; shapes: readonly Shape[] };

export type Drawing = {
  width: number;
  height: number;
  /** One sentence for readers; null where words beside it say the same. */
  title: string | null;
  shapes: readonly Shape[];
};

export const path = (d: string, paint: Paint): Shape => ({ kind: 'path', d, ...paint });
export const rect = (
  x: number,
  y: number,
  width: number,
  height: number,
  paint: Paint & { radius?: number },
): Shape => ({
  kind: 'rect',
  x,
  y,
  width,
  height,
  ...paint,
});
export const circle = (cx: number, cy: number, r: number, paint: Paint): Shape => ({
  kind: 'circle',
  cx,
  cy,
  r,
  ...paint,
});
export const ellipse = (cx: number, cy: number, rx: number, ry: number, paint: Paint): Shape => ({
  kind: 'ellipse',
  cx,
  cy,
  rx,
  ry,
  ...paint,
});
export const line = (x1: number, y1: number, x2: number, y2: number, paint: Paint): Shape => ({
  kind: 'line',
  x1,
  y1,
  x2,
  y2,
  ...paint,
});
export const words = (
  x: number,
  y: number,
  text: string,
  rest: Omit<TextShape, 'kind' | 'x' | 'y' | 'text'> & Paint,
): Shape => ({
  kind: 'text',
  x,
  y,
  text,
  fill: 'ink',
  ...rest,
});
export const group = (move: Move, shapes: readonly Shape[]): Shape => ({ kind: 'group', move, shapes });

/** The SVG transform of a move: turned and scaled first, then shifted. */
export function transformOf({ dx = 0, dy = 0, scale = 1, turn = 0 }: Move): string {
  return `translate(${dx} ${dy}) rotate(${turn}) scale(${scale})`;
}

/** Two decimals: enough for a hundredth of a millimetre, and paths stay short. */
export const at = (value: number) => Math.round(value * 100) / 100;

/** A point on a circle; degrees from twelve o'clock, clockwise. */
export function onCircle(cx: number, cy: number, r: number, degrees: number): [number, number] {
  const angle = ((degrees - 90) * Math.PI) / 180;
  return [at(cx + r * Math.cos(angle)), at(cy + r * Math.sin(angle))];
}
