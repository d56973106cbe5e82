import { SANS } from './axis';
import { dashOf, strokeOf, type LineStyle } from './chart-types';

/** Mean width of a letter at the legend's size, px; a legend need not be exact. */
const LETTER = 6.3;
const SAMPLE = 40;

interface Entry {
  label: string;
  style: LineStyle;
  colour?: string;
}

/** Line samples with their names, set from the right edge leftwards. */
export function Legend({
  entries,
  right,
  y,
}: {
  entries: readonly Entry[];
  right: number;
  y: number;
}) {
  return (
    <g fontFamily={SANS} fontSize={11.5} fill="var(--ink-2)">
      {entries.map((entry, index) => {
        const end = right - legendWidth(entries.slice(0, index));
        const start = end - entry.label.length * LETTER;
        return (
          <g key={entry.label}>
            <line
              x1={start - 26}
              x2={start - 6}
              y1={y - 4}
              y2={y - 4}
              stroke={strokeOf(entry)}
              strokeWidth={2}
              strokeDasharray={dashOf(entry.style)}
            />
            <text x={end} y={y} textAnchor="end">
              {entry.label}
            </text>
          </g>
        );
      })}
    </g>
  );
}

/** Room that the entries need, px. */
export function legendWidth(entries: readonly Pick<Entry, 'label'>[]): number {
  return entries.reduce((sum, entry) => sum + entry.label.length * LETTER + SAMPLE, 0);
}
