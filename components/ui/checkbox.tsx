import type { ComponentProps, ReactNode } from 'react';

import { cn } from './cn';

type CheckboxProps = Omit<ComponentProps<'input'>, 'type'> & { label: ReactNode; hint?: ReactNode };

export function Checkbox({ label, hint, className, ...rest }: CheckboxProps) {
  return (
    <label className={cn('flex items-start gap-2.5 text-sm has-disabled:opacity-60', className)}>
      <input
        type="checkbox"
        {...rest}
        className="mt-0.5 size-4 shrink-0 cursor-pointer rounded-[3px] accent-kelp"
      />
      <span>
        {label}
        {hint && <span className="block text-[0.8125rem] text-ink-3">{hint}</span>}
      </span>
    </label>
  );
}
