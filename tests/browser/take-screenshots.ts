/**
 * Pictures of every place in both themes at three widths, in dist/screenshots, to be looked at:
 * `npm run screenshots` (build first). Names given as arguments take only those places.
 */
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { openBrowser, signInAs, visit } from './support/browser';
import { checksDone, placesOf } from './support/places';
import { startProduct } from './support/product';

const WIDTHS = [1440, 1024, 390];
const FOLDER = join(import.meta.dirname, '..', '..', 'dist', 'screenshots');

mkdirSync(FOLDER, { recursive: true });
const wanted = process.argv.slice(2);
const product = await startProduct({ demo: true });
const browser = await openBrowser();
try {
  for (const theme of ['light', 'dark'] as const) {
    for (const width of WIDTHS) {
      const { page, complaints } = await visit(browser, product.address, { theme, width });
      await page.goto('/sign-in');
      await page.screenshot({
        path: join(FOLDER, `sign-in-${theme}-${width}.png`),
        fullPage: true,
      });
      await signInAs(page, 'lead');
      await checksDone(page);
      for (const { name, path } of await placesOf(page)) {
        if (wanted.length > 0 && !wanted.includes(name)) continue;
        await page.goto(path);
        await page.waitForLoadState('networkidle').catch(() => undefined);
        await page.waitForTimeout(400);
        await page.screenshot({ path: join(FOLDER, `${name}-${theme}-${width}.png`) });
      }
      for (const complaint of complaints) console.error(`${theme} ${width}: ${complaint}`);
      await page.context().close();
    }
  }
} finally {
  await browser.close();
  await product.stop();
}
