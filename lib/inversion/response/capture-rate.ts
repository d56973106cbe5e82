import { InversionError } from '../errors';
import type { Response } from '../types';
import type { ResponseModel } from './response-model';

/** 1 µs⁻¹ in s⁻¹. */
const PER_S_IN_PER_US = 1e6;

function capture(response: Response): Extract<Response, { kind: 'capture-rate' }> {
  if (response.kind === 'capture-rate') return response;
  throw new InversionError('wrong-response', 'A capture-rate response was expected here.');
}

/** Capture rate: Λ = γ·p + Λ₀, so p = (Λ − Λ₀)/γ with γ in cm³ s⁻¹ and Λ in µs⁻¹ = 10⁶ s⁻¹. Levels lie at or above Λ₀. */
export const captureRate: ResponseModel = {
  observable: 'rate',
  levelBounds: (response) => [capture(response).baselinePerUs, Infinity],
  capBounds: [0, Infinity],
  unit: () => 'cm⁻³',
  line(levelTop, levelBulk, { response }) {
    const { gammaCm3PerS, baselinePerUs } = capture(response);
    const perLevel = PER_S_IN_PER_US / gammaCm3PerS;
    return {
      offset: (levelTop - baselinePerUs) * perLevel,
      slope: (levelBulk - levelTop) * perLevel,
    };
  },
  valueOfChange: (change, _contrast, { response }) =>
    (change * PER_S_IN_PER_US) / capture(response).gammaCm3PerS,
};
