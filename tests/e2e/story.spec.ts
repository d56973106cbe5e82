import { readFileSync } from 'node:fs';
import path from 'node:path';

import { expect, test, type Page } from '@playwright/test';
import Papa from 'papaparse';

import { openBrowser, type PersonBrowser } from './support/browser';

/**
 * The whole job by three people in three browsers, from two files of their own to the CSV. The files
 * are fixtures/files/scan.csv and stopping.csv; their truth is in fixtures/README.md: a graded edge at
 * 78.4 nm of width 9.6 nm, fractions 0.742 and 0.318.
 */
const fixture = (name: string) => path.resolve('fixtures', name);
const TRUE_EDGE_NM = 78.4;
const PASSWORD = 'tide-table-1897';

test('an analyst fits, a reviewer accepts, a modeller takes the CSV', async ({ browser }) => {
  test.setTimeout(240_000);
  const owner = await openBrowser(browser);
  const analyst = await openBrowser(browser);
  const reviewer = await openBrowser(browser);
  const modeller = await openBrowser(browser);

  await makeTeam(owner.page);
  await join(owner.page, analyst.page, { name: 'Ada Fenwick', role: 'Analyst' });
  await join(owner.page, reviewer.page, { name: 'Ruben Oss', role: 'Reviewer' });
  await join(owner.page, modeller.page, { name: 'Mina Dahl', role: 'Modeller' });

  await addSample(analyst.page);
  await addStoppingSet(analyst.page);
  await addScan(analyst.page);
  const sharp = await fitAndSave(analyst.page, 'Sharp edge');
  const graded = await fitAndSave(analyst.page, 'Graded edge');
  await submit(analyst.page, sharp);
  await submit(analyst.page, graded);

  await compareAndDecide(reviewer.page, { accept: graded, returned: sharp });
  await expect(analyst.page.goto(graded).then(() => analyst.page.content())).resolves.toMatch(
    /accepted/i,
  );

  await takeCsv(modeller.page);
  for (const person of [owner, analyst, reviewer, modeller]) expectQuiet(person);
});

function expectQuiet({ complaints }: PersonBrowser): void {
  expect(complaints).toEqual([]);
}

async function makeTeam(page: Page): Promise<void> {
  await page.goto('/sign-up');
  await page.getByLabel('Your name').fill('Oda Lindqvist');
  await page.getByLabel('E-mail').fill('oda@harbour.example');
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByLabel('Name of your team').fill('Harbour laboratory');
  await page.getByRole('button', { name: 'Make the team' }).click();
  await expect(page.getByRole('heading', { level: 1 })).toContainText('Harbour laboratory');
}

async function join(
  owner: Page,
  person: Page,
  { name, role }: { name: string; role: string },
): Promise<void> {
  const email = `${name.split(' ')[0]!.toLowerCase()}@harbour.example`;
  await owner.goto('/team');
  const form = owner.getByRole('form', { name: 'Invite a person' });
  await form.getByLabel('E-mail').fill(email);
  await form.getByLabel('Role').selectOption(role.toLowerCase());
  await form.getByRole('button', { name: 'Make a link' }).click();
  const link = await owner.getByLabel('Invitation link').inputValue();
  await person.goto(new URL(link, owner.url()).pathname);
  await person.getByLabel('Your name').fill(name);
  await person.getByLabel('Password').fill(PASSWORD);
  await person.getByRole('button', { name: /^Join/ }).click();
  await expect(person.getByRole('heading', { level: 1 })).toContainText('Harbour laboratory');
}

async function addSample(page: Page): Promise<void> {
  await page.goto('/samples/new');
  await page.getByLabel('Name', { exact: false }).first().fill('HB-7');
  await page.getByLabel('Material', { exact: false }).first().fill('germanium');
  await page.getByLabel('Majority carriers').selectOption('holes');
  await page.getByLabel('Doping').first().fill('6.2e15');
  await page.getByLabel('Its uncertainty').fill('4e14');
  await page.getByRole('button', { name: 'Add the sample' }).click();
  await expect(page.getByRole('heading', { level: 1 })).toContainText('HB-7');
}

async function addStoppingSet(page: Page): Promise<void> {
  await page.goto('/stopping/new');
  await page.locator('input[type=file]').setInputFiles(fixture('files/stopping.csv'));
  await page.getByLabel('Name', { exact: false }).first().fill('Ge, 1 nm bins');
  await page.getByLabel('Layer stack').fill('bare germanium');
  await page.getByRole('button', { name: 'Save stopping set' }).click();
  await expect(page.getByRole('heading', { level: 1 })).toContainText('Ge, 1 nm bins');
}

