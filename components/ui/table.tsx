import Link from 'next/link';
import type { ReactNode } from 'react';
import { classes } from './classes';
import { Icon } from './icon';

export type SortState = {
  /** Which way the column is sorted now; undefined: not by this column. */
  direction?: 'ascending' | 'descending' | undefined;
  /** Address that sorts by this column, or turns it round. */
  href: string;
  /** Words for the two ways, such as `['low first', 'high first']`. */
  words?: readonly [ascending: string, descending: string];
};

export type Column<Row> = {
  key: string;
  head: ReactNode;
  /** Name before the value where rows are stacked on phones; needed where `head` is not plain text. */
  name?: string;
  cell: (row: Row) => ReactNode;
  align?: 'left' | 'right';
  /** Right-aligned figures in their own face. */
  figures?: boolean;
  /** The cell names its row (`<th scope="row">`). One column a table. */
  isRowHead?: boolean;
  sort?: SortState;
  /** Head read, not shown. */
  headHidden?: boolean;
  className?: string;
};

export type TableProps<Row> = {
  /** What the table lists, for readers; shown over it with `captionShown`. */
  caption: string;
  captionShown?: boolean;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** In place of rows, where there are none. */
  empty?: ReactNode;
  /** Marks a row: chosen, or the cause of a stop. */
  rowTone?: (row: Row) => 'chosen' | 'stops' | undefined;
  /** `floor` rows are 72 px high. */
  density?: 'desk' | 'floor' | 'tight';
  foot?: ReactNode;
  className?: string;
};

const heights = { desk: 'py-2.5', floor: 'py-5 text-floor', tight: 'py-1.5' };

/** A real table. Under 600 px each row becomes lines that carry their column's name. */
export function Table<Row>(props: TableProps<Row>) {
  const {
    caption,
    captionShown = false,
    columns,
    rows,
    rowKey,
    empty,
    rowTone,
    density = 'desk',
    foot,
    className,
  } = props;
  return (
    <table className={classes('stacks w-full border-collapse text-table', className)}>
      <caption className={captionShown ? 'mb-2 text-left font-display text-panel' : 'sr-only'}>{caption}</caption>
      <thead>
        <tr>
          {columns.map((column) => (
            <Head key={column.key} column={column} />
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={rowKey(row)} className={classes('border-b border-rule', tone(rowTone?.(row)))}>
            {columns.map((column) => (
              <Cell key={column.key} column={column} row={row} padding={heights[density]} />
            ))}
          </tr>
        ))}
        {rows.length === 0 && empty !== undefined && (
          <tr>
            <td colSpan={columns.length} className="py-4">
              {empty}
            </td>
          </tr>
        )}
      </tbody>
      {foot !== undefined && <tfoot className="border-t-1.5 border-ink">{foot}</tfoot>}
    </table>
  );
}

function Head<Row>({ column }: { column: Column<Row> }) {
  const { head, sort, headHidden = false } = column;
  const isRight = column.align === 'right' || column.figures === true;
  const [up, down] = sort?.words ?? ['low first', 'high first'];
  return (
    <th
      scope="col"
      aria-sort={sort ? (sort.direction ?? 'none') : undefined}
      className={classes(
        'border-b-1.5 border-ink pt-0.5 pr-3 pb-1.5 align-bottom text-head font-semibold text-ink2 last:pr-0',
        isRight ? 'text-right' : 'text-left',
      )}
    >
      {headHidden ? (
        <span className="sr-only">{head}</span>
      ) : sort ? (
        <Link
          href={sort.href}
          className="relative inline-flex items-center gap-1 text-ink2 underline before:absolute before:-inset-3 hover:text-ink"
        >
          {head}
          {sort.direction && (
            <>
              <Icon name={sort.direction === 'ascending' ? 'up' : 'down'} size={14} />
              <span className="font-normal">{sort.direction === 'ascending' ? up : down}</span>
            </>
          )}
        </Link>
      ) : (
        head
      )}
    </th>
  );
}

function Cell<Row>({ column, row, padding }: { column: Column<Row>; row: Row; padding: string }) {
  const isRight = column.align === 'right' || column.figures === true;
  const look = classes(
    'pr-3 align-middle last:pr-0',
    padding,
    isRight ? 'text-right sm:whitespace-nowrap' : 'text-left',
    column.figures && 'font-figures font-semibold',
    column.className,
  );
  if (column.isRowHead) {
    return (
      <th scope="row" className={classes(look, 'font-bold')}>
        {column.cell(row)}
      </th>
    );
  }
  const name = column.name ?? (typeof column.head === 'string' ? column.head : undefined);
  return (
    <td className={look} data-name={column.headHidden ? undefined : name}>
      <span className="stack-value">{column.cell(row)}</span>
    </td>
  );
}

function tone(kind: 'chosen' | 'stops' | undefined): string | false {
  if (kind === 'chosen') return 'bg-enamel-wash [&>*:first-child]:pl-3 max-sm:px-3';
  return kind === 'stops' && 'bg-crimson-wash shadow-[inset_4px_0_0_var(--crimson)] [&>*:first-child]:pl-3 max-sm:px-3';
}
