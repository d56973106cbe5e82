import { checkPositive, DOPING, INTRINSIC } from './estimate';

/**
 * Majority and minority carriers of the neutral bulk, cm⁻³: with net ionised doping N, majority − minority = N and
 * majority·minority = n_i², so majority = N/2 + √(N²/4 + n_i²) (Sze, section 1.4.2).
 *
 * @throws InversionError for a doping or n_i that is not a positive number.
 */
export function bulkCarriers(
  dopingPerCm3: number,
  intrinsicPerCm3: number,
): { majorityPerCm3: number; minorityPerCm3: number } {
  checkPositive(dopingPerCm3, DOPING);
  checkPositive(intrinsicPerCm3, INTRINSIC);
  const majorityPerCm3 = dopingPerCm3 / 2 + Math.hypot(dopingPerCm3 / 2, intrinsicPerCm3);
  return {
    majorityPerCm3,
    minorityPerCm3: intrinsicPerCm3 * (intrinsicPerCm3 / majorityPerCm3),
  };
}
