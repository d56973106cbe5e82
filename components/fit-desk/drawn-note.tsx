import { Button } from '@/components/ui/button';
import type { FitAnswer } from '@/lib/inversion/index';

import type { Drawing } from './use-drawing';

/** What a curve drawn by hand is worth beside the fit, and what can be done with it. */
export function DrawnNote({ drawing, fitted }: { drawing: Drawing; fitted: FitAnswer | null }) {
  const of = fitted ? `; that of the fit has ${fitted.dataChiSquare.toFixed(1)}` : '';
  return (
    <span className="flex flex-wrap items-center gap-2">
      <span role="status">{`Drawn by hand: this curve has χ² ${drawing.chiSquare?.toFixed(1)} with everything else as it stands${of}.`}</span>
      <Button size="small" onClick={drawing.hold}>
        Hold what is drawn
      </Button>
      <Button size="small" variant="quiet" onClick={drawing.clear}>
        Back to the fit
      </Button>
    </span>
  );
}
