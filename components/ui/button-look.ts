import { classes } from './classes';

/** Primary: one a view. On an enamel ground use `cream` for the first and `outline` for the second. */
export type ButtonVariant = 'primary' | 'plain' | 'danger' | 'quiet' | 'cream' | 'outline';
/** Desk 44 px, floor 72 px (works in gloves), big 56 px (buying), small 34 px high in dense rows with 44 px reach. */
export type ButtonSize = 'desk' | 'floor' | 'big' | 'small';

const base =
  'relative inline-flex items-center justify-center gap-2.5 rounded-control border-1.5 font-bold leading-none no-underline select-none transition-[box-shadow,background-color,padding] duration-press';

const variants: Record<ButtonVariant, string> = {
  primary: 'border-plate-deep bg-plate text-on-enamel shadow-lip hover:bg-plate-deep active:shadow-none active:pt-0.5',
  plain: 'border-ink bg-card text-ink hover:bg-well active:pt-0.5',
  danger: 'border-crimson bg-card text-crimson hover:bg-crimson-wash active:pt-0.5',
  quiet: 'border-transparent bg-transparent text-enamel underline decoration-[1.5px] underline-offset-4 hover:text-ink',
  cream:
    'border-[#fcf9f2] bg-[#fcf9f2] text-[#131f6e] shadow-lip-copper hover:bg-[#ebe2cf] active:shadow-none active:pt-0.5',
  outline: 'border-on-enamel bg-transparent text-on-enamel hover:bg-plate-deep active:pt-0.5',
};

const sizes: Record<ButtonSize, string> = {
  desk: 'min-h-target text-body',
  floor: 'min-h-floor text-[19px] border-2',
  big: 'min-h-14 text-floor',
  small: 'min-h-8.5 text-caption before:absolute before:-inset-y-1.5 before:inset-x-0',
};

/** Inside left and right. A quiet one has none to see, so that its words stand flush with what is above them. */
const insides: Record<ButtonSize, string> = { desk: 'px-5', floor: 'px-6', big: 'px-6.5', small: 'px-3' };

const locked = 'border-dashed border-edge bg-well text-ink2';

export function buttonLook(options: {
  variant: ButtonVariant;
  size: ButtonSize;
  isLocked?: boolean;
  className?: string | undefined;
}): string {
  const { variant, size, isLocked = false, className } = options;
  const inside = variant === 'quiet' && size !== 'floor' ? 'px-1 -mx-1' : insides[size];
  return classes(base, sizes[size], inside, isLocked ? classes(locked, 'shrink-0') : variants[variant], className);
}
