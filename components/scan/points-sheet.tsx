'use client';

import { Sheet } from '@/components/sheet/sheet';
import type { SheetColumn } from '@/components/sheet/sheet-column';
import type { SheetModel } from '@/components/sheet/use-sheet';
import { MAX_ENERGIES } from '@/lib/inversion/index';
import type { Scan } from '@/lib/schemas/scan';

import { ScanFigure } from './scan-figure';
import { columnName, ENERGY, NOTE, SIGMA, VALUE, type TypedReading } from './typed-points';

interface PointsSheetProps {
  sheet: SheetModel;
  typed: TypedReading;
  observable: Scan['observable'];
}

/** The points of a scan in a grid, drawn as they are typed. */
export function PointsSheet({ sheet, typed, observable }: PointsSheetProps) {
  const columns: readonly SheetColumn[] = [
    { name: columnName(ENERGY, observable), unit: 'keV', numeric: true },
    {
      name: columnName(VALUE, observable),
      unit: observable === 'rate' ? 'µs⁻¹' : '',
      numeric: true,
    },
    { name: columnName(SIGMA, observable), unit: '', numeric: true },
    { name: columnName(NOTE, observable), unit: '', numeric: false },
  ];
  return (
    <div className="grid grid-cols-1 gap-6">
      <Sheet
        caption="Points of the scan"
        columns={columns}
        sheet={sheet}
        errors={typed.errors}
        maxRows={MAX_ENERGIES}
      />
      {typed.points.length > 0 && (
        <ScanFigure points={typed.points} observable={observable} title="Preview" />
      )}
    </div>
  );
}
