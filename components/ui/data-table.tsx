import type { ReactNode } from 'react';

import { cn } from './cn';

export type Column<Row> = {
  key: string;
  label: ReactNode;
  /** Right-aligned tabular figures. */
  numeric?: boolean;
  /** The cell that names the row. */
  rowHeader?: boolean;
  /** The column's name is only for readers (a column of buttons). */
  labelHidden?: boolean;
  className?: string;
  cell: (row: Row, index: number) => ReactNode;
};

type DataTableProps<Row> = {
  caption: ReactNode;
  /** The caption is only for readers: a heading above says the same. */
  captionHidden?: boolean;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row, index: number) => string | number;
  rowClassName?: (row: Row) => string | undefined;
  /** On a narrow window each row becomes a block; otherwise the table scrolls sideways. */
  stacks?: boolean;
  dense?: boolean;
  className?: string;
};

export function DataTable<Row>({
  caption,
  captionHidden = false,
  columns,
  rows,
  rowKey,
  rowClassName,
  stacks = false,
  dense = false,
  className,
}: DataTableProps<Row>) {
  const pad = dense ? 'py-1' : 'py-2';
  return (
    <div
      className={cn('overflow-x-auto', className)}
      tabIndex={stacks ? undefined : 0}
      role={stacks ? undefined : 'region'}
      aria-label={stacks ? undefined : typeof caption === 'string' ? caption : 'Table'}
    >
      <table
        role="table"
        className={cn('w-full border-collapse text-left text-sm', stacks && 'table-stacks')}
      >
        <caption
          className={captionHidden ? 'sr-only' : 'pb-2 text-left text-sm font-semibold text-ink-2'}
        >
          {caption}
        </caption>
        <thead role="rowgroup">
          <tr role="row" className="border-b border-ink-2">
            {columns.map((column) => (
              <th
                key={column.key}
                role="columnheader"
                scope="col"
                className={cn(
                  'pr-6 pb-1.5 align-bottom text-[0.8125rem] font-normal text-ink-3 last:pr-0',
                  column.numeric && 'text-right',
                  column.className,
                )}
              >
                <span className={column.labelHidden ? 'sr-only' : undefined}>{column.label}</span>
              </th>
            ))}
          </tr>
        </thead>
        <tbody role="rowgroup">
          {rows.map((row, index) => (
            <tr
              key={rowKey(row, index)}
              role="row"
              className={cn('border-b border-rule', rowClassName?.(row))}
            >
              {columns.map((column) => {
                const look = cn(
                  'pr-6 align-baseline last:pr-0',
                  pad,
                  column.numeric && 'figures text-right',
                  column.className,
                );
                const label = typeof column.label === 'string' ? column.label : undefined;
                return column.rowHeader ? (
                  <th
                    key={column.key}
                    role="rowheader"
                    scope="row"
                    className={cn(look, 'font-medium')}
                  >
                    {column.cell(row, index)}
                  </th>
                ) : (
                  <td
                    key={column.key}
                    role="cell"
                    data-label={column.labelHidden ? undefined : label}
                    className={look}
                  >
                    {stacks ? (
                      <div className="min-w-0">{column.cell(row, index)}</div>
                    ) : (
                      column.cell(row, index)
                    )}
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
