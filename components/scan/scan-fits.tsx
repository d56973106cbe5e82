'use client';

import { useState } from 'react';

import { compareAddress, MOST_FITS } from '@/components/compare/compare-address';
import { parameterText } from '@/components/review/parameter-value';
import { ButtonLink } from '@/components/ui/button-link';
import { DataTable } from '@/components/ui/data-table';
import { Moment } from '@/components/ui/moment';
import { StateBadge } from '@/components/ui/state-badge';
import { TextLink } from '@/components/ui/text-link';
import { significant } from '@/lib/format';
import type { FitRow } from '@/lib/schemas/fit';

/** The fits of one scan; two or more can be laid over each other. */
export function ScanFits({ fits }: { fits: readonly FitRow[] }) {
  const [chosen, setChosen] = useState<readonly string[]>([]);
  const toggle = (id: string) =>
    setChosen(chosen.includes(id) ? chosen.filter((other) => other !== id) : [...chosen, id]);
  const mayCompare = chosen.length >= 2 && chosen.length <= MOST_FITS;
  return (
    <div className="grid justify-items-start gap-3">
      <DataTable
        stacks
        className="w-full"
        captionHidden
        caption="Fits of this scan"
        rows={fits}
        rowKey={({ id }) => id}
        columns={[
          {
            key: 'choose',
            label: 'Compare',
            labelHidden: true,
            cell: ({ id, name }) => (
              <input
                type="checkbox"
                className="size-5 accent-kelp"
                aria-label={`Choose ${name} for comparison`}
                checked={chosen.includes(id)}
                onChange={() => toggle(id)}
              />
            ),
          },
          {
            key: 'name',
            label: 'fit',
            rowHeader: true,
            cell: ({ id, name }) => <TextLink href={`/fits/${id}`}>{name}</TextLink>,
          },
          { key: 'profile', label: 'trial profile', cell: ({ profile }) => profile },
          {
            key: 'edge',
            label: 'edge',
            numeric: true,
            cell: ({ edge }) => (edge === null ? '–' : parameterText(edge, 'nm')),
          },
          {
            key: 'chi',
            label: 'χ² / degrees of freedom',
            numeric: true,
            cell: ({ chiSquare, degreesOfFreedom }) =>
              `${significant(chiSquare, 3)} / ${degreesOfFreedom}`,
          },
          { key: 'state', label: 'state', cell: ({ state }) => <StateBadge state={state} /> },
          {
            key: 'by',
            label: 'by',
            cell: ({ createdBy, createdAt }) => (
              <>
                {createdBy}, <Moment at={createdAt} dateOnly />
              </>
            ),
          },
        ]}
      />
      {fits.length > 1 &&
        (mayCompare ? (
          <ButtonLink href={compareAddress(chosen)}>Compare {chosen.length} fits</ButtonLink>
        ) : (
          <p className="text-sm text-ink-2">Choose two to {MOST_FITS} fits to compare them.</p>
        ))}
    </div>
  );
}
