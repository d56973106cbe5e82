'use client';

import { useMemo } from 'react';
import useSWR from 'swr';

import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { fetchJson } from '@/components/upload/fetch-json';
import { stoppingSetSchema } from '@/lib/schemas/stopping-set';

import { lossWarnings } from './loss-warnings';
import { ridgelineHeight, StoppingFigure } from './stopping-figure';
import { WarningList } from './warning-list';

const TABLE_HEAD = 90;
const TABLE_ROW = 29;

/** The profiles of a stored set. They may be megabytes, so they come after the page and not inside it. */
export function StoredProfiles({ setId, energies }: { setId: string; energies: number }) {
  const { data, error, isLoading, mutate } = useSWR(`/api/stopping-sets/${setId}`, fetchSet, {
    // A set never changes once stored.
    revalidateIfStale: false,
    revalidateOnFocus: false,
  });
  const profiles = useMemo(() => data?.profiles.map(toProfile) ?? [], [data]);
  if (error) {
    return (
      <Notice
        kind="problem"
        alert
        title="The profiles could not be loaded"
        action={
          <Button size="small" onClick={() => void mutate()}>
            Try again
          </Button>
        }
      >
        {error instanceof Error ? error.message : 'No reason was given.'}
      </Notice>
    );
  }
  if (isLoading || !data) {
    return (
      <div role="status" className="text-sm text-ink-2">
        Loading the profiles…
        {/* Keeps the room of figure and table, so that nothing moves when they come. */}
        <svg
          aria-hidden="true"
          width="100%"
          height={ridgelineHeight(energies) + TABLE_HEAD + TABLE_ROW * energies}
          className="block"
        />
      </div>
    );
  }
  return (
    <div className="grid grid-cols-1 gap-6">
      <WarningList warnings={[...data.warnings, ...lossWarnings(profiles)]} />
      <StoppingFigure profiles={profiles} />
    </div>
  );
}

async function fetchSet(path: string) {
  return stoppingSetSchema.parse(await fetchJson(path));
}

function toProfile({
  energyKeV,
  edgesNm,
  mass,
  lostShare,
}: {
  energyKeV: number;
  edgesNm: number[];
  mass: number[];
  lostShare: number | null;
}) {
  return {
    energyKeV,
    edgesNm: Float64Array.from(edgesNm),
    mass: Float64Array.from(mass),
    lostShare,
    interpolatedBetween: null,
  };
}
