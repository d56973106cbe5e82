import type { Fit } from '@/lib/schemas/fit';

type Named = Fit['answer']['parameters'][number]['name'];
type Described = { observable: Fit['observable']; spec: Pick<Fit['spec'], 'polarity'> };

/** Parameters in the order in which people ask for them. */
export const PARAMETER_ORDER: readonly Named[] = [
  'edgeDepthNm',
  'edgeWidthNm',
  'layerThicknessNm',
  'farEdgeWidthNm',
  'surfacePotentialEv',
  'bulkPerCm3',
  'levelTop',
  'levelBulk',
  'levelCap',
  'depthScale',
];

/** The name of a parameter in words. Under accumulation the populated side is the surface. */
export function parameterLabel(name: Named, fit: Described): string {
  const level = fit.observable === 'rate' ? 'Rate' : 'Fraction';
  const topIsPopulated = fit.spec.polarity === 'accumulation';
  const words: Record<Named, string> = {
    edgeDepthNm: 'Edge depth',
    edgeWidthNm: 'Edge width (σ)',
    layerThicknessNm: 'Layer thickness',
    farEdgeWidthNm: 'Far edge width (σ)',
    surfacePotentialEv: 'Band bending at the surface',
    bulkPerCm3: 'Bulk concentration',
    levelTop: `${level}, ${topIsPopulated ? 'populated' : 'depleted'} (surface side)`,
    levelBulk: `${level}, ${topIsPopulated ? 'depleted' : 'populated'} (bulk side)`,
    levelCap: `${level} in the cap`,
    depthScale: 'Depth scale',
  };
  return words[name];
}

/** Unit of a parameter, with nothing for a pure number. */
export function parameterUnit(name: Named, observable: Fit['observable']): string {
  if (name.endsWith('Nm')) return 'nm';
  if (name === 'surfacePotentialEv') return 'eV';
  if (name === 'bulkPerCm3') return 'cm⁻³';
  if (name === 'depthScale') return '';
  return observable === 'rate' ? 'µs⁻¹' : '';
}

/** How a one-sided interval is said: an edge is deeper, a width wider, a level higher. */
export function moreAndLess(name: Named): readonly [more: string, less: string] {
  if (name === 'edgeDepthNm') return ['deeper than', 'shallower than'];
  if (name === 'edgeWidthNm') return ['wider than', 'narrower than'];
  return ['above', 'below'];
}
