'use client';

import { Menu as BaseMenu } from '@base-ui/react/menu';
import type { ReactElement, ReactNode } from 'react';

type MenuProps = {
  /** The button that opens it. */
  trigger: ReactElement;
  align?: 'start' | 'center' | 'end';
  /** MenuItem, MenuLink, MenuGroup, MenuRadioGroup. */
  children: ReactNode;
};

export function Menu({ trigger, align = 'start', children }: MenuProps) {
  return (
    <BaseMenu.Root>
      <BaseMenu.Trigger render={trigger} />
      <BaseMenu.Portal>
        <BaseMenu.Positioner align={align} sideOffset={6} className="z-50 outline-none">
          <BaseMenu.Popup className="max-h-[var(--available-height)] min-w-44 overflow-y-auto rounded-[5px] border border-edge bg-sheet py-1.5 text-sm text-ink outline-none">
            {children}
          </BaseMenu.Popup>
        </BaseMenu.Positioner>
      </BaseMenu.Portal>
    </BaseMenu.Root>
  );
}
