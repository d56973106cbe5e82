import Link from 'next/link';
import type { ComponentProps } from 'react';

import { cn } from './cn';

export function TextLink({ className, ...rest }: ComponentProps<typeof Link>) {
  return <Link {...rest} className={cn('text-link', className)} />;
}
