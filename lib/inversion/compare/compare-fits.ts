import type { FitAnswer } from '../types';

export interface ComparisonRow {
  label: string;
  chiSquare: number;
  freeParameters: number;
  aicc: number | null;
  deltaAicc: number | null;
  /** exp(−½ΔAICc) over its sum: the evidence for this fit among those listed. */
  weight: number | null;
  bic: number;
}

export interface Comparison {
  rows: ComparisonRow[];
  /** False where the fits do not explain the same points; `reason` says why. */
  comparable: boolean;
  reason?: string;
}

/**
 * AICc differences and Akaike weights (Burnham and Anderson, Model Selection and Multimodel Inference, 2002, sections 2.4 and
 * 2.9) of fits to one scan. Fits that do not share their enabled points, values and σ are listed but not weighed.
 */
export function compareFits(list: readonly { label: string; answer: FitAnswer }[]): Comparison {
  const reason = differenceOf(list.map(({ answer }) => answer));
  const comparable = reason === undefined;
  const known = list.map(({ answer }) => answer.aicc).filter((aicc) => aicc !== null);
  const best = Math.min(...known);
  const total = known.reduce((sum, aicc) => sum + Math.exp(-(aicc - best) / 2), 0);
  const rows = list.map(({ label, answer }) => {
    const { chiSquare, freeParameters, aicc, bic } = answer;
    const deltaAicc = comparable && aicc !== null ? aicc - best : null;
    return {
      label,
      chiSquare,
      freeParameters,
      aicc,
      deltaAicc,
      weight: deltaAicc === null ? null : Math.exp(-deltaAicc / 2) / total,
      bic,
    };
  });
  return comparable ? { rows, comparable } : { rows, comparable, reason };
}

function differenceOf(answers: readonly FitAnswer[]): string | undefined {
  const fingerprint = ({ residuals }: FitAnswer): string =>
    residuals
      .filter(({ enabled }) => enabled)
      .map(({ energyKeV, observed, sigma }) => `${energyKeV} ${observed} ${sigma}`)
      .sort()
      .join('\n');
  const prints = answers.map(fingerprint);
  return prints.every((print) => print === prints[0])
    ? undefined
    : 'The fits do not use the same points with the same values and uncertainties, so their χ² cannot be compared.';
}
