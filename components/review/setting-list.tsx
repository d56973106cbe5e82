import { assumptionRows } from '@/components/compare/assumptions';
import type { Fit } from '@/lib/schemas/fit';

/** Everything that one fit takes for granted, in words. */
export function SettingList({ fit }: { fit: Fit }) {
  return (
    <dl className="grid gap-x-6 gap-y-1 text-sm sm:grid-cols-[max-content_minmax(0,1fr)]">
      {assumptionRows([fit]).map((row) => (
        <div key={row.label} className="contents">
          <dt className="text-ink-3">{row.label}</dt>
          <dd className="mb-1 sm:mb-0">{row.values[0]}</dd>
        </div>
      ))}
    </dl>
  );
}
