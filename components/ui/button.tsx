import type { VariantProps } from 'class-variance-authority';
import type { ComponentProps } from 'react';

import { buttonStyle } from './button-style';
import { cn } from './cn';

export type ButtonProps = ComponentProps<'button'> &
  VariantProps<typeof buttonStyle> & {
    /** Work is under way: the button keeps its place and focus, but a second press does nothing. */
    pending?: boolean;
  };

export function Button({
  variant,
  size,
  pending = false,
  className,
  type = 'button',
  onClick,
  children,
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      aria-disabled={pending || rest['aria-disabled'] || undefined}
      aria-busy={pending || undefined}
      className={cn(buttonStyle({ variant, size }), className)}
      onClick={pending ? (event) => event.preventDefault() : onClick}
    >
      {children}
    </button>
  );
}
