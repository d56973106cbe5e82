/** γ_µ/2π, MHz/T (CODATA 2018 and 2022, seven digits). */
export const MUON_MHZ_PER_T = 135.5388;
/** γ_e/2π of the free electron, MHz/T (CODATA 2018 and 2022, nine digits). */
export const ELECTRON_MHZ_PER_T = 28024.9514;

/**
 * Isotropic hyperfine constants A of muonium in vacuum and of tetrahedral muonium in semiconductors, MHz (Patterson, Rev.
 * Mod. Phys. 60, 69 (1988), table I, from memory). Silicon carbide has several muonium centres: enter the one at hand.
 */
export const HYPERFINE_MHZ = {
  vacuum: 4463.302,
  Si: 2006.3,
  Ge: 2359.5,
  GaAs: 2883.6,
  diamond: 3711,
} as const;
