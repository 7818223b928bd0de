import { useId, type ComponentProps, type ReactNode } from 'react';
import { buttonLook, type ButtonSize, type ButtonVariant } from './button-look';
import { classes } from './classes';
import { Icon, type IconName } from './icon';

export type ButtonProps = Omit<ComponentProps<'button'>, 'disabled'> & {
  variant?: ButtonVariant;
  size?: ButtonSize;
  icon?: IconName;
  iconAfter?: IconName;
  /** Why it may not be pressed yet. The button stays in the tab order, dashed, and reads the reason out. */
  lockedReason?: string | undefined;
  /** Where the reason stands; `hidden` where the page already says it beside the button. */
  reasonSide?: 'after' | 'before' | 'below' | 'hidden';
  /** The deed is under way: pressing again does nothing. */
  pending?: boolean;
  pendingLabel?: ReactNode;
};

export function Button(props: ButtonProps) {
  const { variant = 'plain', size = 'desk', icon, iconAfter, lockedReason, reasonSide = 'after' } = props;
  const { pending = false, pendingLabel, className, children, ...rest } = withoutLook(props);
  const reasonId = useId();
  const isLocked = lockedReason !== undefined;

  if (!isLocked) {
    return (
      <button
        type="button"
        {...(pending ? inert(rest) : rest)}
        aria-busy={pending || undefined}
        aria-disabled={pending || undefined}
        className={buttonLook({ variant, size, className })}
      >
        {icon && <Icon name={icon} />}
        {pending && pendingLabel !== undefined ? pendingLabel : children}
        {iconAfter && <Icon name={iconAfter} />}
      </button>
    );
  }

  const button = (
    <button
      {...inert(rest)}
      aria-disabled
      aria-describedby={reasonId}
      className={buttonLook({ variant, size, isLocked, className })}
    >
      <Icon name="lock" size={18} />
      {children}
    </button>
  );
  const reason = (
    <span
      id={reasonId}
      className={
        reasonSide === 'hidden' ? 'sr-only' : size === 'floor' ? 'text-floor text-ink' : 'text-caption text-ink2'
      }
    >
      {lockedReason}
    </span>
  );
  return (
    <span
      className={classes('inline-flex gap-3', reasonSide === 'below' ? 'flex-col items-start gap-1.5' : 'items-center')}
    >
      {reasonSide === 'before' && reason}
      {button}
      {reasonSide !== 'before' && reason}
    </span>
  );
}

type NativeProps = ComponentProps<'button'>;

function withoutLook(props: ButtonProps) {
  const { variant: _v, size: _s, icon: _i, iconAfter: _a, lockedReason: _l, reasonSide: _r, ...rest } = props;
  return rest;
}

/** A button that must not act: no handler, no submit. Being `type="button"` keeps it from sending its form. */
function inert(rest: NativeProps): NativeProps {
  const { onClick: _c, formAction: _f, name: _n, value: _v, ...kept } = rest;
  return { ...kept, type: 'button' };
}
