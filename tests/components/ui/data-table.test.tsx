import { render, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { DataTable, type Column } from '@/components/ui/data-table';

type Row = { id: string; energyKeV: number };

const COLUMNS: Column<Row>[] = [
  { key: 'id', label: 'Run', rowHeader: true, cell: (row) => row.id },
  { key: 'energy', label: 'Energy (keV)', numeric: true, cell: (row) => row.energyKeV },
];
const ROWS: Row[] = [
  { id: 'run 1', energyKeV: 2 },
  { id: 'run 2', energyKeV: 12.5 },
];

describe('DataTable', () => {
  it('is a named table with column and row headers', () => {
    render(<DataTable caption="Points" columns={COLUMNS} rows={ROWS} rowKey={(row) => row.id} />);
    const table = screen.getByRole('table', { name: 'Points' });
    expect(
      within(table)
        .getAllByRole('columnheader')
        .map((cell) => cell.textContent),
    ).toEqual(['Run', 'Energy (keV)']);
    const row = within(table).getByRole('row', { name: 'run 2 12.5' });
    expect(within(row).getByRole('rowheader').getAttribute('scope')).toBe('row');
    expect(within(row).getByRole('cell').textContent).toBe('12.5');
  });

  it('can be scrolled with the keyboard when it may be wider than the window', () => {
    render(<DataTable caption="Points" columns={COLUMNS} rows={ROWS} rowKey={(row) => row.id} />);
    expect(screen.getByRole('region', { name: 'Points' }).tabIndex).toBe(0);
  });

  it('keeps the name of a column with each cell when rows become blocks', () => {
    render(
      <DataTable stacks caption="Points" columns={COLUMNS} rows={ROWS} rowKey={(row) => row.id} />,
    );
    expect(screen.queryByRole('region')).toBeNull();
    const energies = screen.getAllByRole('cell').map((cell) => cell.dataset.label);
    expect(energies).toEqual(['Energy (keV)', 'Energy (keV)']);
  });
});
