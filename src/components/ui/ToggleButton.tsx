import type { ReactNode } from 'react';
import { ToggleButton as AriaToggleButton, type ToggleButtonProps as AriaProps } from 'react-aria-components/ToggleButton';
import { classes } from './classes';

export interface ToggleButtonProps extends Omit<AriaProps, 'className' | 'style' | 'children'> {
  children: ReactNode;
  size?: 'small' | 'medium';
  className?: string;
}

/** A button that stays down: a tool in a toolbar, a layer shown or hidden. */
export function ToggleButton({ size = 'medium', className, children, ...rest }: ToggleButtonProps) {
  return (
    <AriaToggleButton {...rest} className={classes('btn', size === 'small' && 'btn-small', className)}>
      {children}
    </AriaToggleButton>
  );
}
