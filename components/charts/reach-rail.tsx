import { useId } from 'react';
import {
  axisFor,
  pinFit,
  place,
  shortfall,
  shownDifference,
  shownEdge,
  shownKHz,
  type Axis,
  type ReachView,
  type Station,
} from '@/templates/drawings/reach-axis';
import {
  contourPath,
  railLayouts,
  stationRows,
  type RailLayout,
  type RailSize,
} from '@/templates/drawings/reach-layout';
import { reachSentence } from '@/templates/drawings/reach-sentence';
import { Bar, Brackets } from './rail-bars';
import { Pin } from './rail-pin';
import { railTones, type RailTone } from './rail-tones';

export type ReachRailProps = ReachView & {
  size?: RailSize;
  /** `plate` on enamel grounds. Paper and one ink follow from the size. */
  ground?: 'paper' | 'plate';
  /** The station ringed in copper, by its frequency in hertz. */
  chosen?: number | undefined;
  /** Says beside each bracket what lies over: "spare 80". */
  showSpare?: boolean;
  className?: string;
};

/** Percent of the rail's width: the drawing stretches, its lines and words do not. */
const percent = (share: number) => `${Math.round(share * 10000) / 100}%`;

export function ReachRail(props: ReachRailProps) {
  const { size = 'bench', ground = 'paper', chosen, showSpare = false, className = '', ...view } = props;
  const layout = railLayouts[size];
  const axis = axisFor(view.band);
  const tone = railTones[size === 'print' ? 'print' : ground];
  const hatchId = useId();
  const stations = view.stations ?? [];
  const named = layout.names ? stationRows(axis, stations, 1180) : [];

  return (
    <div className={`@container min-w-0 ${className}`}>
      <svg
        role="img"
        aria-label={reachSentence(view)}
        width="100%"
        height={layout.height}
        className={`block overflow-visible ${size === 'front' ? 'h-[126px] @min-[820px]:h-[172px]' : ''}`}
      >
        <defs>
          <pattern id={hatchId} width="5" height="5" patternTransform="rotate(45)" patternUnits="userSpaceOnUse">
            <rect width="5" height="5" className={tone.ground} />
            <path d="M0 0V5" className={tone.hatch} strokeWidth="2.4" />
          </pattern>
        </defs>
        <line x1="0" x2="100%" y1={layout.axis} y2={layout.axis} className={tone.axis} strokeWidth={layout.axisLine} />
        {layout.contour && view.contour && <Chance axis={axis} contour={view.contour} layout={layout} tone={tone} />}
        <Bar view={view} axis={axis} layout={layout} tone={tone} hatch={`url(#${hatchId})`} />
        <Brackets band={view.band} axis={axis} layout={layout} tone={tone} />
        {layout.pin &&
          stations
            .filter((station) => station.f >= axis.lo && station.f <= axis.hi)
            .map((station) => (
              <Pin
                key={`${station.name} ${station.f}`}
                at={percent(place(axis, station.f))}
                fit={pinFit(view, station.f)}
                isChosen={station.f === chosen}
                pin={layout.pin}
                tone={tone}
              />
            ))}
        {layout.scale && <Scale axis={axis} at={layout.scale.at} size={layout.scale.size} tone={tone} />}
        {layout.ends && <Ends view={view} axis={axis} layout={layout} tone={tone} showSpare={showSpare} />}
        {named.map(
          (station) => station.row !== null && <Name key={station.f} {...station} layout={layout} tone={tone} />,
        )}
      </svg>
    </div>
  );
}

/** The contour is a path, so it stretches inside a box of its own whose lines keep their width. */
function Chance(props: { axis: Axis; contour: NonNullable<ReachView['contour']>; layout: RailLayout; tone: RailTone }) {
  const { axis, contour, layout, tone } = props;
  if (!layout.contour) return null;
  const height = layout.contour.foot - layout.contour.top;
  const paths = contourPath({ axis, contour, across: 1000, top: 0, foot: height });
  if (!paths) return null;
  return (
    <svg
      x="0"
      y={layout.contour.top}
      width="100%"
      height={height}
      viewBox={`0 0 1000 ${height}`}
      preserveAspectRatio="none"
      overflow="visible"
    >
      <path d={paths.area} className={tone.chance} />
      <path
        d={paths.line}
        fill="none"
        className={tone.chanceLine}
        strokeWidth={layout.contour.line}
        vectorEffect="non-scaling-stroke"
      />
    </svg>
  );
}

