'use client';

import { Menu as BaseMenu } from '@base-ui/react/menu';
import Link from 'next/link';
import type { ReactNode } from 'react';

const ITEM =
  'flex cursor-pointer items-center gap-2 px-3.5 py-1.5 outline-none select-none data-highlighted:bg-rule/60 data-disabled:cursor-not-allowed data-disabled:text-ink-3';

export function MenuItem({
  onSelect,
  disabled,
  children,
}: {
  onSelect: () => void;
  disabled?: boolean;
  children: ReactNode;
}) {
  return (
    <BaseMenu.Item className={ITEM} onClick={onSelect} disabled={disabled}>
      {children}
    </BaseMenu.Item>
  );
}

export function MenuLink({
  href,
  current = false,
  children,
}: {
  href: string;
  current?: boolean;
  children: ReactNode;
}) {
  return (
    <BaseMenu.LinkItem
      className={current ? `${ITEM} font-semibold` : ITEM}
      closeOnClick
      aria-current={current ? 'page' : undefined}
      render={<Link href={href} />}
    >
      {children}
    </BaseMenu.LinkItem>
  );
}

export function MenuGroup({ label, children }: { label: ReactNode; children: ReactNode }) {
  return (
    <BaseMenu.Group>
      <BaseMenu.GroupLabel className="px-3.5 pt-2 pb-1 text-xs text-ink-3">
        {label}
      </BaseMenu.GroupLabel>
      {children}
    </BaseMenu.Group>
  );
}

export function MenuRadioGroup({
  label,
  value,
  options,
  onChange,
}: {
  label: ReactNode;
  value: string;
  options: readonly { value: string; label: ReactNode }[];
  onChange: (value: string) => void;
}) {
  return (
    <MenuGroup label={label}>
      <BaseMenu.RadioGroup value={value} onValueChange={(next) => onChange(String(next))}>
        {options.map((option) => (
          <BaseMenu.RadioItem key={option.value} value={option.value} className={ITEM} closeOnClick>
            <span aria-hidden="true" className="w-3.5 text-kelp">
              {option.value === value ? '●' : '○'}
            </span>
            {option.label}
          </BaseMenu.RadioItem>
        ))}
      </BaseMenu.RadioGroup>
    </MenuGroup>
  );
}

export function MenuLine() {
  return <BaseMenu.Separator className="my-1.5 border-t border-rule" />;
}
