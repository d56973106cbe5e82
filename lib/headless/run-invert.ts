import {
  bootstrapBands,
  carrierProfile,
  defaultDepthGrid,
  fit,
  InversionError,
  prepareFit,
  resample,
  runChecks,
  type FitAnswer,
  type PreparedFit,
} from '@/lib/inversion/index';
import { BadInput } from './bad-input';
import type { InvertOptions } from './options';
import { readInput, type InvertInput } from './read-input';
import { reportOf, type InvertReport } from './report';

export type InvertOutcome =
  { ok: true; report: InvertReport; warnings: readonly string[] } | { ok: false; reason: string };

/** Files in, report out. Throws BadInput; a scan without a usable minimum is an outcome. */
export function runInvert(options: InvertOptions): InvertOutcome {
  const input = readInput(options);
  const prepared = prepare(input);
  const outcome = fit(prepared);
  if (outcome.status === 'no-minimum') return { ok: false, reason: outcome.reason };
  const profile = profileOf(prepared, outcome.answer, options);
  const checks = runChecks(prepared, outcome.answer, profile);
  const report = reportOf(options.profile, outcome.answer, profile, checks);
  return { ok: true, report, warnings: input.warnings };
}

function profileOf(prepared: PreparedFit, answer: FitAnswer, { resamples, seed }: InvertOptions) {
  if (resamples === 0) return carrierProfile(prepared, answer);
  const depthsNm = [...defaultDepthGrid(prepared, answer)];
  const rows = resample(prepared, answer, { seed, first: 0, count: resamples });
  return carrierProfile(prepared, answer, bootstrapBands(prepared, answer, rows, depthsNm), {
    depthsNm,
  });
}

/** What the library refuses is bad input here; where it names an energy, the line of the scan is named too. */
function prepare({ fit: fitInput, scanFileName, rows }: InvertInput): PreparedFit {
  try {
    return prepareFit(fitInput);
  } catch (cause) {
    if (!(cause instanceof InversionError)) throw cause;
    const energyKeV = cause.detail?.['energyKeV'];
    const row = rows.find((one) => one.energyKeV === energyKeV);
    throw new BadInput([`${scanFileName}${row ? `, line ${row.line}` : ''}: ${cause.message}`]);
  }
}
