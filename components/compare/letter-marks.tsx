import { SANS } from '@/components/charts/axis';

import type { FitMark } from './fit-mark';

export interface LetterPlace extends FitMark {
  x: number;
  y: number;
}

/** The letter of each fit on its own line, so that lines are told apart without their colour. */
export function LetterMarks({ places }: { places: readonly LetterPlace[] }) {
  return (
    <g fontFamily={SANS} fontSize={10.5} fontWeight={600} textAnchor="middle">
      {places.map(({ letter, colour, x, y }) => (
        <g key={letter}>
          <circle cx={x} cy={y} r={8} fill="var(--paper)" stroke={colour} strokeWidth={1.5} />
          <text x={x} y={y + 3.75} fill="var(--ink)">
            {letter}
          </text>
        </g>
      ))}
    </g>
  );
}

/** A value between the samples of a line, linear in x; NaN outside of them. */
export function valueAt(xs: ArrayLike<number>, ys: ArrayLike<number>, x: number): number {
  for (let i = 1; i < xs.length; i++) {
    const [left, right] = [xs[i - 1]!, xs[i]!];
    if (x < left || x > right) continue;
    const share = right > left ? (x - left) / (right - left) : 1;
    return ys[i - 1]! + (ys[i]! - ys[i - 1]!) * share;
  }
  return Number.NaN;
}
