'use client';

import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import type { Table } from '@/lib/files/table';
import type { Scan } from '@/lib/schemas/scan';

import type { ColumnMatch, ColumnRole } from './scan-choices';

interface ColumnChoicesProps {
  table: Table;
  match: ColumnMatch;
  energyUnit: 'keV' | 'eV';
  observable: Scan['observable'];
  onColumn: (role: ColumnRole, column: number | null) => void;
  onEnergyUnit: (unit: 'keV' | 'eV') => void;
}

/** Which column holds what; each choice shows its heading and first values. */
export function ColumnChoices(props: ColumnChoicesProps) {
  const { table, match, energyUnit, observable, onColumn, onEnergyUnit } = props;
  const valueLabel = observable === 'rate' ? 'Rate column' : 'Fraction column';
  const roles: [ColumnRole, string, boolean][] = [
    ['energy', 'Energy column', true],
    ['value', valueLabel, true],
    ['sigma', 'σ column', true],
    ['note', 'Note column', false],
    ['counts', 'Counts column', false],
  ];
  return (
    <div className="grid gap-3 sm:grid-cols-2">
      {roles.map(([role, label, needed]) => (
        <Field key={role} label={label} optional={!needed}>
          <Select
            value={match[role] ?? ''}
            onChange={(event) =>
              onColumn(role, event.target.value === '' ? null : Number(event.target.value))
            }
          >
            <option value="">{needed ? 'choose…' : 'none'}</option>
            {Array.from({ length: table.columnCount }, (_, column) => (
              <option key={column} value={column}>
                {columnWords(table, column)}
              </option>
            ))}
          </Select>
        </Field>
      ))}
      <Field label="Energy unit">
        <Select
          value={energyUnit}
          onChange={(event) => onEnergyUnit(event.target.value === 'eV' ? 'eV' : 'keV')}
          options={[
            { value: 'keV', label: 'keV' },
            { value: 'eV', label: 'eV' },
          ]}
        />
      </Field>
    </div>
  );
}

/** "2: fraction (0.742, 0.739, …)" */
function columnWords(table: Table, column: number): string {
  const heading = table.header?.[column] ?? '';
  const values = table.rows.slice(0, 2).map((row) => (row.cells[column] ?? '').slice(0, 12));
  return `${column + 1}${heading === '' ? '' : `: ${heading.slice(0, 24)}`} (${values.join(', ')}, …)`;
}
