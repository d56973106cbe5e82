import type { Interval, ParameterName } from '../types';
import type { RecoveredParameter, RecoveredScan } from './inject-and-recover';

export interface Measured {
  value: number;
  standardError: number;
}

export interface Coverage {
  /** Share of the scans whose interval holds the truth; an open side holds everything. */
  share: number;
  /** What the interval states. */
  stated: number;
  /** √(c(1 − c)/n) at the stated share c: by how much the share of n scans scatters if the interval is right. */
  standardError: number;
}

export interface ParameterRecovery {
  name: ParameterName;
  /** Mean of value − truth, and spread/√n. */
  bias: Measured;
  /** Standard deviation of value − truth. */
  spread: number;
  /** Mean σ stated, over the scans that state one; null where none does. */
  meanSigma: number | null;
  /** (value − truth)/σ over the scans that state a σ; 0 ± 1 where the linear error bar holds. */
  pulls: { count: number; mean: number; spread: number } | null;
  coverage68: Coverage;
  coverage95: Coverage;
}

export interface RecoveryReport {
  /** Scans simulated, and how many of them had no minimum; those are in no other figure. */
  scans: number;
  withoutMinimum: number;
  parameters: readonly ParameterRecovery[];
}

/** What many simulated and fitted scans say of the fit; of blocks from `injectAndRecover`, joined in any order. */
export function recoveryReport(scans: readonly RecoveredScan[]): RecoveryReport {
  const found = scans.filter((scan) => scan !== null);
  const names = found[0]?.map(({ name }) => name) ?? [];
  return {
    scans: scans.length,
    withoutMinimum: scans.length - found.length,
    parameters: names.map((name, k) =>
      recoveryOf(
        name,
        found.map((scan) => scan[k]!),
      ),
    ),
  };
}

function recoveryOf(name: ParameterName, list: readonly RecoveredParameter[]): ParameterRecovery {
  const deviations = list.map(({ value, truth }) => value - truth);
  const spread = spreadOf(deviations);
  const stated = list.filter(({ sigma }) => sigma !== null && sigma > 0);
  const pulls = stated.map(({ value, truth, sigma }) => (value - truth) / sigma!);
  return {
    name,
    bias: { value: meanOf(deviations), standardError: spread / Math.sqrt(list.length) },
    spread,
    meanSigma: stated.length === 0 ? null : meanOf(stated.map(({ sigma }) => sigma!)),
    pulls:
      pulls.length === 0
        ? null
        : { count: pulls.length, mean: meanOf(pulls), spread: spreadOf(pulls) },
    coverage68: coverageOf(list, ({ interval68 }) => interval68, 0.6827),
    coverage95: coverageOf(list, ({ interval95 }) => interval95, 0.95),
  };
}

function coverageOf(
  list: readonly RecoveredParameter[],
  intervalOf: (parameter: RecoveredParameter) => Interval,
  stated: number,
): Coverage {
  const holding = list.filter((parameter) => {
    const [lower, upper] = intervalOf(parameter);
    const { truth } = parameter;
    return (lower === null || lower <= truth) && (upper === null || truth <= upper);
  });
  return {
    share: holding.length / list.length,
    stated,
    standardError: Math.sqrt((stated * (1 - stated)) / list.length),
  };
}

const meanOf = (list: readonly number[]): number =>
  list.reduce((sum, value) => sum + value, 0) / list.length;

/** Standard deviation with n − 1; NaN for a single number. */
function spreadOf(list: readonly number[]): number {
  const mean = meanOf(list);
  return Math.sqrt(list.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (list.length - 1));
}