/** A file with bad rows first: named by line, nothing stored, nothing lost. Then the good one. */
async function addScan(page: Page): Promise<void> {
  await page.goto('/samples');
  await page.getByRole('link', { name: 'HB-7' }).click();
  await page
    .getByRole('link', { name: /add (a|an energy) scan/i })
    .first()
    .click();
  await page.waitForURL(/\/scans\/new/);
  await page.getByLabel('Name', { exact: false }).first().fill('205 K, dark');
  await page.locator('input[type=file]').setInputFiles(fixture('bad/text-in-number.csv'));
  await expect(page.getByText(/line \d+/).first()).toBeVisible();
  await expect(page.getByRole('button', { name: 'Save scan' })).toBeDisabled();

  await page.locator('input[type=file]').setInputFiles(fixture('files/scan.csv'));
  await expect(page.getByRole('button', { name: 'Save scan' })).toBeEnabled();
  await page.getByRole('button', { name: 'Save scan' }).click();
  await expect(page.getByRole('heading', { level: 1 })).toContainText('205 K, dark');

  const download = page.waitForEvent('download');
  await page
    .getByRole('link', { name: /download/i })
    .first()
    .click();
  const stored = readFileSync(await (await download).path());
  expect(stored.equals(readFileSync(fixture('files/scan.csv')))).toBe(true);
}

/** Fits with one trial profile and saves; answers with the address of the saved fit. */
async function fitAndSave(page: Page, profile: 'Sharp edge' | 'Graded edge'): Promise<string> {
  await page.goto('/samples');
  await page.getByRole('link', { name: 'HB-7' }).click();
  await page.getByRole('link', { name: '205 K, dark' }).first().click();
  await page.getByRole('button', { name: 'Fit this scan' }).click();
  await page.waitForURL(/\/fits\/new/);
  await page.getByRole('radio', { name: profile }).check({ force: true });
  await page.getByRole('button', { name: 'Fit', exact: true }).click();
  await expect(page.getByRole('button', { name: 'Save fit' })).toBeEnabled({ timeout: 60_000 });
  await expect(page.getByText(/Fitted and resampled/)).toBeVisible();
  await page.getByRole('button', { name: 'Save fit' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Name').fill(`${profile} at 205 K`);
  await dialog.getByRole('button', { name: 'Save', exact: true }).click();
  await page.waitForURL(/\/fits\/[0-9a-f-]{36}/, { timeout: 60_000 });
  await expect(page.getByRole('heading', { level: 1 })).toContainText(`${profile} at 205 K`);
  return new URL(page.url()).pathname;
}

async function submit(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await page.getByRole('button', { name: 'Submit to review' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Submit', exact: true }).click();
  await expect(page.getByText('in review').first()).toBeVisible();
}

async function compareAndDecide(
  page: Page,
  fits: { accept: string; returned: string },
): Promise<void> {
  const ids = [fits.accept, fits.returned].map((address) => address.split('/').at(-1)!);
  await page.goto(`/compare?fits=${ids.join(',')}`);
  await expect(page.getByText('AICc').first()).toBeVisible();
  await expect(page.getByText('Sharp edge at 205 K').first()).toBeVisible();

  await page.goto('/reviews');
  await page.getByRole('link', { name: 'Sharp edge at 205 K' }).click();
  await page.getByRole('button', { name: 'Return…' }).click();
  const asking = page.getByRole('alertdialog');
  await asking.getByRole('button', { name: 'Return the fit' }).click();
  await expect(asking).toContainText(/write something here/i);
  await asking.getByLabel('Reason').fill('The graded edge describes the points better.');
  await asking.getByRole('button', { name: 'Return the fit' }).click();
  await expect(page.getByText('returned').first()).toBeVisible();

  await page.goto('/reviews');
  await page.getByRole('link', { name: 'Graded edge at 205 K' }).click();
  await page.getByRole('button', { name: 'Accept…' }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'Accept and issue' }).click();
  await page.waitForURL(/\/profiles\/[0-9a-f-]{36}/);
  await expect(page.getByText(/SL-\d{4}-001/).first()).toBeVisible();
}

async function takeCsv(page: Page): Promise<void> {
  await page.goto('/profiles');
  await page.getByRole('link', { name: /SL-\d{4}-001/ }).click();
  await page.getByLabel('Grid').selectOption('uniform');
  await page.getByLabel('Step').fill('2');
  await page.getByLabel('Depth in').selectOption('um');
  await page.getByLabel('Concentration in').selectOption('m-3');
  const download = page.waitForEvent('download');
  await page.getByText('Download the CSV').click();
  const text = readFileSync(await (await download).path(), 'utf8');
  const head = text
    .split('\r\n')
    .filter((line) => line.startsWith('#'))
    .join('\n');
  expect(head).toMatch(/SL-\d{4}-001/);
  expect(head).toMatch(/carriers/);
  const { data, errors } = Papa.parse<Record<string, string>>(text, {
    header: true,
    comments: '#',
    skipEmptyLines: true,
  });
  expect(errors).toEqual([]);
  const half = data.find((row) => Number(row['concentration_m-3']) >= 6.2e21 / 2)!;
  // The concentration passes half its bulk value at the edge, within a 2 nm step and the scatter of the scan.
  expect(Math.abs(Number(half.depth_um) * 1000 - TRUE_EDGE_NM)).toBeLessThan(8);
  const step = Number(data[1]!.depth_um) - Number(data[0]!.depth_um);
  expect(step).toBeCloseTo(0.002, 9);
}
