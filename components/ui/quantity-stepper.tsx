'use client';

import { useId, useState } from 'react';
import { classes } from './classes';
import { Icon } from './icon';

export type QuantityStepperProps = {
  /** What is counted, such as "Boxes of Ebb Lamp": the name for readers. */
  label: string;
  name?: string;
  min?: number;
  max?: number;
  /** Uncontrolled start, or with `onChange` the value held by the parent. */
  defaultValue?: number;
  value?: number;
  onChange?: (value: number) => void;
  size?: 'big' | 'floor' | 'desk';
};

const heights = { desk: 'h-target', big: 'h-14', floor: 'h-floor' };
const ends = { desk: 'w-11', big: 'w-11.5', floor: 'w-18' };

/** − n +. The number can be typed; arrows of the keyboard step it, as in any number field. */
export function QuantityStepper(props: QuantityStepperProps) {
  const { label, name, min = 1, max = 999, defaultValue = min, value, onChange, size = 'big' } = props;
  const [own, setOwn] = useState(defaultValue);
  const [typed, setTyped] = useState<string | null>(null);
  const id = useId();
  const shown = value ?? own;

  function take(next: number) {
    const kept = Math.min(max, Math.max(min, Math.round(next)));
    setTyped(null);
    setOwn(kept);
    if (kept !== shown) onChange?.(kept);
  }

  function type(text: string) {
    const number = Number(text);
    if (text !== '' && Number.isInteger(number) && number >= min && number <= max) take(number);
    else setTyped(text);
  }

  const step = (by: number, word: string, isEnd: boolean) => (
    <button
      type="button"
      aria-label={`${word}: ${label}`}
      aria-controls={id}
      aria-disabled={isEnd || undefined}
      onClick={() => !isEnd && take(shown + by)}
      className={classes(
        'grid h-full place-items-center outline-offset-[-4px] hover:bg-well',
        ends[size],
        isEnd && 'text-edge',
      )}
    >
      <Icon name={by < 0 ? 'minus' : 'plus'} size={18} />
    </button>
  );

  return (
    <span
      className={classes(
        'inline-flex w-fit items-center overflow-hidden rounded-control border-1.5 border-ink bg-card',
        heights[size],
      )}
    >
      {step(-1, 'One less', shown <= min)}
      <input
        id={id}
        name={name}
        type="number"
        inputMode="numeric"
        aria-label={label}
        min={min}
        max={max}
        value={typed ?? shown}
        onChange={(event) => type(event.target.value)}
        onBlur={() => setTyped(null)}
        className="h-full w-12 [appearance:textfield] bg-transparent text-center font-figures text-floor font-semibold outline-offset-[-4px] [&::-webkit-inner-spin-button]:appearance-none [&::-webkit-outer-spin-button]:appearance-none"
      />
      {step(1, 'One more', shown >= max)}
    </span>
  );
}
