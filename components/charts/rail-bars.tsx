import { place, shortfall, type Axis, type ReachView, type Span } from '@/templates/drawings/reach-axis';
import type { RailLayout } from '@/templates/drawings/reach-layout';
import type { RailTone } from './rail-tones';

const percent = (share: number) => `${Math.round(share * 10000) / 100}%`;

type PartProps = { axis: Axis; layout: RailLayout; tone: RailTone };

/** Nominal outlined, worst case solid, shortfall hatched from bracket to bar. */
export function Bar({ view, axis, layout, tone, hatch }: PartProps & { view: ReachView; hatch: string }) {
  const { top, height } = layout.bar;
  const box = (span: Span) => ({
    x: percent(place(axis, span.lo)),
    y: top,
    width: percent(Math.max(0, place(axis, span.hi) - place(axis, span.lo))),
    height,
  });
  const short = shortfall(view);
  const { band } = view;
  return (
    <>
      {view.nominal && <rect {...box(view.nominal)} className={`rail-slide ${tone.nominal}`} strokeWidth="1.5" />}
      {view.worst && <rect {...box(view.worst)} className={`rail-slide ${tone.worst}`} />}
      {short.low > 0 && <Missing box={box({ lo: band.lo, hi: band.lo + short.low })} tone={tone} hatch={hatch} />}
      {short.high > 0 && (
        <Missing box={box({ lo: band.hi - short.high, hi: band.hi })} tone={tone} hatch={hatch} atRight />
      )}
    </>
  );
}

/** Least width a shortfall is drawn with, pixels: one of a kilohertz must still be seen. */
const LEAST = 3;

type Box = { x: string; y: number; width: string; height: number };

function Missing({
  box,
  tone,
  hatch,
  atRight = false,
}: {
  box: Box;
  tone: RailTone;
  hatch: string;
  atRight?: boolean;
}) {
  const end = `${Number.parseFloat(box.x) + Number.parseFloat(box.width)}%`;
  return (
    <>
      <svg x={atRight ? end : box.x} y={box.y} overflow="visible">
        <rect x={atRight ? -LEAST : 0} width={LEAST} height={box.height} fill={hatch} className={tone.shortEdge} />
      </svg>
      <rect {...box} fill={hatch} className={`rail-slide ${tone.shortEdge}`} strokeWidth="1.5" />
    </>
  );
}

export function Brackets({ band, axis, layout, tone }: PartProps & { band: Span }) {
  const { top, foot, tick, line } = layout.bracket;
  const bracket = (direction: number) => `M${direction * tick} ${top}H0V${foot}H${direction * tick}`;
  return (
    <g fill="none" className={tone.bracket} strokeWidth={line}>
      <svg x={percent(place(axis, band.lo))} overflow="visible">
        <path d={bracket(1)} />
      </svg>
      <svg x={percent(place(axis, band.hi))} overflow="visible">
        <path d={bracket(-1)} />
      </svg>
    </g>
  );
}
