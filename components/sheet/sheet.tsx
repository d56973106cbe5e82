'use client';

import { useId, useRef, useState, type ClipboardEvent, type KeyboardEvent } from 'react';
import { flushSync } from 'react-dom';

import { isBlock, pastedBlock } from './paste-block';
import type { SheetColumn } from './sheet-column';
import { SheetErrors, type SheetError } from './sheet-errors';
import { keyWish, type CellPlace } from './sheet-keys';
import { SheetRowView } from './sheet-row-view';
import { SheetTools } from './sheet-tools';
import type { SheetModel } from './use-sheet';

interface SheetProps {
  caption: string;
  columns: readonly SheetColumn[];
  sheet: SheetModel;
  errors: readonly SheetError[];
  maxRows: number;
}

/**
 * A small spreadsheet: plain inputs in a plain table, so that reading aloud, zoom and touch work as
 * everywhere. A block pasted into a cell spreads over the cells to the right and below.
 */
export function Sheet({ caption, columns, sheet, errors, maxRows }: SheetProps) {
  const table = useRef<HTMLTableElement>(null);
  const id = useId();
  const [news, setNews] = useState('');
  const { rows } = sheet.content;

  const focus = ({ row, column }: CellPlace) => {
    const cell = table.current?.querySelector<HTMLInputElement>(`[data-place="${row}:${column}"]`);
    cell?.focus();
    cell?.select();
  };
  const addRow = () => {
    if (rows.length >= maxRows) return setNews(`A scan has at most ${maxRows} rows.`);
    flushSync(() => sheet.addRow(rows.length));
    focus({ row: rows.length, column: 0 });
  };
  const removeRow = (rowId: number, index: number) => {
    flushSync(() => sheet.removeRow(rowId));
    setNews(`Row ${index + 1} removed. Undo brings it back.`);
    focus({ row: Math.min(index, rows.length - 2), column: 0 });
  };
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>, at: CellPlace) => {
    const wish = keyWish(event, at);
    if (wish === null) return;
    event.preventDefault();
    if (wish.kind !== 'move') return sheet[wish.kind]();
    sheet.settle();
    if (event.key === 'Enter' && wish.to.row === rows.length) return addRow();
    focus(wish.to);
  };
  const onPaste = (event: ClipboardEvent<HTMLInputElement>, at: CellPlace) => {
    const text = event.clipboardData.getData('text/plain');
    if (!isBlock(text)) return;
    event.preventDefault();
    const block = pastedBlock(text, columns.length - at.column);
    if (at.row + block.cells.length > maxRows) {
      return setNews(
        `Nothing was pasted: ${block.cells.length} rows from row ${at.row + 1} on are more than ${maxRows}.`,
      );
    }
    sheet.paste(at.row, at.column, block.cells);
    setNews(block.words);
  };

  return (
    <div>
      <SheetTools sheet={sheet} onAddRow={addRow} news={news} />
      <div className="relative overflow-x-auto" role="region" aria-label={caption} tabIndex={0}>
        <table ref={table} className="w-full border-collapse bg-sheet text-sm">
          <caption className="sr-only">{caption}</caption>
          <thead>
            <tr className="text-left text-xs text-ink-2">
              <th scope="col" className="w-9 px-1 py-1.5 font-medium">
                <span className="sr-only">row</span>
              </th>
              {columns.map((column) => (
                <th key={column.name} scope="col" className="px-2 py-1.5 font-medium">
                  {column.name}
                  {column.unit !== '' && <span className="text-ink-3"> ({column.unit})</span>}
                </th>
              ))}
              <th scope="col" className="w-12 px-2 py-1.5 font-medium">
                used
              </th>
              <th scope="col" className="w-9">
                <span className="sr-only">remove</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row, index) => (
              <SheetRowView
                key={row.id}
                row={row}
                index={index}
                columns={columns}
                errorIdOf={(column) =>
                  errors.some((error) => error.rowId === row.id && error.column === column)
                    ? `${id}-${row.id}-${column}`
                    : null
                }
                sheet={sheet}
                onKeyDown={onKeyDown}
                onPaste={onPaste}
                onRemove={() => removeRow(row.id, index)}
              />
            ))}
          </tbody>
        </table>
      </div>
      <SheetErrors
        id={id}
        errors={errors}
        onGoTo={(rowId, column) =>
          focus({ row: rows.findIndex((row) => row.id === rowId), column })
        }
      />
    </div>
  );
}
