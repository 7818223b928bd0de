import { classes } from '@/components/ui/classes';

export type VersionState = 'draft' | 'in-check' | 'released' | 'held' | 'withdrawn';

export const stateWords: Record<VersionState, string> = {
  draft: 'Draft',
  'in-check': 'In check',
  released: 'Released',
  held: 'Held',
  withdrawn: 'Withdrawn',
};

const tones: Record<VersionState, string> = {
  draft: 'text-copper-ink',
  'in-check': 'text-enamel',
  released: 'text-pine',
  held: 'text-crimson',
  withdrawn: 'text-ink2',
};

export type WindingMarkProps = {
  state: VersionState;
  /** A second word after the state: "to review", "superseded". */
  also?: string | undefined;
  /** Pixels across the drawing; 46 at least. */
  width?: number;
  /** The word under the drawing instead of beside it. */
  stacked?: boolean;
  className?: string;
};

/** The state of a version as a coil of five turns, always with its word. */
export function WindingMark({ state, also, width = 46, stacked = false, className }: WindingMarkProps) {
  return (
    <span
      className={classes(
        'inline-flex whitespace-nowrap text-caption',
        stacked ? 'flex-col items-start gap-2' : 'items-center gap-2',
        className,
      )}
    >
      <Winding state={state} width={Math.max(46, width)} />
      <b className={tones[state]}>
        {stateWords[state]}
        {also !== undefined && `, ${also}`}
      </b>
    </span>
  );
}

/** Middles of the five turns, in a box of 110 by 60. */
const TURNS = [20.06, 33.79, 47.52, 61.25, 74.98] as const;
const wound: Record<VersionState, readonly number[]> = {
  draft: [0, 1],
  'in-check': [0, 1, 2, 3],
  released: [0, 1, 2, 3, 4],
  held: [0, 1, 3, 4],
  withdrawn: [0, 1, 2, 3, 4],
};

function Winding({ state, width }: { state: VersionState; width: number }) {
  const turns = wound[state];
  return (
    <svg aria-hidden className="shrink-0" width={width} height={(width * 60) / 113} viewBox="0 0 113 60">
      <path d="M2.2 30H94.6" className="stroke-edge/35" strokeWidth="11.9" strokeLinecap="round" />
      {TURNS.map((cx, index) =>
        turns.includes(index) ? (
          <ellipse
            key={cx}
            cx={cx}
            cy="30"
            rx="6"
            ry="17.8"
            fill="none"
            className={state === 'withdrawn' ? 'stroke-edge' : 'stroke-copper'}
            strokeWidth="5.5"
          />
        ) : (
          state !== 'held' && (
            <ellipse
              key={cx}
              cx={cx}
              cy="30"
              rx="6"
              ry="17.8"
              fill="none"
              className="stroke-edge"
              strokeWidth="1.6"
              strokeDasharray="2 2.4"
            />
          )
        ),
      )}
      <End state={state} />
    </svg>
  );
}

function End({ state }: { state: VersionState }) {
  const round = { fill: 'none', strokeLinecap: 'round', strokeLinejoin: 'round' } as const;
  switch (state) {
    case 'draft':
      return <path d="M39.3 47.6q8.8 11.9 22 4.7" {...round} className="stroke-copper" strokeWidth="3" />;
    case 'in-check':
      return <path d="M99 50V12m-8 9.5l8-9.5l8 9.5" {...round} className="stroke-enamel" strokeWidth="4" />;
    case 'released':
      return (
        <>
          <circle cx="95.7" cy="30" r="16" className="fill-pine" />
          <path d="M88 30l5.6 6l9.2-11.5" {...round} className="stroke-card" strokeWidth="3.4" />
        </>
      );
    case 'held':
      return (
        <>
          <path d="M42 12l4.4 10.7M53 47.6l-4.4-10.7" {...round} className="stroke-crimson" strokeWidth="3.4" />
          <path d="M111.6 36.6L102.3 45.9H89.1L79.8 36.6V23.4L89.1 14.1h13.2l9.3 9.3Z" className="fill-crimson" />
          <path d="M87 30h17.4" className="stroke-card" strokeWidth="4" />
        </>
      );
    case 'withdrawn':
      return <path d="M2.2 53.8L92.4 6.2" {...round} className="stroke-ink2" strokeWidth="3" />;
  }
}
