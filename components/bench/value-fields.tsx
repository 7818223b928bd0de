'use client';

import { Select } from '@/components/ui/select';
import type { PartValue } from '@/services/parts/schemas';
import type { ShownUnit } from '@/services/quantity';
import { QuantityField } from './quantity-field';

export interface ValueFieldsProps {
  id: string;
  label: string;
  unit: ShownUnit;
  hint?: string | undefined;
  optional?: boolean | undefined;
  value: PartValue | undefined;
  onChange: (value: PartValue | undefined) => void;
  error?: string | undefined;
}

const dists = {
  uniform: 'Even across it',
  normal: 'Normal',
  binned: 'Graded, the best taken out',
  'log-uniform': 'Even in ratio',
} as const;
const origins = { maker: "Maker's sheet", measured: 'Measured', estimate: 'Estimate' } as const;

const optionsOf = (words: Readonly<Record<string, string>>) =>
  Object.entries(words).map(([value, label]) => ({ value, label }));
const keyOf = <T extends string>(words: Readonly<Record<T, string>>, text: string): T | undefined =>
  (Object.keys(words) as T[]).find((key) => key === text); // the keys of the table itself

/** A value of a part: nominal, tolerance with its distribution, and where the value comes from. */
export function ValueFields({ id, label, unit, hint, optional, value, onChange, error }: ValueFieldsProps) {
  const start: PartValue = value ?? { nominal: 0, origin: 'maker' };
  return (
    <fieldset className="border-t border-rule pt-3">
      <legend className="sr-only">{label}</legend>
      <div className="grid items-end gap-x-4 gap-y-3 sm:grid-cols-2 lg:grid-cols-4">
        <QuantityField
          id={id}
          label={optional ? `${label} (can be left out)` : label}
          unit={unit}
          value={value?.nominal ?? null}
          onChange={(nominal) => onChange({ ...start, nominal })}
          {...(optional && { onEmpty: () => onChange(undefined) })}
          {...(hint !== undefined && { hint })}
          error={error}
        />
        {value && (
          <>
            <QuantityField
              label="Tolerance"
              unit="%"
              value={value.tol ?? null}
              onChange={(tol) => onChange({ ...value, tol })}
              onEmpty={() => {
                const { tol: _tol, dist: _dist, ...exact } = value;
                onChange(exact);
              }}
              check={(tol) => (tol > 0 && tol <= 1 ? null : 'Above 0, up to 100 %. Leave it empty for an exact value.')}
            />
            <Select
              label="Spread"
              value={value.dist ?? 'uniform'}
              disabled={value.tol === undefined}
              options={optionsOf(dists)}
              onChange={(event) => {
                const dist = keyOf(dists, event.target.value);
                if (dist) onChange({ ...value, dist });
              }}
            />
            <Select
              label="Source"
              value={value.origin}
              options={optionsOf(origins)}
              onChange={(event) => {
                const origin = keyOf(origins, event.target.value);
                if (origin) onChange({ ...value, origin });
              }}
            />
          </>
        )}
      </div>
    </fieldset>
  );
}
