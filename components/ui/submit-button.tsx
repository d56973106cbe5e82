'use client';

import type { ReactNode } from 'react';
import { useFormStatus } from 'react-dom';

import { Button, type ButtonProps } from './button';
import { useFormState } from './form-context';

type SubmitButtonProps = Omit<ButtonProps, 'type' | 'pending'> & {
  /** Shown while the form is on its way. */
  pendingLabel?: ReactNode;
};

export function SubmitButton({
  pendingLabel,
  variant = 'primary',
  children,
  ...rest
}: SubmitButtonProps) {
  const status = useFormStatus();
  const form = useFormState();
  const pending = status.pending || form.pending;
  return (
    <Button {...rest} variant={variant} type="submit" pending={pending}>
      {pending && pendingLabel ? pendingLabel : children}
    </Button>
  );
}
