import { expect, test } from '@playwright/test';

import { DEMO, DEMO_PASSWORD, openBrowser, signIn } from './support/browser';

/** The buttons of a wrong role are absent; the server refuses just the same when asked directly. */
test('a modeller may neither add data nor decide, in the page or past it', async ({ browser }) => {
  const { page, context } = await openBrowser(browser);
  await signIn(page, DEMO.modeller, DEMO_PASSWORD);
  await page.goto('/reviews');
  await page.getByRole('table').getByRole('link').first().click();
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  await expect(page.getByRole('button', { name: 'Accept…' })).toHaveCount(0);

  const origin = { 'sec-fetch-site': 'same-origin' };
  const scan = await context.request.post('/api/scans', {
    headers: origin,
    data: {
      sampleId: '3f8e2b52-6f0f-4a53-9d41-0d2f0e3c8a11',
      meta: {
        name: 'x',
        observable: 'fraction',
        temperatureK: null,
        fieldMT: null,
        illumination: 'dark',
      },
      source: {
        kind: 'typed',
        points: [{ energyKeV: 2, value: 0.5, sigma: 0.1, enabled: true, note: '' }],
      },
    },
  });
  expect(scan.status()).toBe(403);
  const fit = await context.request.post('/api/fits', { headers: origin, data: {} });
  expect(fit.status()).toBe(403);
});

test('a request from another site is not carried out', async ({ browser }) => {
  const { page, context } = await openBrowser(browser);
  await signIn(page, DEMO.analyst, DEMO_PASSWORD);
  const answer = await context.request.post('/api/fits', {
    headers: { 'sec-fetch-site': 'cross-site', origin: 'https://elsewhere.example' },
    data: {},
  });
  expect(answer.status()).toBe(403);
});

test('someone from another team finds nothing', async ({ browser }) => {
  const insider = await openBrowser(browser);
  await signIn(insider.page, DEMO.reviewer, DEMO_PASSWORD);
  await insider.page.goto('/profiles');
  await insider.page.getByRole('table').getByRole('link').first().click();
  await insider.page.waitForURL(/\/profiles\/[0-9a-f-]{36}/);
  const address = new URL(insider.page.url()).pathname;

  const outsider = await openBrowser(browser);
  await outsider.page.goto('/sign-up');
  await outsider.page.getByLabel('Your name').fill('Otto Fremd');
  await outsider.page.getByLabel('E-mail').fill('otto@elsewhere.example');
  await outsider.page.getByLabel('Password').fill('another-team-2');
  await outsider.page.getByLabel('Name of your team').fill('Elsewhere');
  await outsider.page.getByRole('button', { name: 'Make the team' }).click();
  await expect(outsider.page.getByRole('heading', { level: 1 })).toContainText('Elsewhere');
  await outsider.page.goto(address);
  await expect(outsider.page.getByRole('heading', { level: 1 })).toContainText(
    'Nothing at this address',
  );
  await expect(outsider.page.getByText(/SL-\d{4}-\d{3}/)).toHaveCount(0);
  const id = address.split('/').at(-1);
  const csv = await outsider.context.request.get(`/api/profiles/${id}/export`);
  expect(csv.status()).toBe(404);
});
