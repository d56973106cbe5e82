import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { checkNumber } from './check-cycle';
import { ELECTRON_MHZ_PER_T, MUON_MHZ_PER_T } from './muon-constants';
import type { MuoniumLine } from './muonium-lines';

/** Lines nearer than this to each other, MHz, are one line: at zero field the triplet is degenerate. */
const SAME_LINE_MHZ = 1e-6;
/** Weights below this are rounding: the transition is forbidden. */
const FORBIDDEN = 1e-12;

/**
 * The same lines from the Hamiltonian itself: the 4 × 4 matrix of H/h = A·S·I + ν_e S_z − ν_µ I_z in the basis
 * ↑↑, ↑↓, ↓↑, ↓↓ (electron, muon) is diagonalised, and every pair of levels a, b gives a line at E_a − E_b with weight
 * |⟨a|I₊|b⟩|²/2. In ascending frequency, forbidden lines left out, degenerate ones merged. The reference for breitRabiLines.
 *
 * @throws InversionError for a hyperfine constant that is not positive or a negative field.
 */
export function diagonaliseMuonium(hyperfineMHz: number, fieldMt: number): MuoniumLine[] {
  checkNumber(hyperfineMHz, 'hyperfine constant', 'MHz');
  checkNumber(fieldMt, 'field', 'mT', true);
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(
    hamiltonian(hyperfineMHz, fieldMt),
    { assumeSymmetric: true },
  );
  const raise = Matrix.zeros(4, 4);
  raise.set(0, 1, 1);
  raise.set(2, 3, 1);
  const amplitude = eigenvectorMatrix.transpose().mmul(raise).mmul(eigenvectorMatrix);
  const lines: MuoniumLine[] = [];
  realEigenvalues.forEach((upper, a) =>
    realEigenvalues.forEach((lower, b) => {
      const weight = amplitude.get(a, b) ** 2 / 2;
      if (weight > FORBIDDEN) lines.push({ frequencyMHz: upper - lower, weight });
    }),
  );
  return merged(lines.sort((one, other) => one.frequencyMHz - other.frequencyMHz));
}

function hamiltonian(hyperfineMHz: number, fieldMt: number): Matrix {
  const electron = (ELECTRON_MHZ_PER_T * fieldMt) / 2000;
  const muon = (MUON_MHZ_PER_T * fieldMt) / 2000;
  const quarter = hyperfineMHz / 4;
  return new Matrix([
    [quarter + electron - muon, 0, 0, 0],
    [0, -quarter + electron + muon, 2 * quarter, 0],
    [0, 2 * quarter, -quarter - electron - muon, 0],
    [0, 0, 0, quarter - electron + muon],
  ]);
}

function merged(lines: readonly MuoniumLine[]): MuoniumLine[] {
  const out: MuoniumLine[] = [];
  for (const line of lines) {
    const last = out.at(-1);
    if (last && line.frequencyMHz - last.frequencyMHz < SAME_LINE_MHZ) last.weight += line.weight;
    else out.push({ ...line });
  }
  return out;
}
