import { parameterLabel } from '@/components/review/parameter-words';
import type { FitAnswer, Observable, ParameterValues } from '@/lib/inversion/index';

import type { Assumptions } from './assumptions';
import { arrowStep, type Drawn } from './drawn-values';
import type { LevelHandle } from './scan-overlay';

/** Handles of the two levels; a fraction stays in [0, 1], a rate above the rate without carriers. */
export function levelHandles({
  values,
  drawn,
  answer,
  observable,
  assumptions,
}: {
  values: ParameterValues;
  drawn: Drawn;
  answer: FitAnswer | null;
  observable: Observable;
  assumptions: Pick<Assumptions, 'polarity' | 'response'>;
}): LevelHandle[] {
  const { polarity, response } = assumptions;
  const top = values.levelTop ?? 0;
  const bulk = values.levelBulk ?? 0;
  const min = response.kind === 'capture-rate' ? response.baselinePerUs : 0;
  const max = observable === 'fraction' ? 1 : Math.max(top, bulk, min) * 3 + 1;
  return (['levelTop', 'levelBulk'] as const).flatMap((name) => {
    const value = values[name];
    if (value === undefined) return [];
    const parameter = answer?.parameters.find((one) => one.name === name) ?? null;
    return [
      {
        name,
        label: parameterLabel(name, { observable, spec: { polarity } }),
        value,
        isDrawn: drawn[name] !== undefined,
        step: arrowStep(parameter, Math.abs(bulk - top) || 1),
        min,
        max,
      },
    ];
  });
}
