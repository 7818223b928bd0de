import type { ReactNode } from 'react';

export type ProgressProps = {
  label: ReactNode;
  done: number;
  of: number;
  /** In place of "9 of 23". */
  words?: string;
};

/** How much of a countable whole is done. An SVG bar, since its length must come from an attribute. */
export function Progress({ label, done, of, words }: ProgressProps) {
  const share = of > 0 ? Math.min(1, Math.max(0, done / of)) : 0;
  const said = words ?? `${done} of ${of}`;
  return (
    <div>
      <div className="flex items-baseline justify-between gap-4 font-bold">
        <span>{label}</span>
        <span className="font-figures font-semibold">{said}</span>
      </div>
      <svg
        role="progressbar"
        aria-label={typeof label === 'string' ? label : said}
        aria-valuemin={0}
        aria-valuemax={of}
        aria-valuenow={done}
        aria-valuetext={said}
        width="100%"
        height="14"
        className="mt-1 block overflow-hidden rounded-full border-1.5 border-ink bg-card"
      >
        <rect width={`${share * 100}%`} height="100%" className="rail-slide fill-enamel" />
      </svg>
    </div>
  );
}
