import { expect, test, type Page } from '@playwright/test';

import { DEMO, DEMO_PASSWORD, openBrowser, signIn } from './support/browser';

/** The worker of the built product: progress, a stop that is quick, the same bands for the same seed. */
test('a fit runs in the worker, stops at once and repeats by its seed', async ({ browser }) => {
  test.setTimeout(180_000);
  const { page, complaints } = await openBrowser(browser);
  const workers: string[] = [];
  page.on('worker', (worker) => workers.push(worker.url()));
  await signIn(page, DEMO.analyst, DEMO_PASSWORD);
  await page.goto('/fits/new');
  await page.getByRole('main').getByRole('link', { name: /dark/ }).first().click();
  await page.waitForURL(/\/fits\/new\?.*scan=/);
  await expect(status(page)).toHaveText(/Fitted and resampled/, { timeout: 60_000 });
  expect(workers.length).toBeGreaterThan(0);

  const first = await bandsAsText(page);
  await page.getByRole('button', { name: 'Fit', exact: true }).click();
  await expect(status(page)).toHaveText(/Fitting|Resampling/);
  await expect(status(page)).toHaveText(/Fitted and resampled/, { timeout: 60_000 });
  expect(await bandsAsText(page)).toBe(first);

  await page.getByText('Bands', { exact: true }).first().click();
  await page
    .getByLabel(/resamples/i)
    .first()
    .fill('10000');
  await page.getByRole('button', { name: 'Fit', exact: true }).click();
  await expect(status(page)).toHaveText(/Resampling/);
  await page.getByRole('button', { name: 'Stop' }).click();
  await expect(status(page)).toHaveText(/Stopped/);
  await expect(page.getByRole('button', { name: 'Save fit' })).toBeDisabled();
  expect(complaints).toEqual([]);
});

function status(page: Page) {
  return page.getByRole('region', { name: 'Fit', exact: true }).getByRole('status');
}

/** The data table behind the depth figure: depth, value, bands and flag of every row. */
async function bandsAsText(page: Page): Promise<string> {
  const depth = page.getByRole('figure', { name: /depth/i }).first();
  await depth.getByRole('button', { name: 'table' }).click();
  const text = await depth.getByRole('table').first().innerText();
  await depth.getByRole('button', { name: 'table' }).click();
  expect(text.split('\n').length).toBeGreaterThan(50);
  return text;
}
