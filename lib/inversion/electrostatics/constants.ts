/** e, C; exact in the SI of 2019 (CODATA 2018 and 2022). */
export const ELEMENTARY_CHARGE_C = 1.602176634e-19;
/** k, J/K; exact in the SI of 2019 (CODATA 2018 and 2022). */
export const BOLTZMANN_J_PER_K = 1.380649e-23;
/** k/e, eV/K. */
export const BOLTZMANN_EV_PER_K = BOLTZMANN_J_PER_K / ELEMENTARY_CHARGE_C;
/** ε₀, F/cm (CODATA 2022: 8.8541878188e-12 F/m). */
export const VACUUM_PERMITTIVITY_F_PER_CM = 8.8541878188e-14;
/** h, J s; exact in the SI of 2019 (CODATA 2018 and 2022). */
export const PLANCK_J_S = 6.62607015e-34;
/** Electron mass, kg (CODATA 2022). */
export const ELECTRON_MASS_KG = 9.1093837139e-31;
export const NM_PER_CM = 1e7;
