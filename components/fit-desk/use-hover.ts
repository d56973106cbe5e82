'use client';

import { useMemo, useState } from 'react';

import type { Ridge } from '@/components/charts/chart-types';
import type { ScanPoint } from '@/lib/inversion/index';

import { voicesAt } from './linked-depth';

/** What the pointer or the keys are at: an energy, or a depth with the energies that speak about it. */
export function useHover(
  ridges: readonly Ridge[],
  points: readonly ScanPoint[],
  geometry: { depthScale: number; capThicknessNm: number },
) {
  const [energyKeV, onReadEnergy] = useState<number | null>(null);
  const [depthNm, onReadDepth] = useState<number | null>(null);
  const { depthScale, capThicknessNm } = geometry;
  const speakingKeV = useMemo(() => {
    if (depthNm === null || depthNm < 0) return null;
    const sigmas = new Map(
      points.filter(({ enabled }) => enabled).map((point) => [point.energyKeV, point.sigma]),
    );
    return voicesAt(depthNm, ridges, sigmas, { depthScale, capThicknessNm }).map(
      (voice) => voice.energyKeV,
    );
  }, [depthNm, ridges, points, depthScale, capThicknessNm]);
  return {
    energyKeV,
    depthNm,
    speakingKeV: energyKeV === null ? speakingKeV : null,
    onReadEnergy,
    onReadDepth,
  };
}

export type Hover = ReturnType<typeof useHover>;
