'use client';

import { startTransition, useActionState, type ReactNode } from 'react';

import { Button, type ButtonProps } from './button';
import type { FormActionFunction } from './form-state';
import { Mark } from './mark';
import { reachable } from './reachable';

type ActionButtonProps<Answer> = Omit<ButtonProps, 'onClick' | 'pending' | 'type'> & {
  action: FormActionFunction<Answer>;
  input: object;
  pendingLabel?: ReactNode;
};

/** One press, one server action: archive, restore, end a session. A refusal shows beside the button. */
export function ActionButton<Answer>({
  action,
  input,
  pendingLabel,
  children,
  ...rest
}: ActionButtonProps<Answer>) {
  const [state, dispatch, pending] = useActionState(reachable(action), null);
  return (
    <span className="inline-flex flex-wrap items-center">
      <Button {...rest} pending={pending} onClick={() => startTransition(() => dispatch(input))}>
        {pending && pendingLabel ? pendingLabel : children}
      </Button>
      <span role="status">
        {state?.ok === false && (
          <span className="ml-2 inline-flex items-center gap-1.5 text-[0.8125rem] text-coral-ink">
            <Mark kind="problem" /> {state.message}
          </span>
        )}
      </span>
    </span>
  );
}
