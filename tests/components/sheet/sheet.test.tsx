import { fireEvent, render, screen, within } from '@testing-library/react';
import { useMemo } from 'react';
import { describe, expect, it } from 'vitest';

import { readTypedPoints } from '@/components/scan/typed-points';
import { Sheet } from '@/components/sheet/sheet';
import { sheetContent, type SheetLine } from '@/components/sheet/sheet-rows';
import { useSheet } from '@/components/sheet/use-sheet';

const COLUMNS = [
  { name: 'energy', unit: 'keV', numeric: true },
  { name: 'fraction', unit: '', numeric: true },
  { name: 'σ', unit: '', numeric: true },
  { name: 'note', unit: '', numeric: false },
];

function Grid({
  lines = [],
  blank = 3,
  maxRows = 200,
}: {
  lines?: SheetLine[];
  blank?: number;
  maxRows?: number;
}) {
  const sheet = useSheet(() => sheetContent(lines, 4, blank), 4);
  const typed = useMemo(() => readTypedPoints(sheet.content.rows, 'fraction'), [sheet.content]);
  return (
    <>
      <Sheet
        caption="Points"
        columns={COLUMNS}
        sheet={sheet}
        errors={typed.errors}
        maxRows={maxRows}
      />
      <pre>{JSON.stringify(typed.points)}</pre>
    </>
  );
}

const cell = (column: string, row: number) =>
  screen.getByRole<HTMLInputElement>('textbox', { name: `${column}, row ${row}` });
