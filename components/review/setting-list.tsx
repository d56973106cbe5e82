import { bandsRow, modelRows } from '@/components/compare/assumptions';
import type { Fit } from '@/lib/schemas/fit';

/** What one fit takes for granted besides its parameters, which have a table of their own. */
export function SettingList({ fit }: { fit: Fit }) {
  return (
    <dl className="grid gap-x-6 gap-y-1 text-sm sm:grid-cols-[max-content_minmax(0,1fr)]">
      {[...modelRows([fit]), bandsRow([fit])].map((row) => (
        <div key={row.label} className="contents">
          <dt className="text-ink-3">{row.label}</dt>
          <dd className="mb-1 sm:mb-0">{row.values[0]}</dd>
        </div>
      ))}
    </dl>
  );
}
