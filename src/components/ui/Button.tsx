import type { ReactNode } from 'react';
import { Button as AriaButton, type ButtonProps as AriaButtonProps } from 'react-aria-components/Button';
import { classes } from './classes';

export type ButtonVariant = 'plain' | 'primary' | 'quiet' | 'danger';

export interface ButtonProps extends Omit<AriaButtonProps, 'className' | 'style' | 'children'> {
  children: ReactNode;
  /** One primary a screen. */
  variant?: ButtonVariant;
  size?: 'small' | 'medium';
  /** Only an icon inside: give an aria-label. */
  icon?: boolean;
  className?: string;
}

const VARIANTS: Readonly<Record<ButtonVariant, string>> = { plain: '', primary: 'btn-primary', quiet: 'btn-quiet', danger: 'btn-danger' };

export function Button({ variant = 'plain', size = 'medium', icon = false, className, children, ...rest }: ButtonProps) {
  return (
    <AriaButton {...rest} className={classes('btn', VARIANTS[variant], size === 'small' && 'btn-small', icon && 'btn-icon', className)}>
      {children}
    </AriaButton>
  );
}
