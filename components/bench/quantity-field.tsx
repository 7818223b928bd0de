'use client';

import { type ReactNode, useState } from 'react';
import { TextField } from '@/components/ui/field';
import { type ShownUnit, figuresIn, readQuantity, showQuantity } from '@/services/quantity';

export interface QuantityFieldProps {
  label: ReactNode;
  unit: ShownUnit;
  /** In SI; null where nothing is given. */
  value: number | null;
  onChange: (value: number) => void;
  /** For a field that may stay empty. */
  onEmpty?: (() => void) | undefined;
  /** Refuses a value that can be read but not be meant: a sentence, or null. */
  check?: ((value: number) => string | null) | undefined;
  hint?: ReactNode;
  /** From the server, or from the verdict. */
  error?: string | undefined;
  /** Whole figures only: turns. */
  whole?: boolean;
  labelHidden?: boolean;
  frameClassName?: string;
  id?: string;
}

/**
 * A value with its unit, read as people write it. It is taken when the field is left or Enter is pressed; what was
 * understood is said under it where it was written another way. Text that is no value stays, with its sentence.
 */
export function QuantityField(props: QuantityFieldProps) {
  const {
    label,
    unit,
    value,
    onChange,
    onEmpty,
    check,
    hint,
    error,
    whole = false,
    labelHidden,
    frameClassName,
    id,
  } = props;
  const [typed, setTyped] = useState<{ text: string; sentence: string | null; understood: string | null } | null>(null);
  const shown = value === null ? '' : figuresIn(value, unit);

  function take(text: string) {
    if (text.trim() === '' && onEmpty) {
      setTyped(null);
      if (value !== null) onEmpty();
      return;
    }
    const reading = readQuantity(text, unit);
    const sentence = !reading.ok
      ? reading.sentence
      : whole && !Number.isInteger(reading.value)
        ? 'Whole figures only.'
        : (check?.(reading.value) ?? null);
    if (!reading.ok || sentence !== null) {
      setTyped({ text, sentence, understood: null });
      return;
    }
    const asTyped = figuresIn(reading.value, unit) === text.trim().replace(',', '.');
    setTyped(
      asTyped
        ? null
        : { text: figuresIn(reading.value, unit), sentence: null, understood: showQuantity(reading.value, unit) },
    );
    if (reading.value !== value) onChange(reading.value);
  }

  const isStale = typed?.sentence === null && typed.text !== shown && typed.understood !== null;
  return (
    <TextField
      label={label}
      unit={unit}
      figures
      inputMode="text"
      autoComplete="off"
      value={isStale ? shown : (typed?.text ?? shown)}
      onChange={(event) => setTyped({ text: event.target.value, sentence: null, understood: null })}
      onBlur={(event) => typed !== null && typed.understood === null && take(event.target.value)}
      onKeyDown={(event) => event.key === 'Enter' && take(event.currentTarget.value)}
      error={typed?.sentence ?? error}
      {...(hint !== undefined && { hint })}
      {...(typed !== null && typed.understood !== null && !isStale && { understood: `Read as ${typed.understood}` })}
      {...(labelHidden !== undefined && { labelHidden })}
      {...(frameClassName !== undefined && { frameClassName })}
      {...(id !== undefined && { id })}
    />
  );
}
