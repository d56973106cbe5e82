import { ScanChart } from '@/components/charts/scan-chart';
import { scanLayout } from '@/components/charts/scan-layout';
import type { Observable, Residual } from '@/lib/inversion/index';

import type { FitMark } from './fit-mark';
import { LetterMarks, valueAt, type LetterPlace } from './letter-marks';

export interface MarkedCurve {
  mark: FitMark;
  name: string;
  energiesKeV: number[];
  values: number[];
}

/** The scan with the folded curve of every fit, each with its letter on it. */
export function CompareScanChart({
  residuals,
  curves,
  observable,
  width,
  height,
}: {
  residuals: readonly Residual[];
  curves: readonly MarkedCurve[];
  observable: Observable;
  width: number;
  height: number;
}) {
  const drawn = curves.map(({ mark, energiesKeV, values }) => ({
    label: mark.letter,
    style: mark.style,
    colour: mark.colour,
    energiesKeV,
    values,
  }));
  const layout = scanLayout({ marks: residuals, curves: drawn, width, height });
  const places = curves.map(({ mark, energiesKeV, values }, index): LetterPlace => {
    const [first = 0, last = 1] = [energiesKeV[0], energiesKeV.at(-1)];
    const energy = first + ((last - first) * (index + 0.7)) / (curves.length + 0.4);
    return { ...mark, x: layout.x(energy), y: layout.y(valueAt(energiesKeV, values, energy)) };
  });
  const said = `${residuals.length} points of the scan with the folded curves of ${curves.map((one) => `${one.mark.letter} ${one.name}`).join(', ')}.`;
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={said}
    >
      <ScanChart
        residuals={residuals}
        curves={drawn}
        observable={observable}
        width={width}
        height={height}
        description={said}
      />
      <LetterMarks places={places.filter((place) => Number.isFinite(place.y))} />
    </svg>
  );
}
