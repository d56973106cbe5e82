'use client';

import { useMemo } from 'react';

import type { Scan } from '@/lib/schemas/scan';

import { profileSeries, residualSeries } from './profile-series';
import type { FitDesk } from './use-fit-desk';

/** What the figures of the live desk draw. Each stays the same object until something in it changes. */
export function useDeskFigures(desk: FitDesk, scan: Scan) {
  const { ridges, comparison, fitted, others } = desk;
  const { good } = desk.fit;
  const answer = good?.first.answer ?? null;

  const offInScan = useMemo(
    () => new Set(scan.points.filter(({ enabled }) => !enabled).map(({ energyKeV }) => energyKeV)),
    [scan.points],
  );
  const interpolatedKeV = useMemo(
    () => ridges.filter(({ interpolated }) => interpolated).map(({ energyKeV }) => energyKeV),
    [ridges],
  );
  const compared = useMemo(
    () => (comparison.outOfDate ? [] : (comparison.result?.fits ?? [])),
    [comparison.outOfDate, comparison.result],
  );
  const main = useMemo(
    () => good && { kind: good.input.profile, profile: good.profile, answer: good.first.answer },
    [good],
  );
  const profiles = useMemo(() => profileSeries(main, compared), [main, compared]);
  const residuals = useMemo(() => residualSeries(main, compared), [main, compared]);
  const curves = useMemo(
    () => [fitted, ...others].filter((curve) => curve !== null),
    [fitted, others],
  );
  const levels = useMemo(
    () =>
      (answer?.parameters ?? [])
        .filter(({ name }) => name === 'levelTop' || name === 'levelBulk')
        .map(({ value }) => value),
    [answer],
  );
  return { answer, offInScan, interpolatedKeV, profiles, residuals, curves, levels };
}
export type DeskFigures = ReturnType<typeof useDeskFigures>;
