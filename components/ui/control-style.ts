/** Shared look of text inputs, text areas and selects. */
export const controlStyle =
  'w-full min-w-0 rounded-[4px] border border-edge bg-sheet px-3 py-2 text-[0.9375rem] leading-snug text-ink placeholder:text-ink-3 hover:border-ink-2 disabled:opacity-60 [&[readonly]]:border-rule [&[readonly]]:bg-transparent aria-invalid:border-coral-ink aria-invalid:ring-1 aria-invalid:ring-coral-ink';
