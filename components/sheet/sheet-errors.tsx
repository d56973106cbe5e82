'use client';

export interface SheetError {
  rowId: number;
  column: number;
  /** A full sentence that names row and column. */
  message: string;
}

interface SheetErrorsProps {
  id: string;
  errors: readonly SheetError[];
  onGoTo: (rowId: number, column: number) => void;
}

/** Every bad cell by name; each sentence leads to its cell. */
export function SheetErrors({ id, errors, onGoTo }: SheetErrorsProps) {
  return (
    <ul
      aria-live="polite"
      aria-label="cells to mend"
      className="mt-2 space-y-1 text-sm empty:hidden"
    >
      {errors.map((error) => (
        <li key={`${error.rowId}:${error.column}`} id={`${id}-${error.rowId}-${error.column}`}>
          <button
            type="button"
            className="text-left text-coral-ink underline decoration-dotted underline-offset-4"
            onClick={() => onGoTo(error.rowId, error.column)}
          >
            {error.message}
          </button>
        </li>
      ))}
    </ul>
  );
}