const points = () =>
  JSON.parse(screen.getByText(/^\[/, { selector: 'pre' }).textContent ?? '') as {
    energyKeV: number;
    value: number;
    enabled: boolean;
  }[];
const paste = (target: HTMLElement, text: string) =>
  fireEvent.paste(target, { clipboardData: { getData: () => text } });
const type = (target: HTMLElement, value: string) =>
  fireEvent.change(target, { target: { value } });

describe('pasting a block', () => {
  it('spreads cells from a spreadsheet, with decimal commas, and adds the rows that are missing', () => {
    render(<Grid blank={1} />);
    paste(cell('energy', 1), '2,5\t0,742\t0,004\r\n4\t0,731\t0,004\tfirst night\r\n');
    expect(points()).toMatchObject([
      { energyKeV: 2.5, value: 0.742 },
      { energyKeV: 4, value: 0.731 },
    ]);
    expect(cell('note', 2).value).toBe('first night');
    expect(screen.getByRole('status').textContent).toBe('Pasted 2 rows.');
  });

  it('leaves out a heading line and says so', () => {
    render(<Grid />);
    paste(cell('energy', 1), 'E (keV)\tF\tdF\n2\t0.7\t0.01');
    expect(points()).toHaveLength(1);
    expect(screen.getByRole('status').textContent).toContain('heading line was left out');
  });

  it('takes one column of decimal commas as one column', () => {
    render(<Grid />);
    paste(cell('fraction', 1), '0,742\n0,739');
    expect([cell('fraction', 1).value, cell('fraction', 2).value]).toEqual(['0,742', '0,739']);
    expect(cell('σ', 1).value).toBe('');
  });

  it('pastes nothing when it would go beyond the last row, and says so', () => {
    render(<Grid blank={2} maxRows={2} />);
    paste(cell('energy', 1), '1\t0.5\t0.1\n2\t0.5\t0.1\n3\t0.5\t0.1');
    expect(cell('energy', 1).value).toBe('');
    expect(screen.getByRole('status').textContent).toContain('Nothing was pasted');
  });
});

describe('undo and redo', () => {
  it('takes a pasted block back as one step and brings it again', () => {
    render(<Grid />);
    paste(cell('energy', 1), '2\t0.7\t0.01\n3\t0.6\t0.01');
    fireEvent.click(screen.getByRole('button', { name: 'Undo' }));
    expect(cell('energy', 1).value).toBe('');
    fireEvent.click(screen.getByRole('button', { name: 'Redo' }));
    expect(points()).toHaveLength(2);
  });

  it('counts typing in one cell as one step, and answers to Ctrl+Z and Ctrl+Shift+Z', () => {
    render(<Grid />);
    type(cell('energy', 1), '1');
    type(cell('energy', 1), '12');
    fireEvent.blur(cell('energy', 1));
    type(cell('energy', 1), '123');
    fireEvent.keyDown(cell('energy', 1), { key: 'z', ctrlKey: true });
    expect(cell('energy', 1).value).toBe('12');
    fireEvent.keyDown(cell('energy', 1), { key: 'z', ctrlKey: true });
    expect(cell('energy', 1).value).toBe('');
    fireEvent.keyDown(cell('energy', 1), { key: 'Z', ctrlKey: true, shiftKey: true });
    expect(cell('energy', 1).value).toBe('12');
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Redo' }).disabled).toBe(false);
  });

  it('brings a removed row back', () => {
    render(<Grid lines={[{ cells: ['2', '0.7', '0.01', ''] }]} blank={1} />);
    fireEvent.click(screen.getByRole('button', { name: 'remove row 1' }));
    expect(points()).toEqual([]);
    fireEvent.click(screen.getByRole('button', { name: 'Undo' }));
    expect(points()).toHaveLength(1);
  });
});

describe('cells that need mending', () => {
  it('names row and column, marks the cell and leads to it', () => {
    render(<Grid />);
    paste(cell('energy', 1), '2\t0.7\t0.01\n3\tabc\t-0.01');
    const list = screen.getByRole('list', { name: 'cells to mend' });
    expect(
      within(list)
        .getAllByRole('listitem')
        .map((item) => item.textContent),
    ).toEqual([
      'Row 2, fraction: expected a number, found “abc”.',
      'Row 2, σ: expected a number above 0, found -0.01.',
    ]);
    expect(cell('σ', 2).getAttribute('aria-invalid')).toBe('true');
    expect(cell('σ', 1).hasAttribute('aria-invalid')).toBe(false);
    fireEvent.click(within(list).getByRole('button', { name: /σ/ }));
    expect(document.activeElement).toBe(cell('σ', 2));
  });

  it('finds an energy that stands twice, an empty cell and a fraction far outside its range', () => {
    render(<Grid />);
    paste(cell('energy', 1), '2\t0.7\t0.01\n2\t0.6\t0.01\n4\t\t0.01\n5\t1.5\t0.01');
    const sentences = screen.getAllByRole('listitem').map((item) => item.textContent);
    expect(sentences).toEqual([
      'Row 2, energy: 2 keV stands in row 1 already; expected each energy once.',
      'Row 3, fraction: expected a number, found an empty cell.',
      'Row 4, fraction: expected a fraction from 0 to 1 (within 5 σ), found 1.5.',
    ]);
    expect(points()).toHaveLength(1);
  });
});

describe('keys', () => {
  it('moves with arrows and Enter, and leaves a cell sideways only from the end of its text', () => {
    render(<Grid />);
    const first = cell('energy', 1);
    type(first, '12');
    first.focus();
    first.setSelectionRange(1, 1);
    fireEvent.keyDown(first, { key: 'ArrowRight' });
    expect(document.activeElement).toBe(first);
    first.setSelectionRange(2, 2);
    fireEvent.keyDown(first, { key: 'ArrowRight' });
    expect(document.activeElement).toBe(cell('fraction', 1));
    fireEvent.keyDown(cell('fraction', 1), { key: 'ArrowDown' });
    expect(document.activeElement).toBe(cell('fraction', 2));
    fireEvent.keyDown(cell('fraction', 2), { key: 'Enter', shiftKey: true });
    expect(document.activeElement).toBe(cell('fraction', 1));
  });

  it('adds a row with Enter on the last one', () => {
    render(<Grid blank={1} />);
    fireEvent.keyDown(cell('energy', 1), { key: 'Enter' });
    expect(document.activeElement).toBe(cell('energy', 2));
  });
});

describe('stored points', () => {
  it('are switched off and not removed', () => {
    render(<Grid lines={[{ cells: ['2', '0.7', '0.01', ''], kept: true }]} blank={0} />);
    expect(screen.queryByRole('button', { name: 'remove row 1' })).toBeNull();
    fireEvent.click(screen.getByRole('checkbox', { name: 'use row 1' }));
    expect(points()).toMatchObject([{ energyKeV: 2, enabled: false }]);
  });
});
