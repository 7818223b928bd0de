import { useId, type ComponentProps, type ReactNode } from 'react';
import { classes } from './classes';
import { FieldError } from './field';

export type CheckboxProps = Omit<ComponentProps<'input'>, 'type' | 'size'> & {
  label: ReactNode;
  hint?: ReactNode;
  error?: string | undefined;
  size?: 'desk' | 'floor';
  /** The label is read, not shown: the box at a row's start. */
  labelHidden?: boolean;
};

export function Checkbox(props: CheckboxProps) {
  const { label, hint, error, size = 'desk', labelHidden = false, className, id, ...rest } = props;
  const madeId = useId();
  const fieldId = id ?? madeId;
  const hasError = error !== undefined && error !== '';
  const describedBy = [hint !== undefined && `${fieldId}-hint`, hasError && `${fieldId}-error`]
    .filter(Boolean)
    .join(' ');
  return (
    <div className={className}>
      <div
        className={classes(
          'flex items-start',
          size === 'floor' ? 'min-h-floor gap-4 py-4' : 'min-h-target gap-3 py-2.5',
        )}
      >
        <span className="relative grid shrink-0 place-items-center">
          <input
            type="checkbox"
            {...rest}
            id={fieldId}
            aria-describedby={describedBy === '' ? undefined : describedBy}
            aria-invalid={hasError || undefined}
            className={classes(
              'peer appearance-none rounded-tag border-1.5 bg-card checked:border-plate-deep checked:bg-plate before:absolute before:-inset-2.5',
              size === 'floor' ? 'size-9' : 'size-6',
              hasError ? 'border-crimson' : 'border-edge',
            )}
          />
          <svg
            aria-hidden
            viewBox="0 0 24 24"
            className="pointer-events-none absolute hidden size-full stroke-on-enamel peer-checked:block"
            fill="none"
            strokeWidth="3"
            strokeLinecap="square"
          >
            <path d="M6 12.5l4 4L18 8" />
          </svg>
        </span>
        <span className="min-w-0">
          <label
            htmlFor={fieldId}
            className={labelHidden ? 'sr-only' : classes('font-semibold', size === 'floor' && 'text-floor')}
          >
            {label}
          </label>
          {hint !== undefined && (
            <span id={`${fieldId}-hint`} className="block text-caption text-ink2">
              {hint}
            </span>
          )}
        </span>
      </div>
      {hasError && <FieldError id={`${fieldId}-error`}>{error}</FieldError>}
    </div>
  );
}
