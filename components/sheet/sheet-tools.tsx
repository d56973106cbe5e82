'use client';

import { Button } from '@/components/ui/button';

import type { SheetModel } from './use-sheet';

interface SheetToolsProps {
  sheet: SheetModel;
  onAddRow: () => void;
  /** What the last paste or removal did. */
  news: string;
}

export function SheetTools({ sheet, onAddRow, news }: SheetToolsProps) {
  return (
    <div className="mb-2">
      <div className="flex flex-wrap items-center gap-2">
        <Button variant="secondary" size="small" type="button" onClick={onAddRow}>
          Add row
        </Button>
        <Button
          variant="quiet"
          size="small"
          type="button"
          disabled={!sheet.canUndo}
          onClick={sheet.undo}
        >
          Undo
        </Button>
        <Button
          variant="quiet"
          size="small"
          type="button"
          disabled={!sheet.canRedo}
          onClick={sheet.redo}
        >
          Redo
        </Button>
        <p role="status" className="text-sm text-ink-2">
          {news}
        </p>
      </div>
      <p className="mt-1 text-xs text-ink-2">
        Paste a block from a spreadsheet into any cell. Arrows and Enter move between cells, Ctrl+Z
        undoes.
      </p>
    </div>
  );
}