/** Under 400 px the scale keeps every second figure or fewer. The unit stands once, on the last. */
function Scale({ axis, at, size, tone }: { axis: Axis; at: number; size: number; tone: RailTone }) {
  const last = axis.ticks.at(-1);
  const few = new Set(axis.fewTicks);
  const lastFew = axis.fewTicks.at(-1);
  return (
    <g className={`font-figures ${tone.text2}`} fontSize={size} textAnchor="middle">
      {axis.ticks.map((f) => (
        <text key={f} x={percent(place(axis, f))} y={at} className={few.has(f) ? '' : 'hidden @min-[400px]:block'}>
          {shownKHz(f)}
          {f === last && <tspan className={f === lastFew ? 'hidden @min-[400px]:inline' : ''}>{' kHz'}</tspan>}
        </text>
      ))}
    </g>
  );
}

function Ends(props: { view: ReachView; axis: Axis; layout: RailLayout; tone: RailTone; showSpare: boolean }) {
  const { view, axis, layout, tone, showSpare } = props;
  if (!layout.ends) return null;
  const { at, size, under } = layout.ends;
  const [left, right] = [place(axis, view.band.lo), place(axis, view.band.hi)];
  if (under) {
    return (
      <g className={`font-figures ${tone.text}`} fontSize={size}>
        <text x={percent(left)} y={at} textAnchor="start">
          {shownEdge(view.band.lo)}
        </text>
        <text
          x={percent(right)}
          y={at}
          textAnchor={right - left < 0.4 ? 'start' : 'end'}
          dx={right - left < 0.4 ? 4 : 0}
        >
          {shownEdge(view.band.hi)} kHz
        </text>
      </g>
    );
  }
  const short = shortfall(view);
  const spare = showSpare && view.worst ? view.worst : null;
  const lowRemark = remark(short.low, spare && view.band.lo - spare.lo);
  const highRemark = remark(short.high, spare && spare.hi - view.band.hi);
  return (
    <g fontSize={size} className="font-text font-semibold">
      <text x={percent(left)} y={at} textAnchor="start" className={tone.band}>
        <tspan className={lowRemark && highRemark ? 'hidden @min-[420px]:inline' : ''}>band </tspan>
        {shownEdge(view.band.lo)}
        {lowRemark && (
          <tspan dx="14" className={lowRemark.isShort ? `font-bold ${tone.short}` : tone.text}>
            {lowRemark.words}
          </tspan>
        )}
      </text>
      <text x={percent(right)} y={at} textAnchor="end" className={tone.band}>
        {highRemark && (
          <tspan className={highRemark.isShort ? `font-bold ${tone.short}` : tone.text}>{highRemark.words}</tspan>
        )}
        <tspan dx={highRemark ? 14 : 0}>{shownEdge(view.band.hi)}</tspan>
        <tspan className={lowRemark && highRemark ? 'hidden @min-[420px]:inline' : ''}> kHz</tspan>
      </text>
    </g>
  );
}

function remark(short: number, spare: number | null): { words: string; isShort: boolean } | null {
  if (short > 0) return { words: `short by ${shownDifference(short)}`, isShort: true };
  return spare !== null && spare > 0 ? { words: `spare ${shownDifference(spare)}`, isShort: false } : null;
}

type NameProps = Station & { at: number; row: 0 | 1 | null; layout: RailLayout; tone: RailTone };

function Name({ name, f, at, row, layout, tone }: NameProps) {
  if (!layout.names || row === null) return null;
  const y = layout.names[row];
  return (
    <g textAnchor="middle" className="hidden @min-[820px]:block">
      <text x={percent(at)} y={y} fontSize="13" className={`font-text font-semibold ${tone.text}`}>
        {name}
      </text>
      <text x={percent(at)} y={y + 14} fontSize="11" className={`font-figures ${tone.text2}`}>
        {shownKHz(f)}
      </text>
    </g>
  );
}
