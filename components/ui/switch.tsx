import type { ComponentProps, ReactNode } from 'react';

import { cn } from './cn';

type SwitchProps = Omit<ComponentProps<'input'>, 'type' | 'role'> & {
  /** Says what is on when the switch is on. */
  label: ReactNode;
  /** The label is only for readers; the row around it says the same to the eye. */
  labelHidden?: boolean;
};

/** A native checkbox in the role of a switch: on is right and filled, off is left and hollow. */
export function Switch({ label, labelHidden = false, className, ...rest }: SwitchProps) {
  return (
    <label
      className={cn('inline-flex items-center gap-2 text-sm has-disabled:opacity-60', className)}
    >
      <input
        type="checkbox"
        role="switch"
        {...rest}
        className="relative h-4 w-7 shrink-0 cursor-pointer appearance-none rounded-full border border-edge bg-rule transition-colors duration-100 before:absolute before:top-0.5 before:left-0.5 before:size-2.5 before:rounded-full before:bg-sheet before:ring-1 before:ring-edge before:transition-[left] before:duration-100 checked:border-kelp checked:bg-kelp checked:before:left-3.5 checked:before:ring-kelp"
      />
      <span className={labelHidden ? 'sr-only' : undefined}>{label}</span>
    </label>
  );
}
