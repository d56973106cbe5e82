'use client';

import { useId, type ReactNode } from 'react';

import { cn } from './cn';
import { FieldContext } from './field-context';
import { useFormState } from './form-context';
import { Mark } from './mark';

type FieldProps = {
  label: ReactNode;
  /** Name of the control in the form; its error is found in the form's answer. */
  name?: string;
  /** Unit, shown behind the label. */
  unit?: string;
  hint?: ReactNode;
  /** One sentence; wins over the form's answer. */
  error?: string;
  required?: boolean;
  /** Says "optional" behind the label. */
  optional?: boolean;
  className?: string;
  /** One control: TextInput, TextArea, Select … */
  children: ReactNode;
};

export function Field({
  label,
  name,
  unit,
  hint,
  error,
  required = false,
  optional,
  className,
  children,
}: FieldProps) {
  const id = useId();
  const { state } = useFormState();
  const answered = state?.ok === false && name !== undefined ? state.fields[name] : undefined;
  const problem = error ?? answered;
  const hintId = hint ? `${id}-hint` : undefined;
  const errorId = problem ? `${id}-error` : undefined;
  const describedBy = [errorId, hintId].filter(Boolean).join(' ') || undefined;

  return (
    <div className={cn('grid content-start gap-1', className)}>
      <label htmlFor={id} className="text-sm font-medium">
        {label}
        {unit && (
          <>
            {' '}
            <span className="font-normal text-ink-3">({unit})</span>
          </>
        )}
        {optional && <span className="font-normal text-ink-3">, optional</span>}
      </label>
      <FieldContext value={{ id, name, describedBy, invalid: problem !== undefined, required }}>
        {children}
      </FieldContext>
      {problem && (
        <p id={errorId} className="flex gap-1.5 text-[0.8125rem] text-coral-ink">
          <Mark kind="problem" className="mt-0.5" />
          <span>{problem}</span>
        </p>
      )}
      {hint && (
        <p id={hintId} className="text-[0.8125rem] text-ink-3">
          {hint}
        </p>
      )}
    </div>
  );
}
