import { type Browser, type BrowserContext, type Page } from '@playwright/test';

/** One person's browser: an own context, and a record of everything that must not happen. */
export interface PersonBrowser {
  page: Page;
  context: BrowserContext;
  /** Console errors, page errors and requests that would leave the machine. */
  complaints: string[];
}

export async function openBrowser(
  browser: Browser,
  options: Parameters<Browser['newContext']>[0] = {},
): Promise<PersonBrowser> {
  const context = await browser.newContext({ acceptDownloads: true, ...options });
  const complaints: string[] = [];
  await context.route(
    (url) => url.hostname !== '127.0.0.1' && url.protocol.startsWith('http'),
    (route) => {
      complaints.push(`request to ${route.request().url()}`);
      return route.abort();
    },
  );
  const page = await context.newPage();
  page.on('console', (message) => {
    if (message.type() === 'error') complaints.push(`console: ${message.text()}`);
  });
  page.on('pageerror', (error) => complaints.push(`page error: ${error.message}`));
  return { page, context, complaints };
}

export async function signIn(page: Page, email: string, password: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => url.pathname === '/');
}

/** The people of the seeded demo team, whose password is shown openly with them. */
export const DEMO_PASSWORD = 'northbank-demo';
export const DEMO = {
  owner: 'edda.hollister@northbank.example',
  analyst: 'ines.kaltofen@northbank.example',
  reviewer: 'tomas.brandvik@northbank.example',
  modeller: 'priya.ragnarsson@northbank.example',
} as const;
