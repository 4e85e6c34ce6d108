import type { ReactElement } from 'react';
import { Tooltip as AriaTooltip, TooltipTrigger } from 'react-aria-components/Tooltip';

export interface TooltipProps {
  /** A few words; never the only place where something is said. */
  text: string;
  /** One control of this room, such as a Button. */
  children: ReactElement;
}

export const Tooltip = ({ text, children }: TooltipProps) => (
  <TooltipTrigger delay={500} closeDelay={100}>
    {children}
    <AriaTooltip offset={6} className="tooltip">
      {text}
    </AriaTooltip>
  </TooltipTrigger>
);
