import type { ReactNode } from 'react';
import { Menu as AriaMenu, MenuItem, MenuTrigger } from 'react-aria-components/Menu';
import { Popover } from 'react-aria-components/Popover';
import { Button, type ButtonProps } from './Button';
import type { Choice } from './Select';

export interface MenuProps<Id extends string> {
  /** What the button says. */
  label: ReactNode;
  items: readonly (Choice<Id> & { readonly href?: string })[];
  onAction: (id: Id) => void;
  button?: Omit<ButtonProps, 'children'>;
}

/** A button that opens a list of things to do. */
export function Menu<Id extends string>({ label, items, onAction, button }: MenuProps<Id>) {
  return (
    <MenuTrigger>
      <Button {...button}>
        {label} <span aria-hidden="true">▾</span>
      </Button>
      <Popover className="popover">
        <AriaMenu
          onAction={(id) => onAction(id as Id)}
          disabledKeys={items.filter((item) => item.disabled).map((item) => item.id)}
          className="outline-none"
        >
          {items.map((item) => (
            <MenuItem key={item.id} id={item.id} href={item.href} textValue={item.label} className="option">
              <span>{item.label}</span>
              {item.hint && <span className="muted ml-auto">{item.hint}</span>}
            </MenuItem>
          ))}
        </AriaMenu>
      </Popover>
    </MenuTrigger>
  );
}
