'use client';

import type { ComponentProps } from 'react';

import { cn } from './cn';
import { controlStyle } from './control-style';
import { useFieldControl } from './field-context';

export function TextArea({ className, ...rest }: ComponentProps<'textarea'>) {
  return (
    <textarea
      rows={4}
      {...useFieldControl()}
      {...rest}
      className={cn(controlStyle, 'resize-y', className)}
    />
  );
}
