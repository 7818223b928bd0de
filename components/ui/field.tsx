import { useId, type ComponentProps, type ReactNode } from 'react';
import { classes } from './classes';
import { Sign } from './sign';

/** What every field has: a label above, help under the label, the error under the field, all tied by id. */
export type FieldFrame = {
  label: ReactNode;
  hint?: ReactNode;
  error?: string | undefined;
  /** What was understood from the text typed, such as "235 μH". */
  understood?: ReactNode;
  /** `floor` for gloves: 72 px high, 18 px text. */
  size?: 'desk' | 'floor' | undefined;
  /** The label is read, not shown: only where a heading or a column already names the field. */
  labelHidden?: boolean | undefined;
  /** Adds "(can be left out)" after the label. */
  optional?: boolean | undefined;
  /** Width and place of the whole field. */
  frameClassName?: string | undefined;
};

type FrameIds = { fieldId: string; describedBy: string | undefined; hasError: boolean };

export function FieldRows(props: FieldFrame & { id?: string | undefined; children: (ids: FrameIds) => ReactNode }) {
  const {
    label,
    hint,
    error,
    understood,
    size = 'desk',
    labelHidden = false,
    optional = false,
    frameClassName,
  } = props;
  const madeId = useId();
  const fieldId = props.id ?? madeId;
  const hasError = error !== undefined && error !== '';
  const ids = [
    hint !== undefined && `${fieldId}-hint`,
    understood !== undefined && `${fieldId}-understood`,
    hasError && `${fieldId}-error`,
  ].filter((id) => id !== false);
  return (
    <div className={classes('flex min-w-0 flex-col', frameClassName)}>
      <label
        htmlFor={fieldId}
        className={labelHidden ? 'sr-only' : classes('mb-1 font-bold', size === 'floor' && 'text-floor')}
      >
        {label}
        {optional && <span className="font-normal text-ink2"> (can be left out)</span>}
      </label>
      {hint !== undefined && (
        <p id={`${fieldId}-hint`} className="mb-1.5 text-caption text-ink2">
          {hint}
        </p>
      )}
      {props.children({ fieldId, describedBy: ids.length > 0 ? ids.join(' ') : undefined, hasError })}
      {understood !== undefined && !hasError && (
        <p id={`${fieldId}-understood`} className="mt-1 text-caption text-ink2">
          {understood}
        </p>
      )}
      {hasError && <FieldError id={`${fieldId}-error`}>{error}</FieldError>}
    </div>
  );
}

export function FieldError({ id, children }: { id?: string; children: ReactNode }) {
  return (
    <p {...(id === undefined ? {} : { id })} className="mt-1.5 flex gap-2 text-caption font-semibold text-crimson">
      <Sign kind="stops" size={16} className="mt-0.5" />
      <span>{children}</span>
    </p>
  );
}

/** The border of a field; the field itself lies in it without one. */
export function fieldBox(hasError: boolean, size: 'desk' | 'floor' = 'desk'): string {
  return classes(
    'flex min-w-0 items-center rounded-control bg-card focus-within:outline-3 focus-within:outline-offset-2 focus-within:outline-enamel',
    size === 'floor' ? 'min-h-floor text-floor' : 'min-h-target',
    hasError ? 'border-2 border-crimson' : 'border-1.5 border-edge',
  );
}

/** The bare control inside `fieldBox`. Its ring is the box's. */
export const bareControl =
  'min-w-0 flex-1 self-stretch bg-transparent px-3 text-inherit text-ink outline-none focus-visible:outline-none disabled:text-ink2';

export type TextFieldProps = FieldFrame &
  Omit<ComponentProps<'input'>, 'size'> & {
    /** Inside the field at the right, such as "pF". */
    unit?: ReactNode;
    /** The value is a number: it is set in the figures face, to the right. */
    figures?: boolean;
  };

export function TextField(props: TextFieldProps) {
  const { label, hint, error, understood, size = 'desk', labelHidden, optional, frameClassName, ...input } = props;
  const { unit, figures = false, className, id, ...rest } = input;
  const frame = { label, hint, error, understood, size, labelHidden, optional, frameClassName, id };
  return (
    <FieldRows {...frame}>
      {({ fieldId, describedBy, hasError }) => (
        <span className={fieldBox(hasError, size)}>
          <input
            type="text"
            {...rest}
            id={fieldId}
            aria-describedby={describedBy}
            aria-invalid={hasError || undefined}
            className={classes(bareControl, figures && 'font-figures text-right', className)}
          />
          {unit !== undefined && <span className="shrink-0 pr-3 text-head text-ink2">{unit}</span>}
        </span>
      )}
    </FieldRows>
  );
}

export type TextAreaProps = FieldFrame & ComponentProps<'textarea'>;

export function TextArea(props: TextAreaProps) {
  const { label, hint, error, understood, size = 'desk', labelHidden, optional, frameClassName, ...area } = props;
  const { className, id, rows = 4, ...rest } = area;
  const frame = { label, hint, error, understood, size, labelHidden, optional, frameClassName, id };
  return (
    <FieldRows {...frame}>
      {({ fieldId, describedBy, hasError }) => (
        <span className={fieldBox(hasError, size)}>
          <textarea
            {...rest}
            rows={rows}
            id={fieldId}
            aria-describedby={describedBy}
            aria-invalid={hasError || undefined}
            className={classes(bareControl, 'py-2.5', className)}
          />
        </span>
      )}
    </FieldRows>
  );
}
