'use client';

import { useQueryState } from 'nuqs';
import { useEffect, useEffectEvent, useMemo, useRef } from 'react';

import type { Ridge, ScanCurve } from '@/components/charts/chart-types';
import type { FitInput } from '@/lib/inversion/index';
import type { Scan } from '@/lib/schemas/scan';

import type { Assumptions } from './assumptions';
import { answerValues } from './drawn-values';
import { fitInputOf, pointsOf } from './fit-input';
import type { GoodResult } from './fitting';
import { curveEnergies, foldedCurve, prepareToDraw } from './prepared';
import { PROFILE_KINDS, profileKind } from './profile-kinds';
import { comparisonKey, questionKey } from './question';
import { ridgesOf } from './ridges';
import { useAssumptions } from './use-assumptions';
import { useComparison } from './use-comparison';
import { useStoppingSet } from './use-desk-data';
import { useDrawing } from './use-drawing';
import { useFitting } from './use-fitting';
import { usePool } from './use-pool';

const NO_RIDGES: readonly Ridge[] = [];

export type FitDesk = ReturnType<typeof useFitDesk>;

/** Everything that the live desk knows and can do, put together from its parts. */
export function useFitDesk(scan: Scan, usual: Assumptions) {
  const inHand = useAssumptions(usual);
  const { assumptions } = inHand;
  const stopping = useStoppingSet(assumptions.stoppingSetId);
  const { set } = stopping;
  const sha256 = stopping.answer?.sha256 ?? '';
  const key = questionKey(scan, sha256, assumptions);
  const compareKey = comparisonKey(scan, sha256, assumptions);

  const input = useMemo(
    () => (set ? fitInputOf(scan, assumptions, set) : null),
    [scan, assumptions, set],
  );
  const preparation = useMemo(() => (input ? prepareToDraw(input) : null), [input]);
  const prepared = preparation?.ok ? preparation.prepared : null;

  const poolOf = usePool();
  const fit = useFitting(poolOf);
  const comparison = useComparison(poolOf);
  const [compareWord, setCompareWord] = useQueryState('compare', { history: 'replace' });
  const drawing = useDrawing({ prepared, assumptions, good: fit.good, change: inHand.change });

  const startFit = () => {
    if (!input || !prepared) return;
    drawing.clear();
    fit.start({ key, input, seed: assumptions.seed, resamples: assumptions.resamples });
    if (compareWord === 'all') compareAll();
  };
  const compareAll = () => {
    if (!input) return;
    void setCompareWord('all');
    const inputs = PROFILE_KINDS.map(({ kind }) => ({ kind, input: { ...input, profile: kind } }));
    void comparison.start(compareKey, inputs);
  };
  useOpeningFit(prepared !== null, startFit);

  const { good } = fit;
  const fitted = useFittedCurve(good);
  const compared = comparison.result?.key === compareKey ? comparison.result : null;
  const others = useComparedCurves(
    compared?.fits ?? null,
    good?.input.profile ?? assumptions.profile,
  );
  const ridges = useMemo(() => (set ? ridgesOf(scan.points, set) : NO_RIDGES), [scan.points, set]);
  const points = useMemo(
    () => pointsOf(scan.points, assumptions.switchedOffKeV),
    [scan.points, assumptions.switchedOffKeV],
  );

  return {
    ...inHand,
    stopping,
    points,
    ridges,
    prepared,
    /** Why a fit cannot start, in a sentence; null when it can or nothing is loaded yet. */
    obstacle: preparation && !preparation.ok ? preparation.message : null,
    fit,
    outOfDate: good !== null && good.key !== key,
    startFit,
    compareAll,
    comparison: { ...comparison, outOfDate: comparison.result !== null && compared === null },
    drawing,
    fitted,
    others,
  };
}

/** A desk that opens with everything it needs fits once by itself: a link shows what its sender saw. */
function useOpeningFit(ready: boolean, start: () => void): void {
  const opened = useRef(false);
  const open = useEffectEvent(start);
  useEffect(
    () => () => {
      opened.current = false;
    },
    [],
  );
  useEffect(() => {
    if (!ready || opened.current) return;
    opened.current = true;
    open();
  }, [ready]);
}

function useFittedCurve(good: GoodResult | null): ScanCurve | null {
  const answer = good?.first.answer;
  const input = good?.input;
  return useMemo(
    () =>
      answer && input
        ? curveOf(input, answer, { label: profileKind(input.profile).short, style: 'solid' })
        : null,
    [answer, input],
  );
}

function useComparedCurves(
  fits:
    | readonly {
        kind: FitInput['profile'];
        input: FitInput;
        answer: Parameters<typeof answerValues>[0];
      }[]
    | null,
  current: FitInput['profile'],
): ScanCurve[] {
  return useMemo(
    () =>
      (fits ?? [])
        .filter(({ kind }) => kind !== current)
        .flatMap(
          ({ kind, input, answer }) =>
            curveOf(input, answer, { label: profileKind(kind).short, style: 'dashed' }) ?? [],
        ),
    [fits, current],
  );
}

function curveOf(
  input: FitInput,
  answer: Parameters<typeof answerValues>[0],
  look: Pick<ScanCurve, 'label' | 'style'>,
): ScanCurve | null {
  const preparation = prepareToDraw(input);
  return preparation.ok
    ? foldedCurve(preparation.prepared, answerValues(answer), curveEnergies(input), look)
    : null;
}
