import { memo } from 'react';

import type { ProfileKind } from '@/lib/inversion/index';
import { EvidenceTable } from '@/components/charts/evidence-table';
import { Notice } from '@/components/ui/notice';

import { evidenceRows, zeroWidthSentence } from './comparison';
import { profileKind } from './profile-kinds';
import type { ComparisonInHand } from './use-comparison';

interface ComparisonPanelProps extends Pick<ComparisonInHand, 'result' | 'busy' | 'error'> {
  outOfDate: boolean;
  current: ProfileKind;
}

/** Every trial profile on the same data: evidence, and whether the data ask for a width. */
export const ComparisonPanel = memo(function ComparisonPanel({
  result,
  busy,
  error,
  outOfDate,
  current,
}: ComparisonPanelProps) {
  const evidence = result ? evidenceRows(result.fits, current) : null;
  const sentence = result ? zeroWidthSentence(result.fits) : null;
  return (
    <section aria-labelledby="comparison-heading" aria-busy={busy} className="min-h-44">
      <h2 id="comparison-heading" className="mb-1 text-sm text-ink-2">
        Model comparison
      </h2>
      {error !== null && <Notice kind="problem">{error}</Notice>}
      {!result && !busy && error === null && (
        <p className="text-sm text-ink-2">
          Compare all fits every trial profile to these points and weighs them against each other.
        </p>
      )}
      {busy && !result && <p className="text-sm text-ink-2">Fitting every trial profile.</p>}
      {result && evidence && (
        <div>
          {evidence.rows.length > 0 && <EvidenceTable rows={evidence.rows} />}
          {result.refusals.map(({ kind, message }) => (
            <Notice key={kind} kind="caution" title={profileKind(kind).label}>
              {message}
            </Notice>
          ))}
          <p className="mt-2 text-sm text-ink-2">
            {outOfDate ? 'Something changed since: compare again. ' : ''}
            {evidence.reason ?? sentence}
          </p>
        </div>
      )}
    </section>
  );
});
