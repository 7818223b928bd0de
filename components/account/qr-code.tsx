import type { QrView } from '@/services/people/schemas';

/** Squares around a code that stay light, so that a camera finds its edge (ISO/IEC 18004: four). */
const quiet = 4;

/** Dark on white in both themes: cameras read it so. */
export function QrCode({ qr, label }: { qr: QrView; label: string }) {
  const side = qr.size + 2 * quiet;
  return (
    <svg
      role="img"
      aria-label={label}
      viewBox={`${-quiet} ${-quiet} ${side} ${side}`}
      shapeRendering="crispEdges"
      className="size-56 max-w-full"
    >
      <rect x={-quiet} y={-quiet} width={side} height={side} className="fill-sheet" />
      <path d={qr.path} className="fill-sheet-ink" />
    </svg>
  );
}
