import { readFileSync } from 'node:fs';

import { expect, test, type Page } from '@playwright/test';

import { DEMO, DEMO_PASSWORD, openBrowser, signIn } from './support/browser';

const LIMIT_MB = 512;

/** Three people at work at once on the demo team; what the server's process ever held, by its own account. */
test('the server stays under 512 MB with three browsers open', async ({ browser }) => {
  test.setTimeout(240_000);
  const people = await Promise.all(
    [DEMO.analyst, DEMO.reviewer, DEMO.modeller].map(async (email) => {
      const { page } = await openBrowser(browser);
      await signIn(page, email, DEMO_PASSWORD);
      return page;
    }),
  );
  await Promise.all(people.map(visitAll));
  expect(peakMegabytes()).toBeLessThan(LIMIT_MB);
  // A reading that is far too small would mean that another process was looked at.
  expect(peakMegabytes()).toBeGreaterThan(40);
});

async function visitAll(page: Page): Promise<void> {
  for (const list of ['/samples', '/stopping', '/fits', '/reviews', '/profiles']) {
    await page.goto(list);
    const hrefs = await page
      .getByRole('main')
      .locator('a')
      .evaluateAll((links) => links.map((link) => link.getAttribute('href') ?? ''));
    const detail = hrefs.find((href) => /^\/[a-z]+\/[0-9a-f-]{36}$/.test(href));
    if (detail) await page.goto(detail);
  }
}

/** Peak resident set of the server (VmHWM of proc(5)), MB. */
function peakMegabytes(): number {
  const status = readFileSync(`/proc/${process.env.STRANDLINE_TEST_SERVER_PID}/status`, 'utf8');
  const kilobytes = /^VmHWM:\s+(\d+) kB$/m.exec(status)?.[1];
  return Number(kilobytes) / 1024;
}
