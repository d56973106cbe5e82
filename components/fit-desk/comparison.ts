import {
  type ProfileKind,
  compareFits,
  zeroWidthTest,
  type CarrierProfile,
  type FitAnswer,
  type FitInput,
} from '@/lib/inversion/index';
import type { EvidenceRow } from '@/components/charts/evidence-table';

import { profileKind } from './profile-kinds';

/** One trial profile fitted to the same data under the same assumptions. */
export interface ComparedFit {
  kind: ProfileKind;
  input: FitInput;
  answer: FitAnswer;
  profile: CarrierProfile;
}

export interface ComparedRefusal {
  kind: ProfileKind;
  message: string;
}

export interface ComparisonResult {
  /** Stands for data and assumptions without the trial profile. */
  key: string;
  fits: readonly ComparedFit[];
  refusals: readonly ComparedRefusal[];
}

/** Rows of the evidence table: the model on the desk solid, the others dashed. */
export function evidenceRows(
  fits: readonly ComparedFit[],
  current: ProfileKind,
): { rows: EvidenceRow[]; reason: string | null } {
  const compared = compareFits(
    fits.map(({ kind, answer }) => ({ label: profileKind(kind).label, answer })),
  );
  const rows = compared.rows.map((row, index) => {
    const isCurrent = fits[index]?.kind === current;
    return { ...row, colour: isCurrent ? 'var(--coral)' : 'var(--tide)', dashed: !isCurrent };
  });
  return {
    rows,
    reason: compared.comparable ? null : (compared.reason ?? 'These fits cannot be compared.'),
  };
}

/** Whether the data ask for a width, in one sentence; null unless both edges were fitted. */
export function zeroWidthSentence(fits: readonly ComparedFit[]): string | null {
  const sharp = fits.find(({ kind }) => kind === 'sharp');
  const graded = fits.find(({ kind }) => kind === 'graded');
  if (!sharp || !graded) return null;
  const { sigmas, pValue } = zeroWidthTest(sharp.answer, graded.answer);
  const numbers = `${sigmas.toFixed(1)} σ, p = ${pValue < 1e-4 ? 'below 0.0001' : Number(pValue.toPrecision(2))}, half-half mixture of χ²`;
  if (pValue < 0.01) return `Zero width is rejected (${numbers}).`;
  // Between the two, AICc may still prefer the sharp edge: a sentence that decides would contradict the table.
  if (pValue < 0.05) return `The data hint at a width without deciding it (${numbers}).`;
  return `These data do not tell the graded edge from a sharp one (${numbers}).`;
}
