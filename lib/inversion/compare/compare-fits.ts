import type { FitAnswer, FitInput } from '../types';

export interface ComparisonRow {
  label: string;
  chiSquare: number;
  freeParameters: number;
  aicc: number | null;
  deltaAicc: number | null;
  /** exp(−½ΔAICc) over its sum: the evidence for this fit among those listed. */
  weight: number | null;
  bic: number;
  deltaBic: number | null;
  /** exp(−½ΔBIC) over its sum: the posterior probability of this fit among those listed, all equally likely beforehand. */
  bicWeight: number | null;
}

/** A fit, and the covariance of its points where they have one: an answer does not carry it. */
export interface ComparedAnswer {
  label: string;
  answer: FitAnswer;
  covariance?: FitInput['covariance'];
}

export interface Comparison {
  rows: ComparisonRow[];
  /** False where the fits do not explain the same points; `reason` says why. */
  comparable: boolean;
  reason?: string;
}

/**
 * AICc differences and Akaike weights (Burnham and Anderson, Model Selection and Multimodel Inference, 2002, sections 2.4 and
 * 2.9) of fits to one scan, and the same of BIC (Schwarz, Ann. Stat. 6, 461, 1978; as probabilities in Kass and Raftery, J. Am.
 * Stat. Assoc. 90, 773, 1995). Fits that do not share their enabled points, values and σ are listed but not weighed.
 */
export function compareFits(list: readonly ComparedAnswer[]): Comparison {
  const reason = differenceOf(list);
  const comparable = reason === undefined;
  const akaike = weigh(list.map(({ answer }) => (comparable ? answer.aicc : null)));
  const schwarz = weigh(list.map(({ answer }) => (comparable ? answer.bic : null)));
  const rows = list.map(({ label, answer }, index) => {
    const { chiSquare, freeParameters, aicc, bic } = answer;
    const { delta: deltaAicc, weight } = akaike[index]!;
    const { delta: deltaBic, weight: bicWeight } = schwarz[index]!;
    return { label, chiSquare, freeParameters, aicc, deltaAicc, weight, bic, deltaBic, bicWeight };
  });
  return comparable ? { rows, comparable } : { rows, comparable, reason };
}

/** Δ_k = C_k − min C and w_k = exp(−½Δ_k)/Σ exp(−½Δ) over the criteria that exist. */
function weigh(
  criteria: readonly (number | null)[],
): { delta: number | null; weight: number | null }[] {
  const known = criteria.filter((value) => value !== null);
  const best = Math.min(...known);
  const total = known.reduce((sum, value) => sum + Math.exp(-(value - best) / 2), 0);
  return criteria.map((value) =>
    value === null
      ? { delta: null, weight: null }
      : { delta: value - best, weight: Math.exp(-(value - best) / 2) / total },
  );
}

/** Why fits cannot be compared: their enabled points, values or σ differ; undefined where they can. */
export function differenceOf(list: readonly Omit<ComparedAnswer, 'label'>[]): string | undefined {
  const fingerprint = ({ answer, covariance }: Omit<ComparedAnswer, 'label'>): string =>
    answer.residuals
      .filter(({ enabled }) => enabled)
      .map(({ energyKeV, observed, sigma }) => `${energyKeV} ${observed} ${sigma}`)
      .sort()
      .join('\n') + JSON.stringify(covariance ?? null);
  const prints = list.map(fingerprint);
  return prints.every((print) => print === prints[0])
    ? undefined
    : 'The fits do not use the same points with the same values and uncertainties, so their χ² cannot be compared.';
}
