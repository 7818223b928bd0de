'use client';

import { type ReactNode, useId } from 'react';
import type { ShownUnit } from '@/services/quantity';
import { QuantityField } from './quantity-field';

export interface SliderFieldProps {
  label: ReactNode;
  /** For readers, where the label is not plain text. */
  name: string;
  unit: ShownUnit;
  value: number;
  min: number;
  max: number;
  step: number;
  whole?: boolean;
  onChange: (value: number) => void;
  error?: string | undefined;
}

/** A value on a slider, with the number beside it always there to be typed. */
export function SliderField({
  label,
  name,
  unit,
  value,
  min,
  max,
  step,
  whole = false,
  onChange,
  error,
}: SliderFieldProps) {
  const id = useId();
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_7.5rem] items-end gap-x-4">
      <div className="min-w-0">
        <span aria-hidden className="mb-1 block font-bold">
          {label}
        </span>
        <input
          type="range"
          aria-label={`${name}, slider`}
          min={min}
          max={max}
          step={step}
          value={Math.min(max, Math.max(min, value))}
          onChange={(event) => onChange(Number(event.target.value))}
          className="h-target w-full cursor-pointer accent-plate"
        />
      </div>
      <QuantityField
        id={id}
        label={name}
        labelHidden
        unit={unit}
        value={value}
        whole={whole}
        onChange={onChange}
        error={error}
      />
    </div>
  );
}
