import { Moment } from '@/components/ui/moment';
import type { IssuedProfile } from '@/lib/schemas/profile';

const SHOWN = 6;

type Export = IssuedProfile['exports'][number];

/** Who took the profile away, and on which grid; the latest ones first. */
export function ExportHistory({ exports }: { exports: readonly Export[] }) {
  if (exports.length === 0) {
    return <p className="text-sm text-ink-3">Nobody has exported this profile yet.</p>;
  }
  const earlier = exports.slice(SHOWN);
  return (
    <div className="grid gap-2 text-sm text-ink-2">
      <ExportList exports={exports.slice(0, SHOWN)} />
      {earlier.length > 0 && (
        <details className="no-print">
          <summary className="w-fit">{earlier.length} earlier exports</summary>
          <ExportList exports={earlier} />
        </details>
      )}
    </div>
  );
}

function ExportList({ exports }: { exports: readonly Export[] }) {
  return (
    <ul className="grid gap-1">
      {exports.map(({ person, at, grid }, index) => (
        <li key={`${at}-${index}`}>
          <strong className="font-semibold text-ink">{person}</strong> exported it ({grid}),{' '}
          <Moment at={at} />
        </li>
      ))}
    </ul>
  );
}
