import type { ReactNode } from 'react';
import { classes } from '@/components/ui/classes';
import { Sign } from '@/components/ui/sign';
import { Tag } from '@/components/ui/tag';

export type PlaceState = 'waiting' | 'next' | 'in' | 'wrong' | 'bin-empty';

export type TrayPlaceProps = {
  state: PlaceState;
  name: string;
  drawing: ReactNode;
  have: number;
  need: number;
  /** Unit after the count where pieces are not counted: "m". */
  unit?: string;
  /** "C-14"; shown while the place is not full. */
  bin?: string | undefined;
  /** In place of the usual word: "Not in this box", "told". */
  word?: string | undefined;
  /** Places wide in the tray. */
  span?: 1 | 2;
  /** `floor` is the packing tablet, `desk` a small tray in an overview. */
  size?: 'floor' | 'desk';
};

const looks: Record<PlaceState, string> = {
  waiting: 'bg-well',
  next: 'bg-enamel-wash outline-5 -outline-offset-1 outline-enamel',
  in: 'bg-card',
  wrong: 'bg-crimson-wash outline-5 -outline-offset-1 outline-crimson',
  'bin-empty': 'bg-well',
};
const stateWords: Record<PlaceState, string> = {
  waiting: 'waiting',
  next: 'Next',
  in: 'in the tray',
  wrong: 'Not in this box',
  'bin-empty': 'Bin empty',
};

/** The box in plan: its places in the order of the tray. */
export function Tray({ label, children, className }: { label: string; children: ReactNode; className?: string }) {
  return (
    <ul
      aria-label={label}
      className={classes(
        'grid auto-rows-fr grid-cols-2 gap-2 rounded-[10px] border-3 border-ink bg-edge p-2 sm:grid-cols-3 md:grid-cols-4',
        className,
      )}
    >
      {children}
    </ul>
  );
}

export function TrayPlace(props: TrayPlaceProps) {
  const { state, name, drawing, have, need, unit, bin, word, span = 1, size = 'floor' } = props;
  const isFloor = size === 'floor';
  const counted = `${have} of ${need}${unit === undefined ? '' : ` ${unit}`}`;
  return (
    <li
      data-state={state}
      className={classes(
        'flex min-w-0 flex-col rounded-tag px-3 py-2.5 text-ink',
        isFloor ? 'text-floor' : 'text-body',
        span === 2 && 'col-span-2',
        looks[state],
      )}
    >
      <span className="flex min-h-7 items-start justify-between gap-2 leading-6">
        <b className="min-w-0">{state === 'wrong' ? (word ?? stateWords.wrong) : name}</b>
        <StateMark state={state} isFloor={isFloor} />
      </span>
      <span
        className={classes(
          'grid min-h-14 flex-1 place-items-center py-2',
          state === 'waiting' && '*:opacity-40',
          state === 'bin-empty' && '*:opacity-25',
          state === 'in' && '*:drop-in',
        )}
      >
        {drawing}
      </span>
      <span className="flex min-h-7 flex-wrap items-center justify-between gap-2">
        <span className="font-figures font-semibold whitespace-nowrap">
          {counted}
          {state === 'bin-empty' && <span className="font-text font-normal">, {word ?? 'told'}</span>}
        </span>
        {state === 'in' ? <Pieces count={need} /> : bin !== undefined && state !== 'wrong' && <BinTag bin={bin} />}
      </span>
    </li>
  );
}

function StateMark({ state, isFloor }: { state: PlaceState; isFloor: boolean }) {
  const size = isFloor ? 25 : 20;
  switch (state) {
    case 'in':
      return (
        <>
          <Sign kind="clears" size={size} className="shrink-0" />
          <span className="sr-only">{stateWords.in}</span>
        </>
      );
    case 'next':
      return (
        <Tag tone="plate" className={classes('shrink-0', isFloor && 'px-3 text-value leading-7')}>
          Next
        </Tag>
      );
    case 'wrong':
      return <Sign kind="stops" size={size} className="shrink-0" />;
    case 'bin-empty':
      return (
        <>
          <Sign kind="note" size={size} className="shrink-0" />
          <span className="sr-only">{stateWords['bin-empty']}</span>
        </>
      );
    case 'waiting':
      return <span className="sr-only">{stateWords.waiting}</span>;
  }
}

/** One dot a piece; above six a full bar, since dots would no longer be counted. */
function Pieces({ count }: { count: number }) {
  if (count > 6) return <span aria-hidden className="h-3 w-16 rounded-full bg-pine" />;
  return (
    <span aria-hidden className="flex gap-1.5">
      {Array.from({ length: Math.max(1, Math.round(count)) }, (_, index) => (
        <span key={index} className="size-3.5 rounded-full bg-pine" />
      ))}
    </span>
  );
}

export function BinTag({ bin }: { bin: string }) {
  return (
    <span className="rounded-tag border-1.5 border-ink bg-card px-2 font-figures leading-7 font-semibold">
      <span className="sr-only">bin </span>
      {bin}
    </span>
  );
}
