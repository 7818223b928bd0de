import type { ReactNode } from 'react';
import { classes } from '@/components/ui/classes';

export type PartLabelProps = {
  /** Reference on the board, such as "L1". */
  reference: string;
  /** The part's silhouette, about 52 px wide. */
  drawing: ReactNode;
  name: ReactNode;
  /** Its make-up, or why it matters now: "49 turns, 0.4 mm", "cause of the shortfall". */
  detail?: ReactNode;
  value?: string | undefined;
  unit?: string | undefined;
  /** Half width of the tolerance, percent; null where there is none to speak of. */
  tolerance?: number | null | undefined;
  /** What the lot in stock measured, percent away from the nominal. */
  measured?: number | undefined;
  /** `stops` for the line that causes a shortfall, `empty` for a line not filled, `chosen` for the one in the side pane. */
  look?: 'plain' | 'stops' | 'empty' | 'chosen';
  /** At the right end: a button, a count. */
  aside?: ReactNode;
  className?: string;
};

const looks = {
  plain: 'border border-rule bg-card',
  stops: 'border border-crimson bg-card shadow-[-4px_0_0_var(--crimson)] outline-1 outline-crimson',
  empty: 'border-1.5 border-dashed border-edge bg-transparent',
  chosen: 'border border-enamel bg-card outline-3 outline-enamel',
} as const;

/** One parts line, drawn as a label in its holder. */
export function PartLabel(props: PartLabelProps) {
  const {
    reference,
    drawing,
    name,
    detail,
    value,
    unit,
    tolerance,
    measured,
    look = 'plain',
    aside,
    className,
  } = props;
  return (
    <div className={classes('@container', className)}>
      <div
        className={classes(
          'relative grid min-h-14 grid-cols-[64px_1fr_auto] items-center gap-x-3 rounded-label py-[3px] pr-3 @min-[440px]:grid-cols-[64px_1fr_auto_86px]',
          looks[look],
        )}
      >
        <span
          className={classes(
            'label-holder ml-1 grid h-[50px] place-items-center overflow-hidden bg-well',
            look === 'empty' && '*:opacity-35',
          )}
        >
          {drawing}
        </span>
        <span className="absolute top-[3px] left-1.5 rounded-[2px] border border-edge bg-card px-1 font-figures text-axis leading-[14px] font-semibold">
          {reference}
        </span>
        <span className="min-w-0 leading-5">
          <b className="block">{name}</b>
          {detail !== undefined && (
            <span className={classes('block text-head', look === 'stops' ? 'font-semibold text-crimson' : 'text-ink2')}>
              {detail}
            </span>
          )}
        </span>
        <span className="text-right whitespace-nowrap">
          {value !== undefined && (
            <>
              <span className="font-figures text-value font-semibold">{value}</span>
              {unit !== undefined && <span className="ml-1 text-head text-ink2">{unit}</span>}
              {typeof tolerance === 'number' && (
                <span className="block text-axis text-ink2 @min-[440px]:hidden">±{tolerance} %</span>
              )}
            </>
          )}
        </span>
        <span className="hidden justify-items-center @min-[440px]:grid">
          {aside ??
            (tolerance === undefined || tolerance === null ? (
              <span className="text-head text-ink2">no value</span>
            ) : (
              <ToleranceWhisker tolerance={tolerance} measured={measured} />
            ))}
        </span>
      </div>
    </div>
  );
}

/** Half width of the whisker's axis, percent: the same on every line, so that spreads can be compared by eye. */
const AXIS = 10;
const WIDTH = 80;
const x = (percentAway: number) =>
  Math.round((40 + (Math.max(-AXIS, Math.min(AXIS, percentAway)) / AXIS) * 38) * 10) / 10;

export function ToleranceWhisker({ tolerance, measured }: { tolerance: number; measured?: number | undefined }) {
  const at = measured ?? 0;
  const isBeyond = tolerance > AXIS;
  const left = x(-tolerance);
  const right = x(tolerance);
  const ends = isBeyond
    ? `M${left + 5} 2.5L${left} 6l5 3.5M${right - 5} 2.5L${right} 6l-5 3.5`
    : `M${left} 2.5V9.5M${right} 2.5V9.5`;
  const said =
    measured === undefined ? '' : `, measured ${measured >= 0 ? 'plus' : 'minus'} ${Math.abs(measured)} percent`;
  return (
    <span className="grid justify-items-center">
      <svg
        role="img"
        aria-label={`Tolerance plus or minus ${tolerance} percent${said}`}
        width={WIDTH}
        height="12"
        viewBox={`0 0 ${WIDTH} 12`}
      >
        <path d={`M0 6H${WIDTH}`} className="stroke-rule" />
        <path d="M40 1V11" className="stroke-edge" />
        <path d={`M${left} 6H${right}${ends}`} fill="none" className="stroke-ink" strokeWidth="1.6" />
        <path d={`M${x(at)} 2l3.400 4-3.400 4-3.400-4Z`} className="fill-copper stroke-ink" />
      </svg>
      <span aria-hidden className="text-axis text-ink2">
        ±<span className="font-figures">{tolerance}</span> %
      </span>
    </span>
  );
}
