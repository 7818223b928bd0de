import { Disclosure } from '@/components/ui/disclosure';
import { Table } from '@/components/ui/table';
import { axisFor, place, shownKHz, type Axis, type Span, type Station } from '@/templates/drawings/reach-axis';
import {
  curvePath,
  DB_LINES,
  levelAt,
  peakOf,
  PLOT,
  responseSentence,
  settingWords,
  type ResponseSetting,
} from './response-shape';

export type ResponseCurveProps = {
  /** The band asked for: it sets the same ends as the rail above. */
  band: Span;
  settings: readonly ResponseSetting[];
  /** The setting drawn in enamel, by its frequency; the first one without it. */
  chosen?: number | undefined;
  /** Dotted lines up from the rail's pins. */
  stations?: readonly Station[];
  /** Bench measurements: drawn as needles, never joined. Hertz and dB. */
  measured?: readonly { f: number; db: number }[];
  /** What was taken for granted: "Coil quality taken as 160, detector load 80 kΩ." */
  model: string;
};

const percent = (axis: Axis, f: number) => `${Math.round(place(axis, f) * 10000) / 100}%`;

export function ResponseCurve(props: ResponseCurveProps) {
  const { band, settings, chosen, stations = [], measured = [], model } = props;
  const axis = axisFor(band);
  const front = settings.find((setting) => setting.f === chosen) ?? settings[0];
  const others = settings.filter((setting) => setting !== front);
  const last = others.at(-1);
  const few = new Set(axis.fewTicks);
  return (
    <figure className="@container min-w-0">
      <svg
        role="img"
        aria-label={responseSentence(settings, chosen)}
        width="100%"
        height={PLOT.height}
        className="block overflow-visible"
      >
        {DB_LINES.map((db) => (
          <line key={db} x2="100%" y1={levelAt(db)} y2={levelAt(db)} className="stroke-rule" />
        ))}
        {stations.map((station) => (
          <line
            key={station.f}
            x1={percent(axis, station.f)}
            x2={percent(axis, station.f)}
            y1={PLOT.top}
            y2={PLOT.floor}
            className="stroke-rule"
            strokeDasharray="1 4"
          />
        ))}
        <svg width="100%" height={PLOT.height} viewBox={`0 0 1000 ${PLOT.height}`} preserveAspectRatio="none">
          {others.map((setting) => (
            <Curve key={setting.f} d={curvePath(axis, setting.curve)} className="stroke-edge" line={1.4} />
          ))}
          {front && (
            <>
              <path d={`${curvePath(axis, front.curve)}Z`} className="fill-enamel-wash/80" />
              <Curve d={curvePath(axis, front.curve)} className="stroke-enamel" line={2.6} />
            </>
          )}
        </svg>
        {measured.map((point) => (
          <svg key={point.f} x={percent(axis, point.f)} overflow="visible">
            <path d={`M0 ${PLOT.floor}V${levelAt(point.db)}`} className="stroke-ink" strokeWidth="2" />
            <path d={`M-4 ${levelAt(point.db) - 5}h8l-4 6Z`} className="fill-ink" />
          </svg>
        ))}
        <g className="fill-ink2 font-figures" fontSize="11">
          {DB_LINES.map((db) => (
            <text key={db} x="0" y={levelAt(db) - 4}>
              {db === 0 ? '0 dB' : `−${-db}`}
            </text>
          ))}
          {axis.ticks.map((f) => (
            <text
              key={f}
              x={percent(axis, f)}
              y={PLOT.scale}
              textAnchor="middle"
              className={few.has(f) ? '' : 'hidden @min-[400px]:block'}
            >
              {shownKHz(f)}
              {f === axis.ticks.at(-1) && ' kHz'}
            </text>
          ))}
        </g>
        {last && front && last !== front && (
          <text
            x={percent(axis, last.f)}
            y={levelAt(peakOf(last)) - 6}
            textAnchor={anchorAt(place(axis, last.f))}
            fontSize="12"
            className="hidden fill-ink2 font-text @min-[560px]:block"
          >
            {settingWords(last)}
          </text>
        )}
        {front && (
          <>
            <circle
              cx={percent(axis, front.f)}
              cy={levelAt(peakOf(front))}
              r="4.5"
              className="fill-copper stroke-ink"
              strokeWidth="1.3"
            />
            <text
              x={percent(axis, front.f)}
              y={levelAt(peakOf(front)) - 8}
              textAnchor={anchorAt(place(axis, front.f))}
              fontSize="13"
              className="fill-enamel font-text font-bold"
            >
              {settingWords(front)}
            </text>
          </>
        )}
      </svg>
      <figcaption className="flex flex-wrap items-baseline gap-x-4 text-head text-ink2">
        <span>{model}</span>
        <ResponseTable settings={settings} />
      </figcaption>
    </figure>
  );
}

/** A label near an end leans inwards. */
function anchorAt(along: number): 'start' | 'middle' | 'end' {
  if (along < 0.2) return 'start';
  return along > 0.8 ? 'end' : 'middle';
}

function Curve({ d, className, line }: { d: string; className: string; line: number }) {
  return d === '' ? null : (
    <path d={d} fill="none" className={className} strokeWidth={line} vectorEffect="non-scaling-stroke" />
  );
}

function ResponseTable({ settings }: { settings: readonly ResponseSetting[] }) {
  return (
    <Disclosure summary="Show as table" of="of the response">
      <Table
        caption="Response at each dial setting"
        density="tight"
        columns={[
          {
            key: 'name',
            head: 'Setting',
            isRowHead: true,
            cell: ({ name, f }: ResponseSetting) => name ?? `${shownKHz(f)} kHz`,
          },
          { key: 'f', head: 'Tuned to, kHz', figures: true, cell: ({ f }: ResponseSetting) => shownKHz(f) },
          {
            key: 'peak',
            head: 'Peak, dB',
            figures: true,
            cell: (setting: ResponseSetting) => decibels(peakOf(setting)),
          },
          {
            key: 'width',
            head: 'Width at −3 dB, kHz',
            figures: true,
            cell: ({ width }: ResponseSetting) => (width === null ? 'none' : (width / 1000).toFixed(1)),
          },
        ]}
        rows={settings}
        rowKey={(setting) => String(setting.f)}
      />
    </Disclosure>
  );
}

const decibels = (db: number) => (db < 0 ? `−${Math.abs(db).toFixed(1)}` : db.toFixed(1));
