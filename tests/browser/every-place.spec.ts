import AxeBuilder from '@axe-core/playwright';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { openBrowser, signInAs, visit } from './support/browser';
import { checksDone, placesOf } from './support/places';
import { startProduct, type Product } from './support/product';

/** WCAG 2.2 AA as far as axe-core can see it, in both themes and at three widths. */
const WCAG = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
const LOOKS = [
  { theme: 'light', width: 1440 },
  { theme: 'dark', width: 1024 },
  { theme: 'light', width: 390 },
  { theme: 'dark', width: 390 },
] as const;

describe('every place', () => {
  let product: Product;
  let browser: Browser;

  beforeAll(async () => {
    product = await startProduct({ demo: true });
    browser = await openBrowser();
  });
  afterAll(async () => {
    await browser.close();
    await product.stop();
  });

  test.each(LOOKS)(
    'can be read by everyone: $theme at $width px',
    { timeout: 180_000 },
    async (looks) => {
      const { page, complaints } = await visit(browser, product.address, looks);
      await page.goto('/sign-in');
      await page.getByRole('heading').first().waitFor();
      const faults = await faultsOf(page, 'sign-in');
      await signInAs(page, 'lead');
      await checksDone(page);
      for (const { name, path } of await placesOf(page)) {
        await page.goto(path);
        await page.getByRole('heading', { level: 1 }).waitFor();
        await page.waitForLoadState('networkidle');
        faults.push(...(await faultsOf(page, name)));
        const overflow = await page.evaluate(
          () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
        );
        if (overflow > 0) faults.push(`${name}: the page is ${overflow} px wider than the screen`);
      }
      await page.context().clearCookies();
      await signInAs(page, 'admin');
      await page.goto('/shop/people');
      await page.getByText('operator@fellrowan.example').waitFor();
      faults.push(...(await faultsOf(page, 'people')));
      expect(faults).toEqual([]);
      expect(complaints).toEqual([]);
      await page.context().close();
    },
  );
});

async function faultsOf(
  page: Awaited<ReturnType<typeof visit>>['page'],
  name: string,
): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).withTags(WCAG).analyze();
  return violations.map(
    ({ id, nodes }) =>
      `${name}: ${id} at ${nodes
        .slice(0, 3)
        .map((node) => node.target.join(' '))
        .join(' | ')}`,
  );
}
