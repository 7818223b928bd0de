import type { ComponentProps, ReactNode } from 'react';
import { classes } from './classes';
import { bareControl, fieldBox, FieldRows, type FieldFrame } from './field';
import { Icon } from './icon';

export type SelectOption = { value: string; label: string; disabled?: boolean };

export type SelectProps = FieldFrame &
  Omit<ComponentProps<'select'>, 'size' | 'children'> & {
    options: readonly (SelectOption | { group: string; options: readonly SelectOption[] })[];
    /** First, empty choice, such as "Choose a band". */
    placeholder?: string | undefined;
  };

export function Select(props: SelectProps): ReactNode {
  const { label, hint, error, understood, size = 'desk', labelHidden, optional, frameClassName, ...select } = props;
  const { options, placeholder, className, id, ...rest } = select;
  const frame = { label, hint, error, understood, size, labelHidden, optional, frameClassName, id };
  return (
    <FieldRows {...frame}>
      {({ fieldId, describedBy, hasError }) => (
        <span className={classes(fieldBox(hasError, size), 'relative')}>
          <select
            {...rest}
            id={fieldId}
            aria-describedby={describedBy}
            aria-invalid={hasError || undefined}
            className={classes(bareControl, 'appearance-none pr-10', className)}
          >
            {placeholder !== undefined && <option value="">{placeholder}</option>}
            {options.map((entry) =>
              'group' in entry ? (
                <optgroup key={entry.group} label={entry.group}>
                  {entry.options.map(choice)}
                </optgroup>
              ) : (
                choice(entry)
              ),
            )}
          </select>
          <Icon name="open" size={18} className="pointer-events-none absolute right-3 text-ink2" />
        </span>
      )}
    </FieldRows>
  );
}

function choice({ value, label, disabled = false }: SelectOption) {
  return (
    <option key={value} value={value} disabled={disabled} className="bg-card text-ink">
      {label}
    </option>
  );
}
