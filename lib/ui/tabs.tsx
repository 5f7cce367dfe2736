"use client";
import type { ReactNode } from "react";
import { Tabs as AriaTabs, Tab, TabList, TabPanel } from "react-aria-components";

export interface TabItem {
  id: string;
  label: ReactNode;
  /** How many lie in it. */
  count?: number;
  content: ReactNode;
}

export interface TabsProps {
  label: string;
  items: readonly TabItem[];
  selected?: string;
  defaultSelected?: string;
  onSelect?: (id: string) => void;
}

/** Parts of one thing, one shown at a time. Arrow keys move between them. */
export function Tabs({ label, items, selected, defaultSelected, onSelect }: TabsProps) {
  return (
    <AriaTabs
      {...(selected === undefined ? {} : { selectedKey: selected })}
      {...(defaultSelected === undefined ? {} : { defaultSelectedKey: defaultSelected })}
      onSelectionChange={(key) => onSelect?.(String(key))}
    >
      <TabList aria-label={label} className="tab-list">
        {items.map((item) => (
          <Tab key={item.id} id={item.id} className="tab">
            {item.label}
            {item.count !== undefined && <span className="num ml-2 text-sm text-ink-3">{item.count}</span>}
          </Tab>
        ))}
      </TabList>
      {items.map((item) => (
        <TabPanel key={item.id} id={item.id} className="pt-4">
          {item.content}
        </TabPanel>
      ))}
    </AriaTabs>
  );
}
