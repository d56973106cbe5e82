import type { Fit } from '@/lib/schemas/fit';

export interface TargetGroup {
  label: string;
  targets: { value: string; label: string }[];
}

const DEPTH_STEPS = 8;

/** What a comment may point at: the points of the scan, round depths within reach and the edge, and the checks. */
export function commentTargets(fit: Fit): TargetGroup[] {
  return [
    {
      label: 'Points',
      targets: fit.points.map(({ energyKeV }) => target(`point ${energyKeV} keV`)),
    },
    {
      label: 'Depths',
      targets: roundDepths(fit).map((depthNm) => target(`depth ${depthNm} nm`)),
    },
    {
      label: 'Checks',
      targets: fit.checks.map(({ id }) => ({
        value: `check ${id}`,
        label: `check: ${checkName(id)}`,
      })),
    },
  ].filter((group) => group.targets.length > 0);
}

const target = (value: string) => ({ value, label: value });

/** "edge-inside-reach" → "edge inside reach" */
export const checkName = (id: string): string => id.replaceAll('-', ' ');

/** The edge and a handful of round depths down to the reach. */
function roundDepths(fit: Fit): number[] {
  const { reachNm } = fit.carrierProfile;
  const step = roundStep(reachNm / DEPTH_STEPS);
  const even = Array.from({ length: Math.floor(reachNm / step) + 1 }, (_, i) =>
    Number((i * step).toPrecision(6)),
  );
  const edge = fit.edge ? [Math.round(fit.edge.value)] : [];
  return [...new Set([...even, ...edge])].toSorted((a, b) => a - b);
}

/** The next 1, 2 or 5 times a power of ten. */
function roundStep(atLeast: number): number {
  const power = 10 ** Math.floor(Math.log10(Math.max(atLeast, 1)));
  return ([1, 2, 5].find((factor) => factor * power >= atLeast) ?? 10) * power;
}

/** Where on the page the thing stands that a comment points at, lit where a figure can do that; null for the whole fit. */
export function targetAnchor(value: string): string | null {
  if (value.startsWith('check ')) return `#check-${value.slice('check '.length)}`;
  if (value.startsWith('point ')) return `?about=${encodeURIComponent(value)}#scan`;
  if (value.startsWith('depth ')) return '#depth';
  return null;
}

/** The energy (keV) that an address wants lit: "point 14 keV" gives 14. */
export function litEnergyKeV(about: string | string[] | undefined): number | null {
  const energy = typeof about === 'string' ? /^point (\S+) keV$/.exec(about)?.[1] : undefined;
  const value = Number(energy);
  return energy !== undefined && Number.isFinite(value) ? value : null;
}
