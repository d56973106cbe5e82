'use client';

import type { ClipboardEvent, KeyboardEvent } from 'react';

import { SheetCell } from './sheet-cell';
import type { SheetColumn } from './sheet-column';
import type { CellPlace } from './sheet-keys';
import type { SheetRow } from './sheet-rows';
import type { SheetModel } from './use-sheet';

interface SheetRowViewProps {
  row: SheetRow;
  index: number;
  columns: readonly SheetColumn[];
  errorIdOf: (column: number) => string | null;
  sheet: SheetModel;
  onKeyDown: (event: KeyboardEvent<HTMLInputElement>, at: CellPlace) => void;
  onPaste: (event: ClipboardEvent<HTMLInputElement>, at: CellPlace) => void;
  onRemove: () => void;
}

export function SheetRowView(props: SheetRowViewProps) {
  const { row, index, columns, errorIdOf, sheet, onKeyDown, onPaste, onRemove } = props;
  const rowName = `row ${index + 1}`;
  return (
    <tr>
      <th
        scope="row"
        className="px-1 text-right font-mono text-xs font-normal text-ink-3 tabular-nums"
      >
        {index + 1}
      </th>
      {columns.map((column, at) => (
        <SheetCell
          key={column.name}
          place={`${index}:${at}`}
          label={`${column.name}, ${rowName}`}
          value={row.cells[at] ?? ''}
          numeric={column.numeric}
          off={!row.on}
          errorId={errorIdOf(at)}
          onType={(text) => sheet.type(row.id, at, text)}
          onKeyDown={(event) => onKeyDown(event, { row: index, column: at })}
          onPaste={(event) => onPaste(event, { row: index, column: at })}
          onBlur={sheet.settle}
        />
      ))}
      <td className="text-center">
        <input
          type="checkbox"
          className="size-5 align-middle accent-kelp"
          aria-label={`use ${rowName}`}
          checked={row.on}
          onChange={() => sheet.toggleRow(row.id)}
        />
      </td>
      <td className="text-center">
        {!row.kept && (
          <button
            type="button"
            className="size-8 rounded text-base text-ink-2 hover:text-coral-ink"
            aria-label={`remove ${rowName}`}
            onClick={onRemove}
          >
            ×
          </button>
        )}
      </td>
    </tr>
  );
}
