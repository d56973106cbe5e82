'use client';

import { AlertDialog } from '@base-ui/react/alert-dialog';
import { useState, type ReactElement, type ReactNode } from 'react';

import { Button } from '@/components/ui/button';
import { DialogSheet } from '@/components/ui/dialog-parts';
import { Form } from '@/components/ui/form';
import type { FormActionFunction } from '@/components/ui/form-state';
import { SubmitButton } from '@/components/ui/submit-button';

interface FormDialogProps {
  trigger: ReactElement;
  title: string;
  /** What will happen, before the fields. */
  description: ReactNode;
  confirmLabel: string;
  pendingLabel: string;
  variant?: 'primary' | 'danger';
  action: FormActionFunction<unknown>;
  /** Fields, and hidden inputs. */
  children: ReactNode;
}

/** A decision with something to write: it stays open, with what was typed, when the server refuses. */
export function FormDialog({
  trigger,
  title,
  description,
  confirmLabel,
  pendingLabel,
  variant = 'primary',
  action,
  children,
}: FormDialogProps) {
  const [open, setOpen] = useState(false);
  return (
    <AlertDialog.Root open={open} onOpenChange={setOpen}>
      <AlertDialog.Trigger render={trigger} />
      <DialogSheet>
        <AlertDialog.Title className="font-serif text-xl font-semibold">{title}</AlertDialog.Title>
        <AlertDialog.Description render={<div />} className="grid gap-2 text-sm text-ink-2">
          {description}
        </AlertDialog.Description>
        <Form action={action} label={title} onDone={() => setOpen(false)}>
          {children}
          <div className="flex flex-wrap justify-end gap-2">
            <AlertDialog.Close render={<Button>Cancel</Button>} />
            <SubmitButton variant={variant} pendingLabel={pendingLabel}>
              {confirmLabel}
            </SubmitButton>
          </div>
        </Form>
      </DialogSheet>
    </AlertDialog.Root>
  );
}
