import type { Semiconductor, Sourced } from './semiconductor';

const SZE = 'Sze, Physics of Semiconductor Devices, appendices F to H, from memory';
const THURMOND = 'Thurmond, J. Electrochem. Soc. 122, 1133 (1975), from memory';
const GREEN = 'Green, J. Appl. Phys. 67, 2944 (1990)';
const IOFFE = 'Ioffe Institute, New Semiconductor Materials archive';
const SIC_BOOK =
  'Levinshtein, Rumyantsev and Shur, Properties of Advanced Semiconductor Materials (2001), from memory';

function number(value: number, source: string, sigma: number | null = null): Sourced {
  return { value, sigma, source };
}

export type MaterialName = 'Si' | 'Ge' | 'GaAs' | '4H-SiC';

/**
 * Handbook numbers at 300 K, each with its source; "from memory" where the source was not at hand. σ is null where the
 * source gives none, and then counts as 0 in every propagated uncertainty.
 *
 * 4H silicon carbide is anisotropic: ε_r is the geometric mean of the 6H values 9.66 (across c) and 10.03 (along c), which
 * are the ones usually taken for 4H. Its donors are not all ionised near room temperature; every formula here takes the
 * concentration that is.
 */
export const MATERIALS: Readonly<Record<MaterialName, Semiconductor>> = {
  Si: {
    name: 'Si',
    relativePermittivity: number(
      11.7,
      'Neamen, Semiconductor Physics and Devices, table B.4, from memory',
    ),
    gap: {
      atZeroEv: number(1.17, THURMOND),
      alphaEvPerK: number(4.73e-4, THURMOND),
      betaK: number(636, THURMOND),
    },
    conductionStatesPerCm3: number(2.86e19, GREEN),
    valenceStatesPerCm3: number(3.1e19, GREEN),
    electronMass: number(0.28, `${GREEN}, thermal-velocity mass, from memory`),
    holeMass: number(0.41, `${GREEN}, thermal-velocity mass, from memory`),
  },
  Ge: {
    name: 'Ge',
    relativePermittivity: number(16.2, `${IOFFE}, Ge basic parameters`),
    gap: {
      atZeroEv: number(0.7437, THURMOND),
      alphaEvPerK: number(4.774e-4, THURMOND),
      betaK: number(235, THURMOND),
    },
    conductionStatesPerCm3: number(1.04e19, SZE),
    valenceStatesPerCm3: number(6.0e18, SZE),
    electronMass: number(0.12, `${IOFFE}, Ge band structure, mass of conductivity`),
    holeMass: number(0.33, `${IOFFE}, Ge band structure, heavy holes`),
  },
  GaAs: {
    name: 'GaAs',
    relativePermittivity: number(12.9, SZE),
    gap: {
      atZeroEv: number(1.519, THURMOND),
      alphaEvPerK: number(5.405e-4, THURMOND),
      betaK: number(204, THURMOND),
    },
    conductionStatesPerCm3: number(4.7e17, SZE),
    valenceStatesPerCm3: number(7.0e18, SZE),
    electronMass: number(0.063, 'Blakemore, J. Appl. Phys. 53, R123 (1982), from memory'),
    holeMass: number(0.51, 'Blakemore, J. Appl. Phys. 53, R123 (1982), heavy holes, from memory'),
  },
  '4H-SiC': {
    name: '4H-SiC',
    relativePermittivity: number(
      9.84,
      'Patrick and Choyke, Phys. Rev. B 2, 2255 (1970), 6H, from memory',
    ),
    gap: {
      atZeroEv: number(3.265, SIC_BOOK),
      alphaEvPerK: number(6.5e-4, SIC_BOOK),
      betaK: number(1300, SIC_BOOK),
    },
    conductionStatesPerCm3: number(1.69e19, SIC_BOOK),
    valenceStatesPerCm3: number(2.49e19, SIC_BOOK),
    electronMass: number(
      0.376,
      'harmonic mean of 0.33, 0.58 and 0.31: Volm et al., Phys. Rev. B 53, 15409 (1996)',
    ),
    holeMass: number(1.0, `${SIC_BOOK}, density-of-states mass`),
  },
};
