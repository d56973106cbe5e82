import type { FitToSave } from './save-fit';
import { specOf, type Assumptions } from './assumptions';
import type { GoodResult } from './fitting';

/** What can be saved now, or why nothing can. */
export function fitToSave({
  scanId,
  parentFitId,
  assumptions,
  good,
  outOfDate,
}: {
  scanId: string;
  parentFitId: string | null;
  assumptions: Assumptions;
  good: GoodResult | null;
  outOfDate: boolean;
}): { fit: FitToSave; waitsFor: null } | { fit: null; waitsFor: string } {
  const { stoppingSetId } = assumptions;
  if (!good || stoppingSetId === null)
    return { fit: null, waitsFor: 'There is no fit to save yet.' };
  if (outOfDate) return { fit: null, waitsFor: 'Fit again first: something changed since.' };
  if (!good.complete) return { fit: null, waitsFor: 'The bands are not there yet.' };
  const claimed = { answer: good.first.answer, profile: good.profile };
  return {
    fit: { scanId, stoppingSetId, parentFitId, spec: specOf(assumptions), claimed },
    waitsFor: null,
  };
}
