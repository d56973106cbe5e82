'use client';

import { clsx } from 'clsx';
import type { ClipboardEvent, KeyboardEvent } from 'react';

interface SheetCellProps {
  place: string;
  label: string;
  value: string;
  numeric: boolean;
  off: boolean;
  /** Id of the sentence that says what is wrong with the cell, or null. */
  errorId: string | null;
  onType: (text: string) => void;
  onKeyDown: (event: KeyboardEvent<HTMLInputElement>) => void;
  onPaste: (event: ClipboardEvent<HTMLInputElement>) => void;
  onBlur: () => void;
}

export function SheetCell(props: SheetCellProps) {
  const { place, label, value, numeric, off, errorId, onType, ...events } = props;
  return (
    <td
      className={clsx(
        'border border-rule p-0',
        errorId !== null && 'outline-2 -outline-offset-2 outline-coral',
      )}
    >
      <input
        data-place={place}
        aria-label={label}
        aria-invalid={errorId !== null || undefined}
        aria-describedby={errorId ?? undefined}
        className={clsx(
          'h-9 w-full min-w-20 bg-transparent px-2 text-sm focus-visible:outline-2 focus-visible:-outline-offset-2 focus-visible:outline-tide',
          numeric && 'text-right font-mono tabular-nums',
          off && 'text-ink-3 line-through',
        )}
        inputMode={numeric ? 'decimal' : 'text'}
        autoComplete="off"
        spellCheck={false}
        value={value}
        onChange={(event) => onType(event.target.value)}
        {...events}
      />
    </td>
  );
}
