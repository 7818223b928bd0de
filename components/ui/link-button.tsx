import Link from 'next/link';
import type { ComponentProps } from 'react';
import { buttonLook, type ButtonSize, type ButtonVariant } from './button-look';
import { Icon, type IconName } from './icon';

export type LinkButtonProps = Omit<ComponentProps<typeof Link>, 'style'> & {
  variant?: ButtonVariant;
  size?: ButtonSize;
  icon?: IconName;
  iconAfter?: IconName;
};

/** A link that looks like a button: it goes somewhere and changes nothing. */
export function LinkButton(props: LinkButtonProps) {
  const { variant = 'plain', size = 'desk', icon, iconAfter, className, children, ...rest } = props;
  return (
    <Link {...rest} className={buttonLook({ variant, size, className })}>
      {icon && <Icon name={icon} />}
      {children}
      {iconAfter && <Icon name={iconAfter} />}
    </Link>
  );
}

export type TextLinkProps = Omit<ComponentProps<typeof Link>, 'style'> & { bold?: boolean };

export function TextLink({ bold = false, className, ...rest }: TextLinkProps) {
  return <Link {...rest} className={`link ${bold ? 'font-bold' : ''} ${className ?? ''}`.trim()} />;
}
