import { TextLink } from '@/components/ui/text-link';
import type { Fit } from '@/lib/schemas/fit';

/** What the fit was made from, with the hashes that hold it fast. */
export function FrozenInputs({ fit }: { fit: Fit }) {
  const rows: [label: string, name: React.ReactNode, hash: string][] = [
    [
      'Points of the scan',
      <TextLink key="scan" href={`/scans/${fit.scanId}`}>
        {fit.scanName}
      </TextLink>,
      fit.hashes.points,
    ],
    [
      'Stopping set',
      <TextLink key="set" href={`/stopping/${fit.stoppingSetId}`}>
        {fit.stoppingSetName}
      </TextLink>,
      fit.hashes.stoppingSet,
    ],
    ['All inputs', 'points, stopping set and settings', fit.hashes.inputs],
  ];
  return (
    <dl className="grid gap-3 text-sm">
      {rows.map(([label, name, hash]) => (
        <div key={label} className="grid gap-0.5">
          <dt className="text-ink-3">{label}</dt>
          <dd>
            {name}
            <span className="block figures text-[0.8125rem] break-all text-ink-2">
              SHA-256 {hash}
            </span>
          </dd>
        </div>
      ))}
    </dl>
  );
}
