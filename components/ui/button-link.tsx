import type { VariantProps } from 'class-variance-authority';
import Link from 'next/link';
import type { ComponentProps } from 'react';

import { buttonStyle } from './button-style';
import { cn } from './cn';

type ButtonLinkProps = ComponentProps<typeof Link> & VariantProps<typeof buttonStyle>;

/** A link that looks like a button: it goes somewhere, it does not change anything. */
export function ButtonLink({ variant, size, className, ...rest }: ButtonLinkProps) {
  return <Link {...rest} className={cn(buttonStyle({ variant, size }), className)} />;
}
