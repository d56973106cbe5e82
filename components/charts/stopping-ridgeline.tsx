import { scaleLinear } from 'd3';

import { AxisBottom, AxisTitle } from './axis';
import type { Ridge } from './chart-types';
import { ridgeQuantile } from './ridge-shape';
import { RidgelinePanel } from './ridgeline-panel';

/** Stopping profiles of all energies as a ridgeline over depth below the surface of the stack. */
export function StoppingRidgeline({
  profiles,
  width,
  height,
  depthScale = 1,
  highlightedKeV = null,
  maxDepthNm,
  interpolated = [],
  description,
}: {
  profiles: readonly Ridge[];
  width: number;
  height: number;
  depthScale?: number;
  highlightedKeV?: number | null;
  maxDepthNm?: number;
  /** Energies whose profile is interpolated between its neighbours. */
  interpolated?: readonly number[];
  description?: string;
}) {
  const deepest =
    maxDepthNm ?? Math.max(1, ...profiles.map((ridge) => ridgeQuantile(ridge, 0.995) * depthScale));
  const x = scaleLinear()
    .domain([0, deepest])
    .range([54, Math.max(94, width - 16)]);
  const ridges = profiles.map((ridge) => ({
    ...ridge,
    interpolated: ridge.interpolated || interpolated.includes(ridge.energyKeV),
  }));
  const energies = profiles.map((ridge) => ridge.energyKeV);
  const sentence =
    description ??
    `Stopping profiles of ${profiles.length} energies from ${Math.min(...energies)} to ${Math.max(...energies)} keV over depth to ${deepest.toFixed(0)} nm.`;
  const [left, right] = x.range() as [number, number];
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={sentence}
    >
      <RidgelinePanel
        ridges={ridges}
        x={x}
        top={4}
        height={height - 50}
        depthScale={depthScale}
        highlightedKeV={highlightedKeV}
      />
      <AxisBottom
        ticks={x
          .ticks(Math.max(3, Math.round((right - left) / 70)))
          .map((depth) => ({ position: x(depth), label: `${depth}` }))}
        at={height - 44}
        grid={0}
      />
      <line x1={left} x2={right} y1={height - 44} y2={height - 44} stroke="var(--ink-3)" />
      <AxisTitle x={(left + right) / 2} y={height - 8} anchor="middle">
        depth below the surface of the stack (nm)
      </AxisTitle>
    </svg>
  );
}
