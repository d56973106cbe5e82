import { BadInput } from './bad-input';
import { HELP } from './help';
import { parseOptions } from './options';
import { tableText } from './print-table';
import { runInvert } from './run-invert';

export interface CommandResult {
  exitCode: number;
  stdout: string;
  stderr: string;
}

const FITTED = 0;
const BAD_INPUT = 2;
const NO_MINIMUM = 3;
const MOST_REASONS = 10;

/** The whole command but for the process around it: arguments in, exit code and texts out. */
export function runCommand(args: readonly string[]): CommandResult {
  try {
    return invert(args);
  } catch (cause) {
    if (!(cause instanceof BadInput)) throw cause;
    const shown = cause.reasons.slice(0, MOST_REASONS);
    const more = cause.reasons.length - shown.length;
    return result(BAD_INPUT, '', more > 0 ? [...shown, `… and ${more} more.`] : shown);
  }
}

function invert(args: readonly string[]): CommandResult {
  const options = parseOptions(args);
  if (options === 'help') return result(FITTED, HELP);
  const outcome = runInvert(options);
  if (!outcome.ok) return result(NO_MINIMUM, '', [outcome.reason]);
  const notes = outcome.warnings.map((warning) => `note: ${warning}`);
  if (options.json) return result(FITTED, `${JSON.stringify(outcome.report)}\n`, notes);
  return result(
    FITTED,
    tableText(outcome.report, options.observable === 'rate' ? 'µs⁻¹' : ''),
    notes,
  );
}

function result(
  exitCode: number,
  stdout: string,
  complaints: readonly string[] = [],
): CommandResult {
  return { exitCode, stdout, stderr: complaints.map((line) => `${line}\n`).join('') };
}
