import { runCommand } from './run-command';

const { exitCode, stdout, stderr } = runCommand(process.argv.slice(2));
process.stderr.write(stderr);
process.stdout.write(stdout);
// Set and not forced, so that a long answer is written out to a pipe in full.
process.exitCode = exitCode;
