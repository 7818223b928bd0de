import { useId, type ComponentProps, type ReactNode } from 'react';
import { classes } from './classes';
import { FieldError } from './field';

export type RadioOption = { value: string; label: ReactNode; hint?: ReactNode; aside?: ReactNode };

export type RadioGroupProps = {
  legend: ReactNode;
  legendHidden?: boolean;
  hint?: ReactNode;
  error?: string | undefined;
  name: string;
  options: readonly RadioOption[];
  /** Uncontrolled: the choice at first. */
  defaultValue?: string | undefined;
  /** Controlled: with `onChange`. */
  value?: string | undefined;
  onChange?: ((value: string) => void) | undefined;
  size?: 'desk' | 'floor';
  /** `rows` under each other with a rule between, `cards` side by side. */
  layout?: 'rows' | 'cards';
  /** Passed to each input: what `register` of a form library returns. */
  inputProps?: Omit<ComponentProps<'input'>, 'type' | 'value' | 'name' | 'size'>;
  className?: string;
};

export function RadioGroup(props: RadioGroupProps) {
  const { legend, legendHidden = false, hint, error, name, options, size = 'desk', layout = 'rows', className } = props;
  const { value, defaultValue, onChange, inputProps } = props;
  const id = useId();
  const hasError = error !== undefined && error !== '';
  const describedBy = [hint !== undefined && `${id}-hint`, hasError && `${id}-error`].filter(Boolean).join(' ');
  return (
    <fieldset className={className} {...(describedBy !== '' && { 'aria-describedby': describedBy })}>
      <legend className={legendHidden ? 'sr-only' : classes('mb-1 font-bold', size === 'floor' && 'text-floor')}>
        {legend}
      </legend>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="mb-2 text-caption text-ink2">
          {hint}
        </p>
      )}
      <div className={layout === 'cards' ? 'grid gap-3 sm:grid-cols-2' : 'grid'}>
        {options.map((option) => (
          <label
            key={option.value}
            className={classes(
              'flex cursor-pointer items-start gap-3',
              size === 'floor' ? 'min-h-floor py-5 text-floor' : 'min-h-target py-2.5',
              layout === 'cards'
                ? 'rounded-control border-1.5 border-edge bg-card px-4 has-checked:border-enamel has-checked:bg-enamel-wash'
                : 'border-b border-rule last:border-0',
            )}
          >
            <input
              {...inputProps}
              type="radio"
              name={name}
              value={option.value}
              {...(value !== undefined && { checked: value === option.value })}
              {...(defaultValue !== undefined && { defaultChecked: defaultValue === option.value })}
              {...(onChange && { onChange: () => onChange(option.value) })}
              className={classes(
                'mt-0.5 shrink-0 appearance-none rounded-full border-1.5 bg-card checked:border-[6px] checked:border-plate checked:bg-on-enamel',
                size === 'floor' ? 'size-7' : 'size-5',
                hasError ? 'border-crimson' : 'border-edge',
              )}
            />
            <span className="min-w-0 flex-1">
              <span className="font-semibold">{option.label}</span>
              {option.hint !== undefined && <span className="block text-caption text-ink2">{option.hint}</span>}
            </span>
            {option.aside !== undefined && <span className="shrink-0">{option.aside}</span>}
          </label>
        ))}
      </div>
      {hasError && <FieldError id={`${id}-error`}>{error}</FieldError>}
    </fieldset>
  );
}
