const SPACING = 7;

/**
 * Diagonal hatching over a rectangle. Drawn as one path in a nested svg, which clips it: a pattern
 * would need an id that is unique on the page, and other programs lose patterns on import.
 */
export function Hatch({
  x,
  y,
  width,
  height,
}: {
  x: number;
  y: number;
  width: number;
  height: number;
}) {
  if (!(width > 0.5 && height > 0.5)) return null;
  const lines: string[] = [];
  for (let start = -height; start < width; start += SPACING) {
    lines.push(`M${start.toFixed(1)} ${height}L${(start + height).toFixed(1)} 0`);
  }
  return (
    <svg x={x} y={y} width={width} height={height} overflow="hidden">
      <path
        d={lines.join('')}
        stroke="var(--ink-3)"
        strokeOpacity={0.45}
        strokeWidth={1}
        fill="none"
      />
    </svg>
  );
}
