'use client';

import type { ComponentProps } from 'react';

import { cn } from './cn';
import { controlStyle } from './control-style';
import { useFieldControl } from './field-context';

type SelectProps = ComponentProps<'select'> & {
  /** Choices; or give <option> children. */
  options?: readonly { value: string; label: string; disabled?: boolean }[];
};

/** The platform's own select: works with any keyboard, reader and phone. */
export function Select({ options, className, children, ...rest }: SelectProps) {
  return (
    <span className="relative block">
      <select
        {...useFieldControl()}
        {...rest}
        className={cn(controlStyle, 'appearance-none pr-8', className)}
      >
        {options?.map((option) => (
          <option key={option.value} value={option.value} disabled={option.disabled}>
            {option.label}
          </option>
        ))}
        {children}
      </select>
      <svg
        aria-hidden="true"
        viewBox="0 0 12 12"
        className="pointer-events-none absolute top-1/2 right-3 size-2.5 -translate-y-1/2 fill-none stroke-ink-2 stroke-2"
      >
        <path d="M1 4l5 5 5-5" />
      </svg>
    </span>
  );
}
