import { clsx, type ClassValue } from 'clsx';
import { twMerge } from 'tailwind-merge';

/** Joins class names; a later utility wins over an earlier one of the same kind. */
export function cn(...classes: ClassValue[]): string {
  return twMerge(clsx(classes));
}
