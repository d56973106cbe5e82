import { allInvented } from '@/components/sample/all-invented';
import { ResultText } from '@/components/sample/result-text';
import { ButtonLink } from '@/components/ui/button-link';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { StateBadge } from '@/components/ui/state-badge';
import { TextLink } from '@/components/ui/text-link';
import type { FitRow } from '@/lib/schemas/fit';

import { nextStep } from './next-step';

export function WaitingList({ fits }: { fits: readonly FitRow[] }) {
  const marked = allInvented(fits);
  return (
    <ul className="border-t border-rule">
      {fits.map((fit) => {
        const step = nextStep(fit);
        return (
          <li
            key={fit.id}
            className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b border-rule py-3"
          >
            <div className="grid min-w-0 gap-0.5">
              <p className="flex flex-wrap items-center gap-x-2.5 gap-y-1">
                <TextLink href={step.href} className="font-serif text-lg font-semibold">
                  {fit.name}
                </TextLink>
                <StateBadge state={fit.state} />
                {!marked && fit.invented && <InventedMark />}
              </p>
              <p className="text-sm text-ink-2">
                {fit.sampleName}, {fit.scanName} · {fit.profile} edge at{' '}
                <span className="figures text-ink">
                  <ResultText of={fit.edge} quantity="depth" />
                </span>{' '}
                · {fit.createdBy}, <Moment at={fit.createdAt} />
              </p>
            </div>
            <ButtonLink size="small" href={step.href} aria-label={`${step.label}: ${fit.name}`}>
              {step.label}
            </ButtonLink>
          </li>
        );
      })}
    </ul>
  );
}
