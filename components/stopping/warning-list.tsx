import { Notice } from '@/components/ui/notice';

/** What may be wrong with a set although it could be read. */
export function WarningList({ warnings }: { warnings: readonly string[] }) {
  const [only] = warnings;
  if (only === undefined) return null;
  if (warnings.length === 1) return <Notice kind="caution">{only}</Notice>;
  return (
    <Notice kind="caution" title={`${warnings.length} cautions`}>
      <ul className="mt-1 max-h-48 list-disc space-y-1 overflow-y-auto pl-4">
        {warnings.map((warning) => (
          <li key={warning}>{warning}</li>
        ))}
      </ul>
    </Notice>
  );
}
