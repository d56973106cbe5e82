export const MONO = 'var(--mono)';
export const SANS = 'var(--sans)';

interface Tick {
  position: number;
  label: string;
  /** Drawn raised after the label: the exponent of a power of ten. */
  exponent?: string;
}

interface AxisProps {
  ticks: readonly Tick[];
  /** Length of the grid line that runs from each tick through the panel, px; 0 for none. */
  grid: number;
  /** Where the axis stands across its own direction, px. */
  at: number;
}

/** Ticks below a panel, with grid lines upwards. */
export function AxisBottom({ ticks, grid, at }: AxisProps) {
  return (
    <g>
      {ticks.map((tick) => (
        <g key={tick.position}>
          {grid > 0 && (
            <line
              x1={tick.position}
              x2={tick.position}
              y1={at}
              y2={at - grid}
              stroke="var(--rule)"
            />
          )}
          <line x1={tick.position} x2={tick.position} y1={at} y2={at + 4} stroke="var(--ink-3)" />
          <TickText tick={tick} x={tick.position} y={at + 17} anchor="middle" />
        </g>
      ))}
    </g>
  );
}

/** Tick labels to the left of a panel, with grid lines to the right. */
export function AxisLeft({ ticks, grid, at }: AxisProps) {
  return (
    <g>
      {ticks.map((tick) => (
        <g key={tick.position}>
          {grid > 0 && (
            <line
              x1={at}
              x2={at + grid}
              y1={tick.position}
              y2={tick.position}
              stroke="var(--rule)"
            />
          )}
          <TickText tick={tick} x={at - 8} y={tick.position + 4} anchor="end" />
        </g>
      ))}
    </g>
  );
}

function TickText({
  tick,
  x,
  y,
  anchor,
}: {
  tick: Tick;
  x: number;
  y: number;
  anchor: 'middle' | 'end';
}) {
  return (
    <text x={x} y={y} textAnchor={anchor} fill="var(--ink-2)" fontFamily={MONO} fontSize={11.5}>
      {tick.label}
      {tick.exponent !== undefined && (
        <tspan dy={-4} fontSize={11}>
          {tick.exponent}
        </tspan>
      )}
    </text>
  );
}

/** The name and unit of an axis. */
export function AxisTitle({
  x,
  y,
  anchor,
  children,
}: {
  x: number;
  y: number;
  anchor: 'start' | 'middle' | 'end';
  children: string;
}) {
  return (
    <text x={x} y={y} textAnchor={anchor} fill="var(--ink-2)" fontFamily={SANS} fontSize={12}>
      {children}
    </text>
  );
}
