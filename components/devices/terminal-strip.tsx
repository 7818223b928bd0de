import type { ReactNode } from 'react';
import { classes } from '@/components/ui/classes';

export type StripStage = {
  /** "Packed". */
  name: string;
  /** "Tue 1 Dec, 11:20". */
  when?: ReactNode;
  detail?: ReactNode;
};

export type TerminalStripProps = {
  stages: readonly StripStage[];
  /** How many screws have their wire; the last of them is now. 0: none yet. */
  done: number;
  /** What the strip is about, for readers: "Your order". */
  label: string;
  /** The order has ended: the last screw done is not "now" but the end. */
  isFinished?: boolean;
};

/** Progress as a strip of screws; lying from 600 px, standing on phones. The list under it says the same. */
export function TerminalStrip({ stages, done, label, isFinished = false }: TerminalStripProps) {
  const now = isFinished ? -1 : done - 1;
  return (
    <div className="grid grid-cols-[76px_1fr] gap-x-2 sm:block">
      <LyingStrip count={stages.length} done={done} now={now} />
      <StandingStrip count={stages.length} done={done} now={now} />
      <ol aria-label={label} className={classes('sm:mt-2 sm:grid', columns[stages.length] ?? 'sm:grid-cols-5')}>
        {stages.map((stage, index) => (
          <li
            key={stage.name}
            aria-current={index === now ? 'step' : undefined}
            className={classes(
              'h-[70px] pt-3.5 leading-[21px] sm:h-auto sm:px-1 sm:pt-0 sm:text-center',
              index === now ? 'text-enamel' : index < done ? 'text-ink' : 'text-ink2',
            )}
          >
            <b className="block text-floor">
              {stage.name}
              {index === now && ', now'}
              {index >= done && <span className="sr-only">, not yet</span>}
            </b>
            {stage.when !== undefined && <span className="block">{stage.when}</span>}
            {stage.detail !== undefined && <span className="hidden text-head text-ink2 sm:block">{stage.detail}</span>}
          </li>
        ))}
      </ol>
    </div>
  );
}

const columns: Record<number, string> = {
  2: 'sm:grid-cols-2',
  3: 'sm:grid-cols-3',
  4: 'sm:grid-cols-4',
  5: 'sm:grid-cols-5',
  6: 'sm:grid-cols-6',
  7: 'sm:grid-cols-7',
};

type StripProps = { count: number; done: number; now: number };

/** Each stage takes 248 of width, as the list's columns do. */
const PITCH = 248;

function LyingStrip({ count, done, now }: StripProps) {
  const width = count * PITCH;
  const x = (index: number) => PITCH / 2 + index * PITCH;
  return (
    <svg aria-hidden className="hidden w-full sm:block" viewBox={`0 0 ${width} 104`}>
      <rect x="10" y="18" width={width - 20} height="72" rx="8" className="fill-well stroke-ink" strokeWidth="1.6" />
      {[34, width - 34].map((hole) => (
        <circle key={hole} cx={hole} cy="54" r="6" className="fill-card stroke-ink" strokeWidth="1.3" />
      ))}
      {done > 0 && <path d={`M0 78C40 78 60 54 ${x(0) - 24} 54`} className="fill-none stroke-copper" strokeWidth="5" />}
      {Array.from({ length: Math.max(0, done - 1) }, (_, index) => (
        <path
          key={index}
          d={`M${x(index) + 23} 54c57 ${index % 2 === 0 ? -14 : 14} 145 ${index % 2 === 0 ? 14 : -14} 202 0`}
          pathLength="1"
          className={classes('fill-none stroke-copper', index === done - 2 && 'draw-wire')}
          strokeWidth="5"
        />
      ))}
      {done > 0 && done < count && (
        <>
          <path
            d={`M${x(done - 1) + 23} 54c37 -4 61 -18 81 -12`}
            className="fill-none stroke-copper"
            strokeWidth="5"
            strokeLinecap="round"
          />
          <path d={`M${x(done - 1) + 104} 42l12 5`} className="stroke-ink" strokeWidth="3" strokeLinecap="round" />
        </>
      )}
      {Array.from({ length: count }, (_, index) => (
        <Screw key={index} cx={x(index)} cy={54} scale={1} state={screwState(index, done, now)} />
      ))}
    </svg>
  );
}

function StandingStrip({ count, done, now }: StripProps) {
  const height = count * 70 + 12;
  const y = (index: number) => 38 + index * 70;
  return (
    <svg aria-hidden className="sm:hidden" width="70" height={height} viewBox={`0 0 70 ${height}`}>
      <rect x="6" y="4" width="56" height={height - 8} rx="8" className="fill-well stroke-ink" strokeWidth="1.5" />
      {Array.from({ length: Math.max(0, done - 1) }, (_, index) => (
        <path key={index} d={`M34 ${y(index) + 18}V${y(index + 1) - 18}`} className="stroke-copper" strokeWidth="5" />
      ))}
      {done > 0 && done < count && (
        <path
          d={`M34 ${y(done - 1) + 20}c0 12 10 14 8 24`}
          className="fill-none stroke-copper"
          strokeWidth="5"
          strokeLinecap="round"
        />
      )}
      {Array.from({ length: count }, (_, index) => (
        <Screw key={index} cx={34} cy={y(index)} scale={0.78} state={screwState(index, done, now)} />
      ))}
    </svg>
  );
}

type ScrewState = 'done' | 'now' | 'open';

const screwState = (index: number, done: number, now: number): ScrewState =>
  index === now ? 'now' : index < done ? 'done' : 'open';

function Screw({ cx, cy, scale, state }: { cx: number; cy: number; scale: number; state: ScrewState }) {
  return (
    <g transform={`translate(${cx} ${cy}) scale(${scale})`}>
      {state === 'open' ? (
        <>
          <circle r="19" className="fill-card stroke-edge" strokeWidth="2" strokeDasharray="4 3.5" />
          <circle r="5" className="fill-none stroke-edge" strokeWidth="1.8" />
        </>
      ) : (
        <>
          <circle r="23.5" className="fill-none stroke-copper" strokeWidth="5" />
          <circle
            r="19"
            className={classes('stroke-ink', state === 'now' ? 'fill-plate' : 'fill-copper-lite')}
            strokeWidth="1.6"
          />
          <path
            d="M-11 6L11 -6"
            className={state === 'now' ? 'stroke-on-enamel' : 'stroke-[#161b2b]'}
            strokeWidth="4"
          />
        </>
      )}
    </g>
  );
}
