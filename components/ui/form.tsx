'use client';

import {
  startTransition,
  useActionState,
  useEffect,
  useEffectEvent,
  useRef,
  type ReactNode,
} from 'react';

import { cn } from './cn';
import { FormContext } from './form-context';
import type { FormActionFunction, FormState } from './form-state';
import { Notice } from './notice';
import { reachable } from './reachable';

type FormProps<Answer> = {
  action: FormActionFunction<Answer>;
  /** Accessible name, where no heading names the form. */
  label?: string;
  labelledBy?: string;
  className?: string;
  /** Called once with each answer that went well. */
  onDone?: (answer: Answer | undefined) => void;
  children: ReactNode;
};

/**
 * A form over a server action. Fields with a `name` find their own error in the answer; the first
 * wrong field takes the focus.
 */
export function Form<Answer>({
  action,
  label,
  labelledBy,
  className,
  onDone,
  children,
}: FormProps<Answer>) {
  const [state, dispatch, pending] = useActionState(reachable(action), null);
  const form = useRef<HTMLFormElement>(null);
  const handleAnswer = useEffectEvent((answer: FormState<Answer>) => {
    if (answer?.ok) onDone?.(answer.answer);
    if (answer?.ok === false) focusFirstError(form.current);
  });
  useEffect(() => handleAnswer(state), [state]);

  const more = state?.ok === false ? Object.keys(state.fields).length - 1 : 0;

  return (
    <form
      ref={form}
      noValidate
      action={dispatch}
      aria-label={label}
      aria-labelledby={labelledBy}
      className={cn('grid gap-4', className)}
      // React empties a form after its action; dispatching ourselves keeps what was typed.
      onSubmit={(event) => {
        event.preventDefault();
        if (pending) return;
        const data = new FormData(event.currentTarget, submitterOf(event.nativeEvent));
        startTransition(() => dispatch(data));
      }}
    >
      <FormContext value={{ state, pending }}>
        {state?.ok === false && (
          <Notice kind="problem" alert>
            {state.message}
            {more > 0 && ` ${more} more below.`}
          </Notice>
        )}
        {children}
      </FormContext>
    </form>
  );
}

function submitterOf(event: Event): HTMLElement | null {
  return event instanceof SubmitEvent ? event.submitter : null;
}

function focusFirstError(form: HTMLFormElement | null) {
  const wrong = form?.querySelector<HTMLElement>('[aria-invalid="true"]');
  (wrong ?? form?.querySelector<HTMLElement>('[role="alert"]'))?.focus();
}
