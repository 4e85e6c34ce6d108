import type { ReactNode } from 'react';
import { Checkbox as AriaCheckbox, type CheckboxProps as AriaProps } from 'react-aria-components/Checkbox';
import { Switch as AriaSwitch, type SwitchProps as AriaSwitchProps } from 'react-aria-components/Switch';
import { classes } from './classes';

export interface CheckboxProps extends Omit<AriaProps, 'className' | 'style' | 'children'> {
  children: ReactNode;
  className?: string;
}

export function Checkbox({ children, className, ...rest }: CheckboxProps) {
  return (
    <AriaCheckbox {...rest} className={classes('check', className)}>
      {({ isSelected, isIndeterminate }) => (
        <>
          <span className="check-box" aria-hidden="true">
            {isIndeterminate ? '–' : isSelected ? '✓' : ''}
          </span>
          <span>{children}</span>
        </>
      )}
    </AriaCheckbox>
  );
}

export interface SwitchProps extends Omit<AriaSwitchProps, 'className' | 'style' | 'children'> {
  children: ReactNode;
  className?: string;
}

/** On or off, taking effect at once. */
export function Switch({ children, className, ...rest }: SwitchProps) {
  return (
    <AriaSwitch {...rest} className={classes('check', className)}>
      <span className="switch-track" aria-hidden="true" />
      <span>{children}</span>
    </AriaSwitch>
  );
}
