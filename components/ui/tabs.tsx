'use client';

import type { ReactNode } from 'react';
import { Tab, TabList, TabPanel, Tabs as AriaTabs } from 'react-aria-components';

export type TabsProps = {
  /** Name of the whole list for readers. */
  label: string;
  tabs: readonly { id: string; label: ReactNode; panel: ReactNode }[];
  selected?: string;
  defaultSelected?: string;
  onSelect?: (id: string) => void;
  /** Beside the tabs at the right. */
  aside?: ReactNode;
  className?: string;
};

/** Panes of one page. What should survive a reload belongs in the address: use TabLinks there. */
export function Tabs({ label, tabs, selected, defaultSelected, onSelect, aside, className = '' }: TabsProps) {
  return (
    <AriaTabs
      {...(selected !== undefined && { selectedKey: selected })}
      {...(defaultSelected !== undefined && { defaultSelectedKey: defaultSelected })}
      {...(onSelect && { onSelectionChange: (key) => onSelect(String(key)) })}
      className={className}
    >
      <div className="flex flex-wrap items-end gap-x-4 border-b border-rule">
        <TabList aria-label={label} className="flex flex-wrap gap-1">
          {tabs.map((tab) => (
            <Tab key={tab.id} id={tab.id} className={tabClass}>
              {tab.label}
            </Tab>
          ))}
        </TabList>
        {aside !== undefined && <div className="ml-auto">{aside}</div>}
      </div>
      {tabs.map((tab) => (
        <TabPanel key={tab.id} id={tab.id} className="pt-4">
          {tab.panel}
        </TabPanel>
      ))}
    </AriaTabs>
  );
}

const tabClass =
  '-mb-px flex min-h-target cursor-pointer items-center gap-2.5 rounded-t-panel border border-b-0 border-transparent px-4 py-2 font-semibold text-ink2 hover:text-ink data-[selected]:border-rule data-[selected]:bg-card data-[selected]:text-ink';
