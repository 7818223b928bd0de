'use client';

import { Checkbox } from '@/components/ui/checkbox';
import { TextField } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { type PartValue, PartValue as ValueSchema } from '@/services/parts/schemas';
import type { FieldSentences } from '@/services/problem';
import type { PartField as Field } from './part-fields';
import { QuantityField } from './quantity-field';
import { ValueFields } from './value-fields';

/** The values of a part while they are typed: of one kind, not yet complete. */
export type TypedValues = Record<string, unknown> & { kind: string };

export interface PartFieldProps {
  field: Field;
  values: TypedValues;
  errors: FieldSentences;
  onChange: (key: string, value: unknown) => void;
}

/** One value of a part, as its kind asks for it. */
export function PartField(props: PartFieldProps) {
  const { field, values, errors, onChange } = props;
  const { key, label } = field;
  const error = Object.entries(errors).find(
    ([path]) => path === `values.${key}` || path.startsWith(`values.${key}.`),
  )?.[1];
  const id = `part-values-${key}`;
  const current = values[key];
  switch (field.type) {
    case 'value':
      return (
        <ValueFields
          id={id}
          label={label}
          unit={field.unit}
          hint={field.hint}
          optional={field.optional}
          value={asValue(current)}
          onChange={(value) => onChange(key, value)}
          error={error}
        />
      );
    case 'number':
      return (
        <QuantityField
          id={id}
          label={field.optional ? `${label} (can be left out)` : label}
          unit={field.unit}
          value={typeof current === 'number' ? current : null}
          onChange={(value) => onChange(key, value)}
          {...(field.optional && { onEmpty: () => onChange(key, undefined) })}
          {...(field.hint !== undefined && { hint: field.hint })}
          error={error}
          frameClassName="max-w-60"
        />
      );
    case 'choice':
      return (
        <Select
          id={id}
          label={label}
          value={String(current ?? '')}
          options={Object.entries(field.options).map(([value, words]) => ({ value, label: capital(words) }))}
          onChange={(event) => onChange(key, event.target.value)}
          error={error}
          frameClassName="max-w-80"
        />
      );
    case 'text':
      return (
        <TextField
          id={id}
          label={label}
          {...(field.hint !== undefined && { hint: field.hint })}
          value={String(current ?? '')}
          onChange={(event) => onChange(key, event.target.value)}
          error={error}
          frameClassName="max-w-80"
        />
      );
    case 'flag':
      return (
        <Checkbox
          id={id}
          label={label}
          {...(field.hint !== undefined && { hint: field.hint })}
          checked={current === true}
          onChange={(event) => onChange(key, event.target.checked)}
        />
      );
  }
}

const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);

const anyValue = ValueSchema(-Infinity, Infinity, '');
const asValue = (value: unknown): PartValue | undefined => {
  const parsed = anyValue.safeParse(value);
  return parsed.success ? parsed.data : undefined;
};
