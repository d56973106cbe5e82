import { DataTable } from '@/components/ui/data-table';
import { Mark } from '@/components/ui/mark';

import { HelpSection } from './help-section';
import { titleOf } from './help-topics';

const CHECKS = [
  { looksAt: 'Minimum', speaks: 'the fit stopped before it, or the error bars cannot be computed' },
  { looksAt: 'Points', speaks: 'fewer than 3 are left over after the free parameters' },
  { looksAt: 'χ²', speaks: 'p below 0.05 (a problem below 0.001), or above 0.995' },
  {
    looksAt: 'Runs of residuals of one sign',
    speaks: 'fewer runs than chance gives, p below 0.05 (a problem below 0.005)',
  },
  { looksAt: 'Bounds', speaks: 'a parameter lies at one' },
  { looksAt: 'Correlation', speaks: 'of two parameters, above 0.95 either way' },
  { looksAt: 'Reach', speaks: 'the edge lies beyond it, or is bounded on one side only' },
  { looksAt: 'Contrast of the levels', speaks: 'below 6 σ (a problem below 3 σ)' },
  { looksAt: 'Stopping energies', speaks: 'one is interpolated between its neighbours' },
  {
    looksAt: 'Stopping losses',
    speaks: 'above 2 %, or the last bin is still above 5 % of the peak',
  },
  { looksAt: 'Depth bins', speaks: 'near the edge, wider than a fifth of its width' },
  { looksAt: 'Depth scale', speaks: 'its prior makes more than half of the variance of the edge' },
  {
    looksAt: 'Single points',
    speaks: 'leaving one out moves the edge by more than 1.5 σ (a problem above 3 σ)',
  },
  {
    looksAt: 'Closure',
    speaks: 'scans simulated from the fit do not give its edge back with the stated scatter',
  },
  {
    looksAt: 'Capture coefficient',
    speaks: 'its uncertainty is not stated, or is more than 30 %',
  },
] as const;

const STATES = [
  { kind: 'fine', word: 'Fine', meaning: 'nothing to see.' },
  {
    kind: 'caution',
    word: 'Caution',
    meaning: 'the result may stand; read the sentence, and say in the notes why it does.',
  },
  {
    kind: 'problem',
    word: 'Problem',
    meaning:
      'the profile does not describe these data, or a number does not mean what it seems to.',
  },
] as const;

export function ChecksSection() {
  return (
    <HelpSection id="checks" title={titleOf('checks')}>
      <p>Every fit carries its checks, each with a sentence and the figure behind it.</p>
      <ul className="grid gap-1.5">
        {STATES.map(({ kind, word, meaning }) => (
          <li key={kind} className="flex gap-2.5">
            <Mark kind={kind} className="mt-1" />
            <span>
              <strong>{word}</strong>: {meaning}
            </span>
          </li>
        ))}
      </ul>
      <DataTable
        caption="What the checks look at"
        captionHidden
        dense
        stacks
        rows={CHECKS}
        rowKey={(check) => check.looksAt}
        columns={[
          { key: 'at', label: 'Looks at', rowHeader: true, cell: (check) => check.looksAt },
          { key: 'speaks', label: 'Speaks up when', cell: (check) => check.speaks },
        ]}
      />
      <p className="text-sm text-ink-2">The thresholds are common practice, no source.</p>
    </HelpSection>
  );
}
