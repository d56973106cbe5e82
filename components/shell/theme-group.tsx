'use client';

import { MenuRadioGroup } from '@/components/ui/menu-items';

import { themeFrom, type Theme } from './theme';

const OPTIONS = [
  { value: 'system', label: 'As the system' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
] as const;

type ThemeGroupProps = { theme: Theme; onChange: (theme: Theme) => void };

export function ThemeGroup({ theme, onChange }: ThemeGroupProps) {
  return (
    <MenuRadioGroup
      label="Appearance"
      value={theme}
      options={OPTIONS}
      onChange={(value) => onChange(themeFrom(value))}
    />
  );
}
