/**
 * Runs every check of the project in order and ends with one line, "N passed, N failed".
 * A failing step does not stop the others, except that there are no browser tests without a build.
 */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

import { ensureChromium } from './browser.mjs';

const reports = mkdtempSync(path.join(tmpdir(), 'strandline-reports-'));
const unitReport = path.join(reports, 'unit.json');
const browserReport = path.join(reports, 'browser.json');
const env = {
  ...process.env,
  NEXT_TELEMETRY_DISABLED: '1',
  STRANDLINE_BROWSER_REPORT: browserReport,
};

let passed = 0;
let failed = 0;

function run(title, command, args) {
  console.log(`\n== ${title}`);
  const started = Date.now();
  const { status } = spawnSync(command, args, { stdio: 'inherit', env });
  console.log(
    `== ${title}: ${status === 0 ? 'ok' : 'FAILED'} (${Math.round((Date.now() - started) / 1000)} s)`,
  );
  return status === 0;
}

function count(good, bad) {
  passed += good;
  failed += bad;
}

function check(title, script) {
  const ok = run(title, 'npm', ['run', '--silent', script]);
  count(ok ? 1 : 0, ok ? 0 : 1);
  return ok;
}

/** Adds what a runner's JSON report says; a runner that failed without naming a failed test counts as one failure. */
function countReport(ok, read) {
  let counts;
  try {
    counts = read();
  } catch (cause) {
    console.error('No readable report:', cause);
    counts = { good: 0, bad: 0 };
  }
  count(counts.good, ok ? counts.bad : Math.max(1, counts.bad));
}

const json = (file) => JSON.parse(readFileSync(file, 'utf8'));

check('types', 'typecheck');
check('lint', 'lint');
check('format', 'format:check');
check('who imports whom', 'check:imports');
check('nothing unused', 'check:unused');

const unitOk = run('unit, access and component tests', 'npx', [
  'vitest',
  'run',
  '--reporter=default',
  '--reporter=json',
  `--outputFile.json=${unitReport}`,
]);
countReport(unitOk, () => {
  const report = json(unitReport);
  return { good: report.numPassedTests, bad: report.numFailedTests };
});

if (check('production build', 'build')) {
  ensureChromium();
  const browserOk = run('browser tests', 'npm', ['run', '--silent', 'test:browser']);
  countReport(browserOk, () => {
    const { stats } = json(browserReport);
    return { good: stats.expected, bad: stats.unexpected + stats.flaky };
  });
}

console.log(`\n${passed} passed, ${failed} failed`);
process.exit(failed === 0 && passed > 0 ? 0 : 1);
