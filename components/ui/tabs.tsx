'use client';

import { Tabs as BaseTabs } from '@base-ui/react/tabs';
import type { ReactNode } from 'react';

import { cn } from './cn';

type TabsProps = {
  label: string;
  tabs: readonly { value: string; label: ReactNode; panel: ReactNode }[];
  /** Controlled, so that the address can hold it; leave out to start with the first. */
  value?: string;
  onChange?: (value: string) => void;
  className?: string;
};

export function Tabs({ label, tabs, value, onChange, className }: TabsProps) {
  return (
    <BaseTabs.Root
      value={value}
      defaultValue={value === undefined ? tabs[0]?.value : undefined}
      onValueChange={(next) => onChange?.(String(next))}
      className={cn('grid gap-4', className)}
    >
      <BaseTabs.List aria-label={label} className="flex flex-wrap gap-x-5 border-b border-rule">
        {tabs.map((tab) => (
          <BaseTabs.Tab
            key={tab.value}
            value={tab.value}
            className="-mb-px border-b-2 border-transparent py-1.5 text-sm text-ink-2 hover:text-ink data-active:border-coral data-active:font-semibold data-active:text-ink"
          >
            {tab.label}
          </BaseTabs.Tab>
        ))}
      </BaseTabs.List>
      {tabs.map((tab) => (
        <BaseTabs.Panel key={tab.value} value={tab.value}>
          {tab.panel}
        </BaseTabs.Panel>
      ))}
    </BaseTabs.Root>
  );
}
