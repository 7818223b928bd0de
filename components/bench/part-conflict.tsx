import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { formatMoney } from '@/services/money';
import { PartValues, type PartView } from '@/services/parts/schemas';
import type { TypedValues } from './part-field';
import { partWords } from './part-words';

/** The other's part that a conflict carries: our own action sends the view. */
export const currentPart = (current: unknown): PartView | null =>
  typeof current === 'object' && current !== null && 'saveNo' in current ? (current as PartView) : null;

/** Two people changed the part: both sides, and the reader chooses. */
export function PartConflict(props: {
  mine: { name: string; values: TypedValues; price: string };
  theirs: PartView;
  onMine: () => void;
  onTheirs: () => void;
}) {
  const { mine, theirs, onMine, onTheirs } = props;
  const parsed = PartValues.safeParse(mine.values);
  const words = (values: PartValues) => {
    const { value, unit, tolerance, detail } = partWords(values);
    return [value && `${value} ${unit ?? ''}`, tolerance !== null && `±${tolerance} %`, detail]
      .filter((one) => one)
      .join(', ');
  };
  return (
    <Notice
      kind="note"
      live="alert"
      level={2}
      title="Somebody changed this part meanwhile"
      actions={
        <>
          <Button onClick={onMine}>Keep mine, then save</Button>
          <Button onClick={onTheirs}>Take theirs</Button>
        </>
      }
    >
      <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1">
        <dt className="font-bold">Yours</dt>
        <dd>{`${mine.name}, £${mine.price}; ${parsed.success ? words(parsed.data) : 'values not complete'}`}</dd>
        <dt className="font-bold">Theirs</dt>
        <dd>{`${theirs.name}, ${formatMoney(theirs.cost)}; ${words(theirs.values)}`}</dd>
      </dl>
    </Notice>
  );
}
