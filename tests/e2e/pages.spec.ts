import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';

import { DEMO, DEMO_PASSWORD, openBrowser, signIn } from './support/browser';

/** WCAG 2.0 to 2.2, levels A and AA, as axe-core tags its rules. */
const RULES = ['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa'];

const LISTS = ['/', '/samples', '/stopping', '/fits', '/reviews', '/profiles', '/team', '/help'];
/** One page of each kind, reached by the first link of its list. */
const DETAILS = [
  { list: '/samples', address: /\/samples\/[0-9a-f-]{36}/ },
  { list: '/stopping', address: /\/stopping\/[0-9a-f-]{36}/ },
  { list: '/fits', address: /\/fits\/[0-9a-f-]{36}/ },
  { list: '/reviews', address: /\/reviews\/[0-9a-f-]{36}/ },
  { list: '/profiles', address: /\/profiles\/[0-9a-f-]{36}/ },
];
const LOOKS = [
  { name: 'wide and light', width: 1440, colorScheme: 'light' },
  { name: 'narrow and dark', width: 390, colorScheme: 'dark' },
] as const;

for (const { name, width, colorScheme } of LOOKS) {
  test(`every page is quiet, accessible and fits its window: ${name}`, async ({ browser }) => {
    test.setTimeout(300_000);
    const { page, complaints } = await openBrowser(browser, {
      viewport: { width, height: 900 },
      colorScheme,
    });
    await signIn(page, DEMO.owner, DEMO_PASSWORD);
    for (const address of LISTS) {
      await page.goto(address);
      await expectGoodPage(page, address);
    }
    for (const { list, address } of DETAILS) {
      await page.goto(list);
      const links = page.getByRole('main').locator('a');
      let first: string | undefined;
      // A list may still be on its way when its page is there.
      const find = async (): Promise<string | undefined> => {
        const hrefs = await links.evaluateAll((all) =>
          all.map((a) => a.getAttribute('href') ?? ''),
        );
        return (first = hrefs.find((href) => address.test(href)));
      };
      await expect.poll(find, { message: `a link from ${list}` }).toBeDefined();
      await page.goto(first!);
      await expectGoodPage(page, first!);
    }
    expect(complaints).toEqual([]);
  });
}

async function expectGoodPage(page: Page, address: string): Promise<void> {
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  const { violations } = await new AxeBuilder({ page }).withTags(RULES).analyze();
  const found = violations.map(
    ({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' | ')}`,
  );
  expect(found, address).toEqual([]);
  const overflow = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  );
  expect(overflow, `${address} scrolls sideways`).toBeLessThanOrEqual(0);
}
