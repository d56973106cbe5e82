import { firstEdgeAtOrBeyond, type Kernel, type KernelGroup } from '../fold/kernel';
import type { ColumnMatrix } from './penalised';

/**
 * Stopping profiles ready for exact integrals with piecewise-linear functions: per row and bin edge, ∫ρ(x)·max(0, x − edge) dx.
 * From the deepest edge upwards, R(x_j) = R(x_{j+1}) + tail_{j+1}·h_j + ½ρ_j·h_j².
 */
export interface RampKernel {
  kernel: Kernel;
  ramps: readonly Float64Array[];
}

export function compileRamps(kernel: Kernel): RampKernel {
  return {
    kernel,
    ramps: kernel.groups.map(({ edgesNm, rows, density, tail }) => {
      const count = edgesNm.length;
      const ramp = new Float64Array(rows.length * count);
      for (let r = 0; r < rows.length; r++) {
        for (let j = count - 2, at = r * count; j >= 0; j--) {
          const h = edgesNm[j + 1]! - edgesNm[j]!;
          ramp[at + j] = ramp[at + j + 1]! + tail[at + j + 1]! * h + (density[at + j]! * h * h) / 2;
        }
      }
      return ramp;
    }),
  };
}

/** R(z) = ∫ρ(x)·max(0, x − z) dx of row r of a group, exact for ρ uniform in each bin; z in depths of the file. */
function rampAt(
  { edgesNm, density, tail }: KernelGroup,
  ramp: Float64Array,
  r: number,
  zNm: number,
): number {
  const count = edgesNm.length;
  const at = r * count;
  const next = firstEdgeAtOrBeyond(edgesNm, zNm);
  if (next === count) return 0;
  const h = edgesNm[next]! - zNm;
  const rho = next === 0 ? 0 : density[at + next - 1]!;
  return ramp[at + next]! + tail[at + next]! * h + (rho * h * h) / 2;
}

/** Share of row r of a group that stopped deeper than z. */
function tailAt({ edgesNm, density, tail }: KernelGroup, r: number, zNm: number): number {
  const count = edgesNm.length;
  const at = r * count;
  const next = firstEdgeAtOrBeyond(edgesNm, zNm);
  if (next === count) return 0;
  const rho = next === 0 ? 0 : density[at + next - 1]!;
  return tail[at + next]! + rho * (edgesNm[next]! - zNm);
}

/**
 * H_ij = ∫ρ_i(x)·hat_j(x) dx over the depths below the cap, with hat_j linear between knots, 1 at its own and 0 at the others;
 * the first and the last hat stay 1 outside the knots. Depths of the file are scaled by `scale` and counted from below the cap
 * of capNm. Exact: the share that has risen between two knots is (R(x_j) − R(x_{j+1}))/(x_{j+1} − x_j), and a hat is the
 * difference of two of these. Σ_j H_ij is the share that passed the cap.
 */
export function hatDesign(
  { kernel, ramps }: RampKernel,
  knotsNm: Float64Array,
  capNm: number,
  scale: number,
  out: ColumnMatrix,
): void {
  const { rows: stride, values } = out;
  const last = knotsNm.length - 1;
  kernel.groups.forEach((group, g) => {
    const ramp = ramps[g]!;
    for (let r = 0; r < group.rows.length; r++) {
      const row = group.rows[r]!;
      let risen = tailAt(group, r, capNm / scale);
      let before = rampAt(group, ramp, r, (knotsNm[0]! + capNm) / scale);
      for (let j = 0; j < last; j++) {
        const after = rampAt(group, ramp, r, (knotsNm[j + 1]! + capNm) / scale);
        const next = (scale * (before - after)) / (knotsNm[j + 1]! - knotsNm[j]!);
        values[j * stride + row] = risen - next;
        risen = next;
        before = after;
      }
      values[last * stride + row] = risen;
    }
  });
}
