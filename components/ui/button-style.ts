import { cva } from 'class-variance-authority';

export const buttonStyle = cva(
  'inline-flex items-center justify-center gap-2 rounded-[5px] border text-center font-semibold leading-tight no-underline select-none disabled:opacity-55 aria-disabled:opacity-55 transition-colors duration-100',
  {
    variants: {
      variant: {
        primary: 'border-ink bg-ink text-paper enabled:hover:bg-ink-2 [a&]:hover:bg-ink-2',
        secondary:
          'border-edge/60 bg-sheet text-ink enabled:hover:border-ink [a&]:hover:border-ink',
        quiet:
          'border-transparent bg-transparent text-ink-2 enabled:hover:text-ink enabled:hover:bg-rule/50 [a&]:hover:text-ink [a&]:hover:bg-rule/50',
        danger:
          'border-coral-ink/60 bg-sheet text-coral-ink enabled:hover:bg-coral-ink enabled:hover:text-paper [a&]:hover:bg-coral-ink [a&]:hover:text-paper',
      },
      size: {
        small: 'min-h-8 px-2.5 py-1 text-[0.8125rem]',
        medium: 'min-h-9.5 px-4 py-2 text-sm',
      },
    },
    defaultVariants: { variant: 'secondary', size: 'medium' },
  },
);
