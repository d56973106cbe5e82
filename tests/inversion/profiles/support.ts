import type { FitInput, ParameterValues } from '@/lib/inversion/index';
import { fractionInput, rateInput } from '../support/scans';

export interface ProfileCase {
  name: string;
  input: FitInput;
  values: ParameterValues;
}

const GE_200_K = { relativePermittivity: 16.2, temperatureK: 200, intrinsicPerCm3: 1e10 };
const doped = (bulkPerCm3: number): FitInput['carriers'] => ({
  bulkPerCm3,
  bulkSigmaPerCm3: null,
  topPerCm3: null,
});
const saturating = (halfPerCm3: number): Partial<FitInput> => ({
  response: { kind: 'saturating-fraction', halfPerCm3, halfSigmaPerCm3: null },
});
const levels = { levelTop: 0.7, levelBulk: 0.3, depthScale: 1.02 };

/** Every trial profile under every response that it can have, with and without a cap. */
export const PROFILE_CASES: readonly ProfileCase[] = [
  {
    name: 'layer, both edges graded',
    input: fractionInput({ profile: 'layer', capThicknessNm: 12 }),
    values: {
      edgeDepthNm: 40.3,
      edgeWidthNm: 6,
      layerThicknessNm: 55,
      farEdgeWidthNm: 14,
      levelCap: 0.1,
      ...levels,
    },
  },
  {
    name: 'layer, near edge sharp',
    input: fractionInput({ profile: 'layer' }),
    values: {
      edgeDepthNm: 40.3,
      edgeWidthNm: 0,
      layerThicknessNm: 55,
      farEdgeWidthNm: 14,
      ...levels,
    },
  },
  {
    name: 'layer, far edge sharp',
    input: fractionInput({ profile: 'layer' }),
    values: {
      edgeDepthNm: 40.3,
      edgeWidthNm: 9,
      layerThicknessNm: 55,
      farEdgeWidthNm: 0,
      ...levels,
    },
  },
  {
    name: 'layer, both edges sharp',
    input: fractionInput({ profile: 'layer' }),
    values: {
      edgeDepthNm: 40.3,
      edgeWidthNm: 0,
      layerThicknessNm: 55.1,
      farEdgeWidthNm: 0,
      ...levels,
    },
  },
  {
    name: 'layer thinner than its edges',
    input: fractionInput({ profile: 'layer' }),
    values: {
      edgeDepthNm: 40.3,
      edgeWidthNm: 21,
      layerThicknessNm: 8,
      farEdgeWidthNm: 13,
      ...levels,
    },
  },
  {
    name: 'band bending, depletion, a rate',
    input: rateInput({
      profile: 'band-bending',
      semiconductor: GE_200_K,
      carriers: doped(2e16),
      parameters: { bulkPerCm3: { held: false, value: 2e16, prior: null } },
      capThicknessNm: 5,
    }),
    values: {
      surfacePotentialEv: 0.09,
      bulkPerCm3: 2e16,
      levelTop: 0.01,
      levelBulk: 2,
      levelCap: 0.4,
      depthScale: 0.98,
    },
  },
  {
    name: 'band bending, weak accumulation, a rate',
    input: rateInput({
      profile: 'band-bending',
      polarity: 'accumulation',
      semiconductor: { ...GE_200_K, intrinsicPerCm3: null },
      carriers: doped(2e15),
    }),
    values: {
      surfacePotentialEv: -0.03,
      bulkPerCm3: 2e15,
      levelTop: 0.01,
      levelBulk: 2,
      depthScale: 1,
    },
  },
  {
    name: 'graded edge, saturating',
    input: fractionInput({ profile: 'graded', carriers: doped(1e17), ...saturating(1e15) }),
    values: { edgeDepthNm: 60, edgeWidthNm: 17, ...levels },
  },
  {
    name: 'graded edge, saturating, accumulation, fine against the bins',
    input: fractionInput({
      profile: 'graded',
      polarity: 'accumulation',
      carriers: { bulkPerCm3: 1e14, bulkSigmaPerCm3: null, topPerCm3: 1e16 },
      capThicknessNm: 8,
      ...saturating(1e15),
    }),
    values: { edgeDepthNm: 60.2, edgeWidthNm: 0.7, levelCap: 0.5, ...levels },
  },
  {
    name: 'layer, far edge sharp, saturating',
    input: fractionInput({ profile: 'layer', carriers: doped(1e17), ...saturating(4e15) }),
    values: {
      edgeDepthNm: 40.3,
      edgeWidthNm: 9,
      layerThicknessNm: 55,
      farEdgeWidthNm: 0,
      ...levels,
    },
  },
  {
    name: 'layer, near edge sharp, saturating',
    input: fractionInput({ profile: 'layer', carriers: doped(1e17), ...saturating(4e15) }),
    values: {
      edgeDepthNm: 40.3,
      edgeWidthNm: 0,
      layerThicknessNm: 55,
      farEdgeWidthNm: 9,
      ...levels,
    },
  },
  {
    name: 'layer, both graded, saturating',
    input: fractionInput({ profile: 'layer', carriers: doped(1e17), ...saturating(4e15) }),
    values: {
      edgeDepthNm: 40.3,
      edgeWidthNm: 5,
      layerThicknessNm: 55,
      farEdgeWidthNm: 9,
      ...levels,
    },
  },
  {
    name: 'band bending, saturating',
    input: fractionInput({
      profile: 'band-bending',
      semiconductor: GE_200_K,
      carriers: doped(2e16),
      parameters: { bulkPerCm3: { held: false, value: 2e16, prior: null } },
      ...saturating(1e15),
    }),
    values: { surfacePotentialEv: 0.11, bulkPerCm3: 2e16, ...levels },
  },
];
