'use client';

import Link from 'next/link';
import { parseAsArrayOf, parseAsString, useQueryState } from 'nuqs';

import { parameterText } from '@/components/review/parameter-value';
import { Button } from '@/components/ui/button';
import { ButtonLink } from '@/components/ui/button-link';
import { DataTable } from '@/components/ui/data-table';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { StateBadge } from '@/components/ui/state-badge';
import type { FitRow } from '@/lib/schemas/fit';

import { profileKind } from './profile-kinds';

const MOST = 8;

/** Saved fits; two or more of one scan can be chosen and compared. */
export function FitList({ fits }: { fits: readonly FitRow[] }) {
  const [chosen, setChosen] = useQueryState(
    'chosen',
    parseAsArrayOf(parseAsString).withDefault([]),
  );
  const picked = fits.filter(({ id }) => chosen.includes(id));
  const scanId = picked[0]?.scanId ?? null;
  const toggle = (id: string) => {
    const next = chosen.includes(id) ? chosen.filter((other) => other !== id) : [...chosen, id];
    void setChosen(next.length > 0 ? next : null);
  };
  return (
    <>
      <div className="flex min-h-11 flex-wrap items-center gap-x-4 gap-y-2 pb-2 text-sm text-ink-2">
        <span role="status">{choiceText(picked)}</span>
        {picked.length >= 2 && (
          <ButtonLink
            href={`/compare?fits=${picked.map(({ id }) => id).join(',')}`}
            size="small"
            variant="primary"
          >
            Compare {picked.length} fits
          </ButtonLink>
        )}
        {picked.length > 0 && (
          <Button size="small" variant="quiet" onClick={() => void setChosen(null)}>
            Choose none
          </Button>
        )}
      </div>
      <DataTable
        caption="Saved fits"
        captionHidden
        stacks
        rows={fits}
        rowKey={({ id }) => id}
        columns={[
          {
            key: 'choose',
            label: 'Choose',
            labelHidden: true,
            className: 'w-8',
            cell: (fit) => (
              <input
                type="checkbox"
                aria-label={`Choose ${fit.name} to compare`}
                checked={chosen.includes(fit.id)}
                disabled={
                  !chosen.includes(fit.id) &&
                  ((scanId !== null && fit.scanId !== scanId) || picked.length >= MOST)
                }
                onChange={() => toggle(fit.id)}
                className="mt-0.5 size-4 accent-kelp"
              />
            ),
          },
          {
            key: 'name',
            label: 'Fit',
            rowHeader: true,
            cell: (fit) => (
              <span className="flex flex-wrap items-center gap-2">
                <Link href={`/fits/${fit.id}`} className="text-link">
                  {fit.name}
                </Link>
                {fit.invented && <InventedMark />}
              </span>
            ),
          },
          { key: 'state', label: 'State', cell: (fit) => <StateBadge state={fit.state} /> },
          {
            key: 'sample',
            label: 'Sample and scan',
            cell: (fit) => (
              <>
                <Link href={`/samples/${fit.sampleId}`} className="hover:underline">
                  {fit.sampleName}
                </Link>
                <span aria-hidden="true"> / </span>
                <Link href={`/scans/${fit.scanId}`} className="hover:underline">
                  {fit.scanName}
                </Link>
              </>
            ),
          },
          { key: 'profile', label: 'Profile', cell: (fit) => profileKind(fit.profile).short },
          {
            key: 'edge',
            label: 'Edge',
            numeric: true,
            cell: (fit) =>
              fit.edge ? (
                <span title={String(fit.edge.value)}>{parameterText(fit.edge, 'nm')}</span>
              ) : (
                '–'
              ),
          },
          {
            key: 'chi',
            label: 'χ² / dof',
            numeric: true,
            cell: (fit) => `${fit.chiSquare.toFixed(1)} / ${fit.degreesOfFreedom}`,
          },
          {
            key: 'aicc',
            label: 'AICc',
            numeric: true,
            cell: (fit) => (fit.aicc === null ? '–' : fit.aicc.toFixed(1).replace('-', '−')),
          },
          { key: 'person', label: 'By', cell: (fit) => fit.createdBy },
          {
            key: 'date',
            label: 'Saved',
            cell: (fit) => <Moment at={fit.createdAt} dateOnly className="whitespace-nowrap" />,
          },
        ]}
      />
    </>
  );
}

function choiceText(picked: readonly FitRow[]): string {
  if (picked.length === 0) return 'Choose two or more fits of one scan to compare them.';
  if (picked.length === 1)
    return `“${picked[0]?.name}” chosen: choose another fit of ${picked[0]?.scanName}.`;
  return `${picked.length} fits of ${picked[0]?.scanName} chosen.`;
}
