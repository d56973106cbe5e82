import type { ScaleLinear } from 'd3';

import { SANS } from './axis';
import type { DepthInformation } from './chart-types';

/** How much the scan knows about carriers at each depth, as a strip from blank (nothing) to full (most). */
export function ReachStrip({
  information,
  x,
  top,
  height,
}: {
  information: DepthInformation | null;
  x: ScaleLinear<number, number>;
  top: number;
  height: number;
}) {
  const [left, right] = x.range() as [number, number];
  return (
    <g>
      <text
        x={left - 8}
        y={top + height - 2}
        textAnchor="end"
        fill="var(--ink-2)"
        fontFamily={SANS}
        fontSize={11.5}
      >
        reach
      </text>
      {information &&
        cells(information, x, [left, right]).map((cell) => (
          <rect
            key={cell.from}
            x={cell.from}
            y={top}
            width={cell.width}
            height={height}
            fill="var(--kelp)"
            fillOpacity={cell.share}
          />
        ))}
      <rect
        x={left}
        y={top}
        width={right - left}
        height={height}
        fill="none"
        stroke="var(--rule)"
      />
    </g>
  );
}

const CELL = 6;

/** Even cells of the strip, each with the information nearest to its middle relative to the most there is. */
function cells(
  { depthsNm, values }: DepthInformation,
  x: ScaleLinear<number, number>,
  [left, right]: readonly [number, number],
) {
  const most = Math.max(1e-300, ...Array.from(values));
  const count = Math.max(1, Math.floor((right - left) / CELL));
  const width = (right - left) / count;
  let at = 0;
  return Array.from({ length: count }, (_, index) => {
    const from = left + index * width;
    const depth = x.invert(from + width / 2);
    while (
      at + 1 < depthsNm.length &&
      Math.abs(depthsNm[at + 1]! - depth) <= Math.abs(depthsNm[at]! - depth)
    )
      at++;
    const share = depth < 0 ? 0 : Math.max(0, values[at] ?? 0) / most;
    return { from, width: width - 0.75, share };
  });
}
