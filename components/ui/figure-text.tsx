import type { ReactNode } from 'react';
import { classes } from './classes';

export type FigureTextProps = {
  /** The number as shown: grouped and rounded by the caller. */
  value: ReactNode;
  unit?: ReactNode;
  /** Keeps the unit in a column of its own, so that numbers under each other align. */
  inColumn?: boolean;
  bold?: boolean;
  className?: string;
};

/** A number in the figures face, its unit in the text face after a thin gap. */
export function FigureText({ value, unit, inColumn = false, bold = true, className }: FigureTextProps) {
  return (
    <span className={classes('whitespace-nowrap', className)}>
      <span className={classes('font-figures', bold && 'font-semibold')}>{value}</span>
      {unit !== undefined && (
        <span className={classes('ml-1 text-head text-ink2', inColumn && 'inline-block w-7 text-left')}>{unit}</span>
      )}
    </span>
  );
}

export type FactsProps = { facts: readonly { term: ReactNode; value: ReactNode }[]; className?: string };

/** Short facts in two columns: the term in second ink, the value in bold. */
export function Facts({ facts, className }: FactsProps) {
  return (
    <dl className={classes('grid grid-cols-[auto_1fr] gap-x-4.5 gap-y-2 text-table', className)}>
      {facts.map(({ term, value }, index) => (
        <div key={index} className="contents">
          <dt className="text-ink2">{term}</dt>
          <dd className="font-semibold">{value}</dd>
        </div>
      ))}
    </dl>
  );
}
