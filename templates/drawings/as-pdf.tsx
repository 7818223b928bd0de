import { Circle, Ellipse, G, Line, Path, Rect, Svg, Text } from '@react-pdf/renderer';
import type { Drawing, Geometry, Paint, Shape, Tone } from './shapes';
import { transformOf } from './shapes';

/** `copper` where the printer has colour for the wire; `ink` prints everything in black and greys. */
export type PrintScheme = 'copper' | 'ink';

const ink: Record<Tone, string> = {
  none: 'none',
  ink: '#111111',
  ink2: '#333333',
  card: '#ffffff',
  well: '#f1f1f1',
  edge: '#888888',
  rule: '#cccccc',
  enamel: '#111111',
  'enamel-wash': '#dddddd',
  copper: '#777777',
  'copper-lite': '#aaaaaa',
  'copper-deep': '#444444',
  crimson: '#111111',
};

const tones: Record<PrintScheme, Record<Tone, string>> = {
  ink,
  copper: { ...ink, copper: '#b4602b', 'copper-lite': '#d98a52', 'copper-deep': '#8f4519' },
};

/** Family names as the documents register them, from templates/fonts; the Greek subset takes Ω, μ and π. */
const faces = { text: ['Atkinson', 'Greek'], figures: ['Martian', 'Greek'], display: ['Besley', 'Greek'] };

export type PdfDrawingProps = {
  drawing: Drawing;
  scheme?: PrintScheme;
  /** Points on paper; the other side follows the drawing. */
  width: number;
};

export function PdfDrawing({ drawing, scheme = 'copper', width }: PdfDrawingProps) {
  const height = (width * drawing.height) / drawing.width;
  return (
    <Svg width={width} height={height} viewBox={`0 0 ${drawing.width} ${drawing.height}`}>
      <PdfShapes shapes={drawing.shapes} scheme={scheme} />
    </Svg>
  );
}

function PdfShapes({ shapes, scheme }: { shapes: readonly Shape[]; scheme: PrintScheme }) {
  return shapes.map((shape, index) =>
    shape.kind === 'group' ? (
      <G key={index} transform={transformOf(shape.move)}>
        <PdfShapes shapes={shape.shapes} scheme={scheme} />
      </G>
    ) : (
      <One key={index} shape={shape} scheme={scheme} />
    ),
  );
}

function One({ shape, scheme }: { shape: Geometry & Paint; scheme: PrintScheme }) {
  const paint = {
    fill: tones[scheme][shape.fill ?? 'none'],
    ...(shape.stroke !== undefined && { stroke: tones[scheme][shape.stroke], strokeWidth: shape.line ?? 1 }),
    ...(shape.dash !== undefined && { strokeDasharray: shape.dash }),
    ...(shape.roundEnds === true && { strokeLinecap: 'round' as const, strokeLineJoin: 'round' as const }),
    ...(shape.opacity !== undefined && { opacity: shape.opacity }),
  };
  switch (shape.kind) {
    case 'path':
      return <Path d={shape.d} {...paint} />;
    case 'rect':
      return (
        <Rect
          x={shape.x}
          y={shape.y}
          width={shape.width}
          height={shape.height}
          {...(shape.radius !== undefined && { rx: shape.radius, ry: shape.radius })}
          {...paint}
        />
      );
    case 'circle':
      return <Circle cx={shape.cx} cy={shape.cy} r={shape.r} {...paint} />;
    case 'ellipse':
      return <Ellipse cx={shape.cx} cy={shape.cy} rx={shape.rx} ry={shape.ry} {...paint} />;
    case 'line':
      return <Line x1={shape.x1} y1={shape.y1} x2={shape.x2} y2={shape.y2} {...paint} />;
    case 'text':
      return (
        <Text
          x={shape.x}
          y={shape.y}
          {...(shape.turn !== undefined && { transform: `rotate(${shape.turn} ${shape.x} ${shape.y})` })}
          style={{
            fontSize: shape.size,
            fontFamily: faces[shape.face ?? 'text'],
            fontWeight:
              shape.face === 'display'
                ? 800
                : shape.bold === true
                  ? shape.face === 'figures'
                    ? 600
                    : 700
                  : shape.face === 'figures'
                    ? 500
                    : 400,
          }}
          textAnchor={shape.anchor ?? 'start'}
          fill={paint.fill}
        >
          {shape.text}
        </Text>
      );
  }
}
