import { whiten, type Whitener } from '../linalg/whitener';
import type { GaussianPrior } from '../types';
import { hatDesign, type RampKernel } from './hat-design';
import type { Monotonic } from './free-form-input';
import type { ObservedLine } from './observed-line';
import type { ColumnMatrix } from './penalised';

/** The cap level: none without a cap, held, or one more unknown ≥ 0 that no penalty sees. */
export type CapLevel =
  | { kind: 'none' }
  | { kind: 'held'; value: number }
  | { kind: 'free'; prior: GaussianPrior | null };

/** Rows that a prior of the cap level adds to those of the points. */
export function priorRows(cap: CapLevel): 0 | 1 {
  return cap.kind === 'free' && cap.prior ? 1 : 0;
}

/**
 * How the points follow from the unknowns: ŷ_i = base·(1 − q_i) + slope·Σ_j H_ij u_j + cap·q_i, with q_i the share that stopped
 * in the cap. Columns are the knots, and the cap level where it is free. A prior of the cap level is one more row.
 */
export interface Observation {
  ramps: RampKernel;
  knotsNm: Float64Array;
  capNm: number;
  line: ObservedLine;
  cap: CapLevel;
  /** ∂ŷ/∂u, rows in ascending energy, and ŷ at u = 0, at the depth scale filled in last. */
  plain: ColumnMatrix;
  offset: Float64Array;
}

/** Fills the derivatives and the offset at one depth scale. */
export function observeAt(observation: Observation, scale: number): void {
  const { ramps, knotsNm, capNm, line, cap, plain, offset } = observation;
  hatDesign(ramps, knotsNm, capNm, scale, plain);
  const knots = knotsNm.length;
  const { rows, values } = plain;
  for (let i = 0; i < ramps.kernel.rowCount; i++) {
    let passed = 0;
    for (let j = 0; j < knots; j++) {
      passed += values[j * rows + i]!;
      values[j * rows + i] = values[j * rows + i]! * line.slope;
    }
    const inCap = capNm > 0 ? 1 - passed : 0;
    offset[i] = line.base * (1 - inCap) + (cap.kind === 'held' ? cap.value * inCap : 0);
    if (cap.kind === 'free') values[knots * rows + i] = inCap;
  }
}

/** W·∂ŷ/∂u into `design`, with the row of a prior of the cap level last. */
export function whitenDesign(
  { plain, cap }: Observation,
  whitener: Whitener,
  design: ColumnMatrix,
): void {
  for (let j = 0; j < plain.columns; j++) {
    const to = j * design.rows;
    for (let i = 0; i < plain.rows; i++) design.values[to + i] = plain.values[j * plain.rows + i]!;
    whiten(whitener, design.values, to);
  }
  const prior = cap.kind === 'free' ? cap.prior : null;
  if (prior) design.values[design.values.length - 1] = 1 / prior.sigma;
}

/** W·(y − offset) into `data`, with the row of a prior of the cap level last. */
export function whitenData(
  { plain, offset, cap }: Observation,
  whitener: Whitener,
  y: Float64Array,
  data: Float64Array,
): void {
  for (let i = 0; i < plain.rows; i++) data[i] = y[i]! - offset[i]!;
  whiten(whitener, data);
  const prior = cap.kind === 'free' ? cap.prior : null;
  if (prior) data[data.length - 1] = prior.mean / prior.sigma;
}

/** ŷ of every row at unknowns u. */
export function predictRows(
  { plain, offset }: Observation,
  u: Float64Array,
  out: Float64Array,
): void {
  for (let i = 0; i < plain.rows; i++) {
    let sum = offset[i]!;
    for (let j = 0; j < plain.columns; j++) sum += plain.values[j * plain.rows + i]! * u[j]!;
    out[i] = sum;
  }
}

/**
 * Columns of A to those of A·C in place, with u = C·d the sum of steps d ≥ 0 that makes u monotonic: rising, u_j = d_0 + … +
 * d_j; falling, u_j = d_j + … + d_last. Columns after the knots stay.
 */
export function toSteps({ rows, values }: ColumnMatrix, knots: number, way: Monotonic): void {
  if (way === 'no') return;
  for (let step = 1; step < knots; step++) {
    const from = way === 'rising' ? knots - step : step - 1;
    const to = way === 'rising' ? from - 1 : from + 1;
    for (let i = 0; i < rows; i++)
      values[to * rows + i] = values[to * rows + i]! + values[from * rows + i]!;
  }
}

/** u = C·d into `u`; the same numbers where the profile need not be monotonic. */
export function fromSteps(d: Float64Array, knots: number, way: Monotonic, u: Float64Array): void {
  u.set(d);
  if (way === 'rising') for (let j = 1; j < knots; j++) u[j] = u[j - 1]! + d[j]!;
  if (way === 'falling') for (let j = knots - 2; j >= 0; j--) u[j] = u[j + 1]! + d[j]!;
}
