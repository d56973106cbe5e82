import { formatProbability, withDecimals } from '@/lib/format';
import type { Fit } from '@/lib/schemas/fit';

import type { Comparability } from './comparability';
import { priorsDiffer } from './same-model';

/** Zero-width test of one nested pair: ½χ²₀ + ½χ²₁ (Self and Liang 1987). */
export interface WidthTest {
  sharp: Fit;
  graded: Fit;
  statistic: number;
  pValue: number;
  sigmas: number;
}

export interface EvidenceRow {
  deltaAicc: number | null;
}

/** Below this the better model is not called better; above the second the worse one has essentially no support.
 * Burnham and Anderson, Model Selection and Multimodel Inference (2002), section 2.6, from memory. */
const NO_CHOICE = 2;
const CLEAR_CHOICE = 10;
/** Under it a fit is said not to describe the scan (common practice, no source). */
const POOR_FIT = 0.01;

/** What the scan says of the fits, in plain sentences; the first one is the answer. */
export function dataSentences(
  fits: readonly Fit[],
  judged: Comparability,
  evidence: readonly EvidenceRow[],
  tests: readonly WidthTest[],
): string[] {
  const poor = poorSentence(fits);
  if (!judged.comparable) {
    return [
      `These fits cannot be weighed against each other. ${judged.reason}`,
      'Their profiles may still be looked at together; χ², AICc and weights of different points mean nothing side by side.',
    ];
  }
  const main =
    tests.length > 0
      ? tests.map((test) => widthSentence(test, tests.length > 1))
      : [choiceSentence(fits, evidence)];
  const alsoChoice = tests.length > 0 && fits.length > 2 ? [choiceSentence(fits, evidence)] : [];
  const priors = priorsDiffer(fits)
    ? [
        'Their priors differ, and each prior adds its own term to χ²: take small differences of AICc as a rough guide only.',
      ]
    : [];
  return [...poor, ...main, ...alsoChoice, ...priors];
}

/** One nested pair in a sentence; `named` where several pairs have to be told apart. */
function widthSentence({ statistic, pValue, sigmas, graded, sharp }: WidthTest, named: boolean) {
  const who = named ? `“${graded.name}” against “${sharp.name}”: ` : '';
  const fall = withDecimals(statistic, 1);
  const chance = `p ${isProbability(pValue)}`;
  if (pValue > 0.05) {
    return `${who}The data do not tell a graded edge from a sharp one: a width lowers χ² by only ${fall}, no more than chance would (${chance}).`;
  }
  const strength =
    sigmas >= 3
      ? 'The data reject a sharp edge'
      : 'The data favour a graded edge, without settling it';
  return `${who}${strength}: a width lowers χ² by ${fall}, so zero width is rejected at ${withDecimals(sigmas, 1)}σ (${chance}).`;
}

function choiceSentence(fits: readonly Fit[], evidence: readonly EvidenceRow[]): string {
  const ranked = fits
    .map((fit, index) => ({ fit, delta: evidence[index]?.deltaAicc ?? null }))
    .filter((one): one is { fit: Fit; delta: number } => one.delta !== null)
    .toSorted((a, b) => a.delta - b.delta);
  const [best, second] = ranked;
  if (!best || !second) {
    return 'There are too few points for AICc, so the data do not rank these fits.';
  }
  const gap = second.delta - best.delta;
  const figure = `ΔAICc ${withDecimals(gap, 1)}`;
  if (gap < NO_CHOICE)
    return `The data do not choose between “${best.fit.name}” and “${second.fit.name}” (${figure}).`;
  if (gap < CLEAR_CHOICE)
    return `The data lean towards “${best.fit.name}” over “${second.fit.name}” (${figure}).`;
  return `The data clearly favour “${best.fit.name}” over ${ranked.length > 2 ? 'all others' : `“${second.fit.name}”`} (${figure}).`;
}

/** A model can win and still be wrong: say so before anything is ranked. */
function poorSentence(fits: readonly Fit[]): string[] {
  const judged = fits.map((fit) => fit.answer.pValue).filter((p): p is number => p !== null);
  const best = Math.max(...judged);
  if (judged.length < fits.length || best >= POOR_FIT) return [];
  return [
    `None of these fits describes the scan within its error bars (best p ${isProbability(best)}): a ranking among them only says which one misses by least.`,
  ];
}

/** "= 0.27", or "below 0.0001" where the digits would mean nothing. */
function isProbability(p: number): string {
  const words = formatProbability(p);
  return words.startsWith('below') ? words : `= ${words}`;
}
