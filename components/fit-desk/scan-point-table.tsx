import { significant, withSigma } from '@/lib/format';
import type { Residual, ScanPoint } from '@/lib/inversion/index';

interface ScanPointTableProps {
  points: readonly ScanPoint[];
  residuals: readonly Residual[] | null;
  /** Points switched off in the scan itself cannot be switched on here. */
  offInScan: ReadonlySet<number>;
  /** null on a saved fit. */
  onToggle: ((energyKeV: number) => void) | null;
}

/** The points behind the scan figure, each with the switch that takes it out of the fit. */
export function ScanPointTable({ points, residuals, offInScan, onToggle }: ScanPointTableProps) {
  const byEnergy = new Map(residuals?.map((residual) => [residual.energyKeV, residual]));
  return (
    <div
      className="mt-2 max-h-80 overflow-auto border-y border-rule"
      role="region"
      aria-label="Points of the scan"
      tabIndex={0}
    >
      <table className="w-full border-collapse text-[0.8125rem]">
        <caption className="sr-only">Points of the scan</caption>
        <thead className="sticky top-0 bg-paper text-ink-2">
          <tr>
            {['in use', 'energy (keV)', 'value', 'folded fit', 'residual / σ'].map((column) => (
              <th
                key={column}
                scope="col"
                className="px-1.5 py-1.5 text-right font-normal first:pl-0 first:text-left"
              >
                {column}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {points.map((point) => {
            const residual = byEnergy.get(point.energyKeV);
            return (
              <tr key={point.energyKeV} className="border-t border-rule">
                <td className="py-1">
                  <input
                    type="checkbox"
                    aria-label={`${point.energyKeV} keV in use`}
                    checked={point.enabled}
                    disabled={onToggle === null || offInScan.has(point.energyKeV)}
                    onChange={() => onToggle?.(point.energyKeV)}
                    className="size-4 accent-kelp"
                  />
                </td>
                <td className="px-1.5 py-1 text-right figures">
                  {point.energyKeV}
                  {residual?.interpolated && (
                    <span title="stopping profile interpolated between its neighbours">*</span>
                  )}
                </td>
                <td
                  className="px-1.5 py-1 text-right figures"
                  title={`${point.value} ± ${point.sigma}`}
                >
                  {withSigma(point.value, point.sigma)}
                </td>
                <td
                  className="px-1.5 py-1 text-right figures"
                  title={residual && String(residual.predicted)}
                >
                  {residual ? significant(residual.predicted, 4) : '–'}
                </td>
                <td
                  className="px-1.5 py-1 text-right figures"
                  title={residual && String(residual.reduced)}
                >
                  {residual ? residual.reduced.toFixed(2).replace('-', '−') : '–'}
                </td>
              </tr>
            );
          })}
        </tbody>
      </table>
      {offInScan.size > 0 && (
        <p className="py-1.5 text-[0.8125rem] text-ink-3">
          Points switched off in the scan itself are switched on again on the page of the scan.
        </p>
      )}
    </div>
  );
}
