export interface EvidenceRow {
  label: string;
  chiSquare: number;
  freeParameters: number;
  degreesOfFreedom?: number;
  aicc: number | null;
  deltaAicc: number | null;
  /** AICc weight, 0 to 1. */
  weight: number | null;
  /** Colour of its line in the figures. */
  colour?: string;
  dashed?: boolean;
}

/** Models of one scan side by side: χ², parameters, AICc and its weight; the lowest AICc in bold. */
export function EvidenceTable({
  rows,
  caption = 'Model comparison',
}: {
  rows: readonly EvidenceRow[];
  caption?: string;
}) {
  const best = rows.reduce<EvidenceRow | null>(
    (least, row) => (row.aicc !== null && row.aicc < (least?.aicc ?? Infinity) ? row : least),
    null,
  );
  return (
    <table className="w-full border-collapse text-sm">
      <caption className="sr-only">{caption}</caption>
      <thead>
        <tr className="text-[0.8125rem] text-ink-2">
          <th scope="col" className="py-1 text-left font-normal">
            profile
          </th>
          <th scope="col" className="py-1 pl-2 text-right font-normal">
            χ²
          </th>
          <th scope="col" className="py-1 pl-2 text-right font-normal">
            <abbr title="number of free parameters" className="no-underline">
              k
            </abbr>
          </th>
          <th scope="col" className="py-1 pl-2 text-right font-normal">
            AICc
          </th>
          <th scope="col" className="py-1 pl-2 text-right font-normal">
            weight
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr
            key={row.label}
            className={`border-t border-rule ${row === best ? 'font-semibold' : ''}`}
          >
            <th
              scope="row"
              className={`py-1.5 text-left ${row === best ? 'font-semibold' : 'font-normal'}`}
            >
              <LineSample colour={row.colour ?? 'var(--ink-3)'} dashed={row.dashed ?? false} />
              {row.label}
            </th>
            <Cell value={row.chiSquare} digits={1} />
            <Cell value={row.freeParameters} digits={0} />
            <Cell value={row.aicc} digits={1} />
            <Cell value={row.weight} digits={2} />
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Cell({ value, digits }: { value: number | null; digits: number }) {
  return (
    <td
      className="py-1.5 pl-2 text-right figures"
      title={value === null ? 'too few points for this number' : String(value)}
    >
      {value === null ? '–' : value.toFixed(digits).replace('-', '−')}
    </td>
  );
}

function LineSample({ colour, dashed }: { colour: string; dashed: boolean }) {
  return (
    <svg width="18" height="8" aria-hidden="true" className="mr-2 inline-block align-middle">
      <line
        x1="0"
        x2="18"
        y1="4"
        y2="4"
        stroke={colour}
        strokeWidth="2.5"
        strokeDasharray={dashed ? '5 3' : undefined}
      />
    </svg>
  );
}
