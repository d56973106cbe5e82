import { InversionError } from '../errors';
import type { Estimate } from '../electrostatics/estimate';
import type { FitAnswer, ParameterName } from '../types';

/**
 * Depth of the far edge of a layer, W₂ = W₁ + thickness, nm, with its σ from the covariance: the two are strongly correlated and
 * their own σ do not add up. A thickness or depth that is held or at its bound counts as exact.
 *
 * @returns null where the covariance does not exist.
 * @throws InversionError 'wrong-fit' for a fit of another profile.
 */
export function farEdgeDepth({ parameters, covariance }: FitAnswer): Estimate | null {
  const names: readonly ParameterName[] = ['edgeDepthNm', 'layerThicknessNm'];
  const parts = names.map((name) => parameters.find((parameter) => parameter.name === name));
  const [near, thickness] = parts;
  if (!near || !thickness) throw new InversionError('wrong-fit', 'Only a layer has a far edge.');
  if (!covariance.ok) return null;
  const places = names.map((name) => covariance.names.indexOf(name)).filter((k) => k >= 0);
  const variance = places.reduce(
    (sum, a) => sum + places.reduce((inner, b) => inner + covariance.matrix[a]![b]!, 0),
    0,
  );
  return { value: near.value + thickness.value, sigma: Math.sqrt(variance) };
}
