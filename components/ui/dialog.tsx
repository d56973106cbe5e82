'use client';

import { Dialog as BaseDialog } from '@base-ui/react/dialog';
import type { ReactElement, ReactNode } from 'react';

import { Button } from './button';
import { DialogSheet } from './dialog-parts';

type DialogProps = {
  /** The button that opens it; leave out and control `open` instead. */
  trigger?: ReactElement;
  title: ReactNode;
  description?: ReactNode;
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
  wide?: boolean;
  /** Buttons besides Close, at the end. */
  actions?: ReactNode;
  closeLabel?: string;
  children?: ReactNode;
};

export function Dialog({
  trigger,
  title,
  description,
  open,
  onOpenChange,
  wide,
  actions,
  closeLabel = 'Close',
  children,
}: DialogProps) {
  return (
    <BaseDialog.Root open={open} onOpenChange={(next) => onOpenChange?.(next)}>
      {trigger && <BaseDialog.Trigger render={trigger} />}
      <DialogSheet wide={wide}>
        <BaseDialog.Title className="font-serif text-xl font-semibold">{title}</BaseDialog.Title>
        {description && (
          <BaseDialog.Description className="text-sm text-ink-2">
            {description}
          </BaseDialog.Description>
        )}
        {children}
        <div className="flex flex-wrap justify-end gap-2">
          <BaseDialog.Close render={<Button>{closeLabel}</Button>} />
          {actions}
        </div>
      </DialogSheet>
    </BaseDialog.Root>
  );
}
