import type { ReactNode } from 'react';
import { Toolbar as AriaToolbar } from 'react-aria-components/Toolbar';
import { classes } from './classes';

export interface ToolbarProps {
  label: string;
  children: ReactNode;
  orientation?: 'horizontal' | 'vertical';
  className?: string;
}

/** Three controls or more in one tab stop, walked by the arrow keys. */
export const Toolbar = ({ label, children, orientation = 'horizontal', className }: ToolbarProps) => (
  <AriaToolbar aria-label={label} orientation={orientation} className={classes('toolbar', className)}>
    {children}
  </AriaToolbar>
);

export const ToolbarGap = () => <span className="toolbar-gap" aria-hidden="true" />;
