'use client';

import { AlertDialog } from '@base-ui/react/alert-dialog';
import {
  startTransition,
  useActionState,
  useState,
  type ReactElement,
  type ReactNode,
} from 'react';

import { Button } from './button';
import { DialogSheet } from './dialog-parts';
import type { FormActionFunction, FormState } from './form-state';
import { Notice } from './notice';
import { reachable } from './reachable';

type ConfirmDialogProps<Answer> = {
  trigger: ReactElement;
  /** A question: "Discard this fit?" */
  title: ReactNode;
  /** The verb: "Discard the fit". */
  confirmLabel: ReactNode;
  cancelLabel?: ReactNode;
  /** Server action, or any function of the same form. */
  action: FormActionFunction<Answer>;
  input: object;
  onDone?: () => void;
  variant?: 'danger' | 'primary';
  /** What will be lost and what stays. */
  children?: ReactNode;
};

/** Asks before what cannot be undone. It stays open, with the reason, when the server refuses. */
export function ConfirmDialog<Answer>({
  trigger,
  title,
  confirmLabel,
  cancelLabel = 'Cancel',
  action,
  input,
  onDone,
  variant = 'danger',
  children,
}: ConfirmDialogProps<Answer>) {
  const [open, setOpen] = useState(false);
  const [state, confirm, pending] = useActionState(async (previous: FormState<Answer>) => {
    const answer = await reachable(action)(previous, input);
    if (answer?.ok) {
      setOpen(false);
      onDone?.();
    }
    return answer;
  }, null);

  return (
    <AlertDialog.Root open={open} onOpenChange={(next) => setOpen(pending || next)}>
      <AlertDialog.Trigger render={trigger} />
      <DialogSheet>
        <AlertDialog.Title className="font-serif text-xl font-semibold">{title}</AlertDialog.Title>
        {children && (
          <AlertDialog.Description render={<div />} className="grid gap-2 text-sm text-ink-2">
            {children}
          </AlertDialog.Description>
        )}
        {state?.ok === false && (
          <Notice kind="problem" alert>
            {state.message}
          </Notice>
        )}
        <div className="flex flex-wrap justify-end gap-2">
          <AlertDialog.Close render={<Button>{cancelLabel}</Button>} />
          <Button variant={variant} pending={pending} onClick={() => startTransition(confirm)}>
            {confirmLabel}
          </Button>
        </div>
      </DialogSheet>
    </AlertDialog.Root>
  );
}
