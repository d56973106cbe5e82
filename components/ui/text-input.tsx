'use client';

import type { ComponentProps } from 'react';

import { cn } from './cn';
import { controlStyle } from './control-style';
import { useFieldControl } from './field-context';

type TextInputProps = ComponentProps<'input'> & {
  /** A number: set in the mono with tabular figures, with a number keyboard on a phone. */
  numeric?: boolean;
};

export function TextInput({ numeric = false, className, ...rest }: TextInputProps) {
  return (
    <input
      type="text"
      inputMode={numeric ? 'decimal' : undefined}
      autoComplete="off"
      {...useFieldControl()}
      {...rest}
      className={cn(controlStyle, numeric && 'figures', className)}
    />
  );
}
