import { area, line, type ScaleLinear } from 'd3';

import { MONO, SANS } from './axis';
import type { Ridge } from './chart-types';
import { energyColour, energyRange } from './energy-colour';
import { ridgePoints } from './ridge-shape';

const LABEL_SPACING = 14;
/** How far a ridge may rise over its neighbours, in ridge spacings. */
const OVERLAP = 3.2;

export interface RidgelinePanelProps {
  ridges: readonly Ridge[];
  x: ScaleLinear<number, number>;
  top: number;
  height: number;
  depthScale?: number;
  capThicknessNm?: number;
  highlightedKeV?: number | null;
  /** Energies that speak about the depth under the pointer; the others fade. */
  speakingKeV?: readonly number[] | null;
}

/** Base line of each ridge in a panel, shallow at the top. */
export function ridgeBases(
  ridges: readonly Pick<Ridge, 'energyKeV'>[],
  { top, height }: { top: number; height: number },
): { energyKeV: number; y: number }[] {
  const spacing = height / (ridges.length + OVERLAP - 1);
  return ridges
    .map((ridge) => ridge.energyKeV)
    .sort((a, b) => a - b)
    .map((energyKeV, index) => ({ energyKeV, y: top + spacing * (index + OVERLAP) }));
}

/** Stopping profiles of all energies over one depth axis, on one common scale, shallow at the top. */
export function RidgelinePanel({
  ridges,
  x,
  top,
  height,
  depthScale,
  capThicknessNm,
  highlightedKeV = null,
  speakingKeV = null,
}: RidgelinePanelProps) {
  const sorted = [...ridges].sort((a, b) => a.energyKeV - b.energyKeV);
  const range = energyRange(sorted.map((ridge) => ridge.energyKeV));
  const spacing = height / (sorted.length + OVERLAP - 1);
  const bases = ridgeBases(sorted, { top, height });
  const domain = x.domain() as [number, number];
  const [left, right] = x.range() as [number, number];
  const cells = Math.max(40, Math.min(400, Math.round((right - left) / 2)));
  const shapes = sorted.map((ridge) =>
    ridgePoints(ridge, domain, cells, { depthScale, capThicknessNm }),
  );
  const highest = Math.max(
    1e-12,
    ...shapes.flatMap((points) => points.map((point) => point.density)),
  );
  const rise = (OVERLAP * spacing) / highest;
  const labelEvery = Math.max(1, Math.ceil(LABEL_SPACING / spacing));
  return (
    <g>
      <text
        x={left - 8}
        y={top + 11}
        textAnchor="end"
        fill="var(--ink-2)"
        fontFamily={SANS}
        fontSize={11.5}
      >
        keV
      </text>
      {sorted.map((ridge, index) => {
        const base = bases[index]!.y;
        const colour = energyColour(ridge.energyKeV, range);
        const lit = highlightedKeV === ridge.energyKeV;
        const faded =
          !lit &&
          (highlightedKeV !== null ||
            (speakingKeV !== null && !speakingKeV.includes(ridge.energyKeV)));
        const labelled = lit || (highlightedKeV === null && index % labelEvery === 0);
        const height = (density: number) => base - density * rise;
        const points = shapes[index]!;
        return (
          <g key={ridge.energyKeV} opacity={faded ? 0.3 : 1}>
            <path
              d={
                area<(typeof points)[number]>()
                  .x((p) => x(p.depthNm))
                  .y0(base)
                  .y1((p) => height(p.density))(points) ?? ''
              }
              fill={colour}
              fillOpacity={lit ? 0.5 : 0.2}
            />
            <path
              d={
                line<(typeof points)[number]>()
                  .x((p) => x(p.depthNm))
                  .y((p) => height(p.density))(points) ?? ''
              }
              fill="none"
              stroke={colour}
              strokeWidth={lit ? 2.25 : 1.1}
              strokeDasharray={ridge.interpolated ? '3 2' : undefined}
            />
            {labelled && (
              <text
                x={left - 8}
                y={base + 4}
                textAnchor="end"
                fill="var(--ink-2)"
                fontFamily={MONO}
                fontSize={11.5}
                fontWeight={lit ? 700 : 400}
              >
                {`${ridge.energyKeV}${ridge.interpolated ? '*' : ''}`}
              </text>
            )}
          </g>
        );
      })}
    </g>
  );
}
