import { energySpan } from '@/components/scan/scan-words';
import { DataTable } from '@/components/ui/data-table';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { StateBadge } from '@/components/ui/state-badge';
import { TextLink } from '@/components/ui/text-link';
import type { StoppingSetRow } from '@/lib/schemas/stopping-set';

export function StoppingList({ sets }: { sets: readonly StoppingSetRow[] }) {
  return (
    <DataTable
      stacks
      captionHidden
      caption="Stopping sets"
      rows={sets}
      rowKey={({ id }) => id}
      columns={[
        {
          key: 'name',
          label: 'name',
          rowHeader: true,
          cell: ({ id, name, invented, archivedAt }) => (
            <span className="flex flex-wrap items-center gap-x-2 gap-y-1">
              <TextLink href={`/stopping/${id}`}>{name}</TextLink>
              {archivedAt !== null && <StateBadge state="archived" />}
              {invented && <InventedMark />}
            </span>
          ),
        },
        { key: 'stack', label: 'layer stack', cell: ({ layerStack }) => layerStack },
        { key: 'energies', label: 'energies', cell: ({ energiesKeV }) => energySpan(energiesKeV) },
        {
          key: 'bins',
          label: 'depth bins',
          numeric: true,
          cell: ({ bins }) => bins.toLocaleString('en'),
        },
        {
          key: 'added',
          label: 'added',
          cell: ({ createdBy, createdAt }) => (
            <>
              {createdBy}, <Moment at={createdAt} dateOnly />
            </>
          ),
        },
      ]}
    />
  );
}
