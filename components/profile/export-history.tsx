import { Moment } from '@/components/ui/moment';
import type { IssuedProfile } from '@/lib/schemas/profile';

/** Who took the profile away, and on which grid. */
export function ExportHistory({ exports }: { exports: IssuedProfile['exports'] }) {
  if (exports.length === 0) {
    return <p className="text-sm text-ink-3">Nobody has exported this profile yet.</p>;
  }
  return (
    <ul className="grid gap-1 text-sm text-ink-2">
      {exports.map(({ person, at, grid }, index) => (
        <li key={`${at}-${index}`}>
          <strong className="font-semibold text-ink">{person}</strong> exported it ({grid}),{' '}
          <Moment at={at} />
        </li>
      ))}
    </ul>
  );
}
