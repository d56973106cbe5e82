import { BadInput } from './bad-input';
import { HELP } from './help';
import { parseOptions } from './options';
import { tableText } from './print-table';
import { runInvert } from './run-invert';

const FITTED = 0;
const BAD_INPUT = 2;
const NO_MINIMUM = 3;
const MOST_REASONS = 10;

// The exit code is set and not forced, so that a long answer is written out to a pipe in full.
process.exitCode = main(process.argv.slice(2));

function main(args: readonly string[]): number {
  try {
    return invert(args);
  } catch (cause) {
    if (!(cause instanceof BadInput)) throw cause;
    const shown = cause.reasons.slice(0, MOST_REASONS);
    const more = cause.reasons.length - shown.length;
    complain(more > 0 ? [...shown, `… and ${more} more.`] : shown);
    return BAD_INPUT;
  }
}

function invert(args: readonly string[]): number {
  const options = parseOptions(args);
  if (options === 'help') {
    process.stdout.write(HELP);
    return FITTED;
  }
  const outcome = runInvert(options);
  if (!outcome.ok) {
    complain([outcome.reason]);
    return NO_MINIMUM;
  }
  complain(outcome.warnings.map((warning) => `note: ${warning}`));
  const levelUnit = options.observable === 'rate' ? 'µs⁻¹' : '';
  const text = options.json
    ? JSON.stringify(outcome.report) + '\n'
    : tableText(outcome.report, levelUnit);
  process.stdout.write(text);
  return FITTED;
}

function complain(lines: readonly string[]): void {
  for (const line of lines) process.stderr.write(`${line}\n`);
}
