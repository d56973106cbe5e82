'use client';

import { memo, useMemo, useState } from 'react';

import { Figure } from '@/components/charts/figure';
import { StoppingRidgeline } from '@/components/charts/stopping-ridgeline';
import { thinRidge } from '@/components/review/thin-ridge';
import { stoppingMoments, type StoppingProfile } from '@/lib/inversion/index';

import { MomentsTable } from './moments-table';

interface StoppingFigureProps {
  profiles: readonly StoppingProfile[];
}

const SMALLEST_HEIGHT = 220;
const PER_ENERGY = 22;
const LARGEST_HEIGHT = 560;

export function ridgelineHeight(energies: number): number {
  return Math.min(LARGEST_HEIGHT, SMALLEST_HEIGHT + PER_ENERGY * energies);
}

/** More bins than this cannot be told apart in the picture, and cost time at every move of the pointer. */
const MOST_DRAWN = 600;

/** The stopping profiles as a ridgeline, with their moments below; pointing at an energy lights its ridge. */
export const StoppingFigure = memo(function StoppingFigure({ profiles }: StoppingFigureProps) {
  const [litKeV, setLitKeV] = useState<number | null>(null);
  const rows = useMemo(
    () =>
      profiles.map((profile) => ({
        energyKeV: profile.energyKeV,
        bins: profile.mass.length,
        lostShare: profile.lostShare,
        ...stoppingMoments(profile),
      })),
    [profiles],
  );
  const ridges = useMemo(
    () => profiles.map((profile) => thinRidge(profile, MOST_DRAWN)),
    [profiles],
  );
  const height = ridgelineHeight(profiles.length);
  return (
    <div className="grid grid-cols-1 gap-6">
      <Figure
        title="Stopping profiles"
        svgName="stopping-profiles"
        height={height}
        table={{
          columns: [
            'energy (keV)',
            'mean (nm)',
            'straggling (nm)',
            'median (nm)',
            '5 % (nm)',
            '95 % (nm)',
            'lost share',
            'bins',
          ],
          rows: rows.map((row) => [
            row.energyKeV,
            row.meanNm,
            row.straggleNm,
            row.medianNm,
            row.quantile05Nm,
            row.quantile95Nm,
            row.lostShare,
            row.bins,
          ]),
        }}
      >
        {(width) => (
          <StoppingRidgeline
            profiles={ridges}
            width={width}
            height={height}
            highlightedKeV={litKeV}
          />
        )}
      </Figure>
      <MomentsTable rows={rows} onLight={setLitKeV} />
    </div>
  );
});
