import type { ReactNode } from 'react';
import { CheckboxButton, CheckboxField, type CheckboxFieldProps } from 'react-aria-components/Checkbox';
import { SwitchButton, SwitchField, type SwitchFieldProps } from 'react-aria-components/Switch';

export interface CheckboxProps extends Omit<CheckboxFieldProps, 'className' | 'style' | 'children'> {
  children: ReactNode;
  className?: string;
}

export function Checkbox({ children, className, ...rest }: CheckboxProps) {
  return (
    <CheckboxField {...rest} className={className}>
      <CheckboxButton className="check">
        {({ isSelected, isIndeterminate }) => (
          <>
            <span className="check-box" aria-hidden="true">
              {isIndeterminate ? '–' : isSelected ? '✓' : ''}
            </span>
            <span>{children}</span>
          </>
        )}
      </CheckboxButton>
    </CheckboxField>
  );
}

export interface SwitchProps extends Omit<SwitchFieldProps, 'className' | 'style' | 'children'> {
  children: ReactNode;
  className?: string;
}

/** On or off, taking effect at once. */
export function Switch({ children, className, ...rest }: SwitchProps) {
  return (
    <SwitchField {...rest} className={className}>
      <SwitchButton className="check">
        <span className="switch-track" aria-hidden="true" />
        <span>{children}</span>
      </SwitchButton>
    </SwitchField>
  );
}
