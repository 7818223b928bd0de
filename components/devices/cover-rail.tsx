import { useId } from 'react';

export type CoverRailProps = {
  /** Weeks in hand at the present rate. */
  weeks: number;
  /** Weeks it takes to restock. */
  restock: number;
  /** The end of the scale, weeks; the same for all rows of a table. */
  scale?: number;
  className?: string;
};

export function coverSentence({ weeks, restock }: Pick<CoverRailProps, 'weeks' | 'restock'>): string {
  const gap = restock - weeks;
  const said = `${weeks} weeks in hand, ${restock} to restock`;
  return gap > 0 ? `${said}: short by ${Math.round(gap * 10) / 10} weeks.` : `${said}.`;
}

const percent = (weeks: number, scale: number) => Math.round(Math.min(1, Math.max(0, weeks / scale)) * 10000) / 100;

/** Weeks in hand as a bar, a bracket at the time to restock, the gap hatched. */
export function CoverRail({ weeks, restock, scale = 16, className = '' }: CoverRailProps) {
  const id = useId();
  const [hand, mark] = [percent(weeks, scale), percent(restock, scale)];
  return (
    <svg
      role="img"
      aria-label={coverSentence({ weeks, restock })}
      width="100%"
      height="24"
      className={`block min-w-24 overflow-visible ${className}`}
    >
      <defs>
        <pattern id={id} width="5" height="5" patternTransform="rotate(45)" patternUnits="userSpaceOnUse">
          <rect width="5" height="5" className="fill-card" />
          <path d="M0 0V5" className="stroke-crimson" strokeWidth="2.4" />
        </pattern>
      </defs>
      <line x2="100%" y1="12" y2="12" className="stroke-rule" />
      {hand < mark && (
        <rect
          x={`${hand}%`}
          y="7"
          width={`${mark - hand}%`}
          height="10"
          fill={`url(#${id})`}
          className="stroke-crimson"
          strokeWidth="1.3"
        />
      )}
      <rect y="6" width={`${hand}%`} height="12" className="rail-slide fill-enamel" />
      <svg x={`${mark}%`} overflow="visible">
        <path d="M-5 2H0V22H-5" fill="none" className="stroke-copper" strokeWidth="2.5" />
      </svg>
    </svg>
  );
}
