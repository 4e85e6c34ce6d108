import type { ReactNode } from 'react';
import { Tab, TabList, TabPanel, Tabs as AriaTabs } from 'react-aria-components/Tabs';

export interface TabItem {
  readonly id: string;
  readonly label: ReactNode;
  readonly content: ReactNode;
  readonly disabled?: boolean;
}

export interface TabsProps {
  label: string;
  items: readonly TabItem[];
  selected?: string;
  defaultSelected?: string;
  onSelect?: (id: string) => void;
}

/** Panels under tabs; arrow keys wrap and select at once. */
export function Tabs({ label, items, selected, defaultSelected, onSelect }: TabsProps) {
  return (
    <AriaTabs selectedKey={selected} defaultSelectedKey={defaultSelected} onSelectionChange={(key) => onSelect?.(String(key))}>
      <TabList aria-label={label} className="tabs">
        {items.map((item) => (
          <Tab key={item.id} id={item.id} isDisabled={item.disabled} className="tab">
            {item.label}
          </Tab>
        ))}
      </TabList>
      {items.map((item) => (
        <TabPanel key={item.id} id={item.id} className="pt-3">
          {item.content}
        </TabPanel>
      ))}
    </AriaTabs>
  );
}
