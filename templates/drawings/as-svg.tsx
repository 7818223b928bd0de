import type { Drawing, Geometry, Paint, Shape, Tone } from './shapes';
import { transformOf } from './shapes';

/** `screen` follows the theme, `plate` lies on enamel, `ink` is one ink for sheets. */
export type Scheme = 'screen' | 'plate' | 'ink';

type ToneClasses = Record<Tone, string>;

const fills: Record<Scheme, ToneClasses> = {
  screen: {
    none: 'fill-none',
    ink: 'fill-ink',
    ink2: 'fill-ink2',
    card: 'fill-card',
    well: 'fill-well',
    edge: 'fill-edge',
    rule: 'fill-rule',
    enamel: 'fill-enamel',
    'enamel-wash': 'fill-enamel-wash',
    copper: 'fill-copper',
    'copper-lite': 'fill-copper-lite',
    'copper-deep': 'fill-copper-deep',
    crimson: 'fill-crimson',
  },
  plate: {
    none: 'fill-none',
    ink: 'fill-[#f5efe2]',
    ink2: 'fill-on-enamel2',
    card: 'fill-plate',
    well: 'fill-plate-deep',
    edge: 'fill-on-deep2',
    rule: 'fill-plate-line',
    enamel: 'fill-[#e4dfd8]',
    'enamel-wash': 'fill-plate-line',
    copper: 'fill-[#e0935b]',
    'copper-lite': 'fill-[#f0b184]',
    'copper-deep': 'fill-[#c4743d]',
    crimson: 'fill-[#f0b184]',
  },
  ink: {
    none: 'fill-none',
    ink: 'fill-sheet-ink',
    ink2: 'fill-[#333]',
    card: 'fill-sheet',
    well: 'fill-[#f1f1f1]',
    edge: 'fill-[#888]',
    rule: 'fill-[#ccc]',
    enamel: 'fill-sheet-ink',
    'enamel-wash': 'fill-[#ddd]',
    copper: 'fill-[#999]',
    'copper-lite': 'fill-[#ccc]',
    'copper-deep': 'fill-[#555]',
    crimson: 'fill-sheet-ink',
  },
};

const strokes: Record<Scheme, ToneClasses> = {
  screen: {
    none: 'stroke-none',
    ink: 'stroke-ink',
    ink2: 'stroke-ink2',
    card: 'stroke-card',
    well: 'stroke-well',
    edge: 'stroke-edge',
    rule: 'stroke-rule',
    enamel: 'stroke-enamel',
    'enamel-wash': 'stroke-enamel-wash',
    copper: 'stroke-copper',
    'copper-lite': 'stroke-copper-lite',
    'copper-deep': 'stroke-copper-deep',
    crimson: 'stroke-crimson',
  },
  plate: {
    none: 'stroke-none',
    ink: 'stroke-[#f5efe2]',
    ink2: 'stroke-on-enamel2',
    card: 'stroke-plate',
    well: 'stroke-plate-deep',
    edge: 'stroke-on-deep2',
    rule: 'stroke-plate-line',
    enamel: 'stroke-[#f5efe2]',
    'enamel-wash': 'stroke-plate-line',
    copper: 'stroke-[#e0935b]',
    'copper-lite': 'stroke-[#f0b184]',
    'copper-deep': 'stroke-[#c4743d]',
    crimson: 'stroke-[#f0b184]',
  },
  ink: {
    none: 'stroke-none',
    ink: 'stroke-sheet-ink',
    ink2: 'stroke-[#333]',
    card: 'stroke-sheet',
    well: 'stroke-[#f1f1f1]',
    edge: 'stroke-[#888]',
    rule: 'stroke-[#ccc]',
    enamel: 'stroke-sheet-ink',
    'enamel-wash': 'stroke-[#ddd]',
    copper: 'stroke-[#777]',
    'copper-lite': 'stroke-[#aaa]',
    'copper-deep': 'stroke-[#444]',
    crimson: 'stroke-sheet-ink',
  },
};

const faces = { text: 'font-text', figures: 'font-figures', display: 'font-display' } as const;

export type SvgDrawingProps = {
  drawing: Drawing;
  scheme?: Scheme;
  /** CSS pixels; the other side follows the drawing. Without either it takes the width it is given. */
  width?: number;
  height?: number;
  /** Ink lines keep their width in pixels however large the drawing: for posters. Wire still grows with its coil. */
  steadyLines?: boolean;
  className?: string;
};

export function SvgDrawing({
  drawing,
  scheme = 'screen',
  width,
  height,
  steadyLines = false,
  className = '',
}: SvgDrawingProps) {
  const ratio = drawing.width / drawing.height;
  const size =
    width !== undefined
      ? { width, height: height ?? width / ratio }
      : height !== undefined
        ? { width: height * ratio, height }
        : { width: '100%' };
  const name = drawing.title === null ? { 'aria-hidden': true } : { role: 'img', 'aria-label': drawing.title };
  return (
    <svg viewBox={`0 0 ${drawing.width} ${drawing.height}`} {...size} {...name} className={className}>
      <Shapes shapes={drawing.shapes} look={{ scheme, steadyLines }} />
    </svg>
  );
}

type Look = { scheme: Scheme; steadyLines: boolean };

function Shapes({ shapes, look }: { shapes: readonly Shape[]; look: Look }) {
  return shapes.map((shape, index) =>
    shape.kind === 'group' ? (
      <g key={index} transform={transformOf(shape.move)}>
        <Shapes shapes={shape.shapes} look={look} />
      </g>
    ) : (
      <One key={index} shape={shape} look={look} />
    ),
  );
}

function One({ shape, look }: { shape: Geometry & Paint; look: Look }) {
  const { scheme, steadyLines } = look;
  const paint = {
    className: `${fills[scheme][shape.fill ?? 'none']} ${strokes[scheme][shape.stroke ?? 'none']}`,
    ...(shape.stroke !== undefined && { strokeWidth: shape.line ?? 1 }),
    ...(steadyLines && shape.stroke === 'ink' && { vectorEffect: 'non-scaling-stroke' as const }),
    ...(shape.dash !== undefined && { strokeDasharray: shape.dash }),
    ...(shape.roundEnds === true && { strokeLinecap: 'round' as const, strokeLinejoin: 'round' as const }),
    ...(shape.opacity !== undefined && { opacity: shape.opacity }),
  };
  switch (shape.kind) {
    case 'path':
      return <path d={shape.d} {...paint} />;
    case 'rect':
      return <rect x={shape.x} y={shape.y} width={shape.width} height={shape.height} rx={shape.radius} {...paint} />;
    case 'circle':
      return <circle cx={shape.cx} cy={shape.cy} r={shape.r} {...paint} />;
    case 'ellipse':
      return <ellipse cx={shape.cx} cy={shape.cy} rx={shape.rx} ry={shape.ry} {...paint} />;
    case 'line':
      return <line x1={shape.x1} y1={shape.y1} x2={shape.x2} y2={shape.y2} {...paint} />;
    case 'text':
      return (
        <text
          x={shape.x}
          y={shape.y}
          fontSize={shape.size}
          textAnchor={shape.anchor ?? 'start'}
          {...(shape.turn !== undefined && { transform: `rotate(${shape.turn} ${shape.x} ${shape.y})` })}
          {...paint}
          className={`${paint.className} ${faces[shape.face ?? 'text']} ${shape.bold === true ? 'font-bold' : ''}`}
        >
          {shape.text}
        </text>
      );
  }
}
