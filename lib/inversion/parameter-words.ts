import type { ParameterName } from './types';

/** Parameter names as words in a sentence. */
export const IN_WORDS: Readonly<Record<ParameterName, string>> = {
  edgeDepthNm: 'the edge depth',
  edgeWidthNm: 'the edge width',
  layerThicknessNm: 'the layer thickness',
  farEdgeWidthNm: 'the width of the far edge',
  surfacePotentialEv: 'the band bending at the surface',
  bulkPerCm3: 'the bulk concentration',
  levelTop: 'the level above the edge',
  levelBulk: 'the level below the edge',
  levelCap: 'the level of the cap',
  depthScale: 'the depth scale',
};

/** The same at the beginning of a sentence. */
export function sentence(name: ParameterName): string {
  const words = IN_WORDS[name];
  return words[0]!.toUpperCase() + words.slice(1);
}
