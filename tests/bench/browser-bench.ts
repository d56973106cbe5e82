/**
 * Times the product's own worker pool in Chromium: a fit of 13 energies × 320 bins and 2,000 resamples, as the desk makes them, on
 * as many workers as the machine has cores.
 *
 *   npm run bench:browser
 */
import { fileURLToPath } from 'node:url';
import { chromium } from '@playwright/test';
import { createServer } from 'vite';
import { CHROMIUM_FLAGS, ensureChromium, findChromium } from '../config/browser.mjs';
import type { TimedRun } from './browser/page';

const RUNS = 15;
const root = fileURLToPath(new URL('../..', import.meta.url));

ensureChromium();
const server = await createServer({
  configFile: false,
  root,
  logLevel: 'error',
  server: { host: '127.0.0.1', port: 0 },
  resolve: { alias: { '@': root.replace(/\/$/, '') } },
});
await server.listen();
const address = server.httpServer!.address();
if (address === null || typeof address === 'string') throw new Error('The server has no port.');
const browser = await chromium.launch({ executablePath: findChromium()!, args: CHROMIUM_FLAGS });
try {
  const page = await browser.newPage();
  await page.goto(`http://127.0.0.1:${address.port}/tests/bench/browser/index.html`);
  await page.waitForFunction(() => 'timedRun' in window, undefined, { timeout: 60_000 });
  const runs: TimedRun[] = [];
  for (let seed = 0; seed < RUNS; seed++) {
    runs.push(
      await page.evaluate(
        (number) =>
          (window as unknown as { timedRun: (seed: number) => Promise<TimedRun> }).timedRun(number),
        seed,
      ),
    );
  }
  const median = (list: number[]): number =>
    list.sort((a, b) => a - b)[Math.floor(list.length / 2)]!;
  const print = (title: string, list: readonly TimedRun[]): void => {
    const first = median(list.map(({ firstMs }) => firstMs));
    const resampled = median(list.map(({ firstMs, resampledMs }) => resampledMs - firstMs));
    const done = median(list.map(({ doneMs }) => doneMs));
    console.log(
      `${title.padEnd(22)}fit and checks ${first.toFixed(0)} ms, 2,000 resamples ${resampled.toFixed(0)} ms more, bands and checks ${(done - first - resampled).toFixed(0)} ms more`,
    );
  };
  console.log(
    `Chromium ${browser.version()}, ${runs[0]!.workers} workers, medians of ${RUNS - 5}.`,
  );
  print('first run of a page', runs.slice(0, 1));
  print('later', runs.slice(5));
} finally {
  await browser.close();
  await server.close();
}
