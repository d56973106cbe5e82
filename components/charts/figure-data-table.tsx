import { tableCell, type FigureTable } from './figure-table';

/** The table behind a figure, scrolling within its own frame. */
export function FigureDataTable({ caption, table }: { caption: string; table: FigureTable }) {
  return (
    <div
      role="region"
      aria-label={`${caption}, table`}
      tabIndex={0}
      className="mt-2 max-h-80 overflow-auto border-y border-rule"
    >
      <table className="w-full border-collapse text-[0.8125rem]">
        <caption className="sr-only">{caption}</caption>
        <thead className="sticky top-0 bg-paper">
          <tr>
            {table.columns.map((column) => (
              <th
                key={column}
                scope="col"
                className="px-2 py-1.5 text-right font-medium text-ink-2 first:pl-0 first:text-left"
              >
                {column}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.rows.map((row, index) => (
            <tr key={index} className="border-t border-rule">
              {row.map((cell, column) => (
                <td
                  key={column}
                  className="px-2 py-1 text-right figures first:pl-0 first:text-left"
                  title={typeof cell === 'number' ? String(cell) : undefined}
                >
                  {tableCell(cell)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
