import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { reliefCarving } from '../../fixtures/generators/relief-carving';
import type { MachineList } from '../../shared/contracts/index';
import { openBrowser, signInAs, visit } from './support/browser';
import { dropFiles } from './support/drop-files';
import { startProduct, type Product } from './support/product';

const FIXTURES = join(import.meta.dirname, '..', '..', 'fixtures', 'programs');
/** A program that calls T7, which is in the tool list and in no pocket of the North router. */
const HINGE_SIDE = readFileSync(join(FIXTURES, 'hinge-side', 'program.nc'), 'utf8');

describe('the main job', () => {
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

  test(
    'a program is stopped for a tool that is in no pocket, and clear once it is loaded',
    { timeout: 120_000 },
    async () => {
      const programmer = await visit(browser, product.address);
      await signInAs(programmer.page, 'programmer');
      await programmer.page.goto('/programs');
      await chooseMachine(programmer.page, 'North router');
      await dropFiles(programmer.page, [{ name: 'left-side.nc', text: HINGE_SIDE }]);
      const sent = programmer.page.getByRole('list', { name: 'Files sent' }).getByRole('listitem');
      await sent.getByText('stopped', { exact: true }).waitFor();
      await sent.getByRole('link', { name: 'left-side.nc' }).click();

      await programmer.page.getByText('Stopped.', { exact: true }).waitFor();
      const lines = programmer.page.getByRole('region', {
        name: 'Program lines with their findings',
      });
      const finding = lines.locator('nl-finding-card', {
        hasText: 'the loading puts it in no pocket',
      });
      await finding.waitFor();
      expect(await finding.textContent()).toContain('T7 (35 mm hinge boring bit)');
      const line = lines.locator('.line', { hasText: 'T7 M6' });
      expect((await line.locator('.number').textContent())?.trim()).toBe('22');
      expect(await line.locator('.stop').first().textContent()).toContain('T7');
      await line.getByRole('button', { name: 'Words of line 22' }).click();
      await programmer.page.getByText('tool change', { exact: true }).waitFor();
      const report = programmer.page.url();

      const operator = await visit(browser, product.address, { width: 1024 });
      await signInAs(operator.page, 'operator');
      await loadTool(operator.page, { machine: 'North router', tool: 'T7', pocket: 5 });

      // The loading asks for the check again by itself; the report of before says so, the new one is clear.
      await programmer.page.goto(report);
      await programmer.page.getByText('This report is about what stood before.').waitFor();
      await operator.page.goto('/programs');
      await operator.page.getByRole('link', { name: 'left-side.nc' }).first().click();
      await operator.page.getByText('clear', { exact: true }).first().waitFor();

      expect(programmer.complaints).toEqual([]);
      expect(operator.complaints).toEqual([]);
    },
  );

  test(
    'a long program shows how far it is read, and its report opens at the finding',
    { timeout: 120_000 },
    async () => {
      const { page, complaints } = await visit(browser, product.address);
      await signInAs(page, 'programmer');
      await page.goto('/programs');
      await chooseMachine(page, 'North router');
      const text = [...reliefCarving({ lines: 1_000_000, fault: true })].join('\n');
      const seen = watchProgress(page);
      await dropFiles(page, [{ name: 'long-relief.nc', text }]);
      const sent = page.getByRole('list', { name: 'Files sent' }).getByRole('listitem');
      await sent.getByRole('progressbar').waitFor();
      await sent.getByRole('link', { name: 'long-relief.nc' }).waitFor();
      await sent.getByText('stopped', { exact: true }).waitFor();
      expect((await seen).size).toBeGreaterThan(1);
      await sent.getByRole('link', { name: 'long-relief.nc' }).click();
      await page.getByRole('button', { name: 'first', exact: true }).click();
      await page.locator('nl-finding-card').first().waitFor();
      expect(complaints).toEqual([]);
      await page.context().close();
    },
  );
});

/** Collects the line counts that the server's events announce for running checks. */
async function watchProgress(page: Page): Promise<Set<number>> {
  const counts = new Set<number>();
  await page.exposeFunction('noteLines', (count: number) => counts.add(count));
  await page.evaluate(() => {
    const stream = new EventSource('/api/v1/events');
    stream.onmessage = ({ data }) => {
      const { state, linesRead } = JSON.parse(String(data)) as { state: string; linesRead: number };
      if (state === 'running') {
        void (window as unknown as { noteLines(count: number): void }).noteLines(linesRead);
      }
    };
  });
  return counts;
}

async function chooseMachine(page: Page, machine: string): Promise<void> {
  await page.getByRole('combobox', { name: 'Check against' }).click();
  await page.getByRole('option', { name: machine }).click();
}

interface Load {
  readonly machine: string;
  readonly tool: string;
  readonly pocket: number;
}

async function loadTool(page: Page, { machine, tool, pocket }: Load): Promise<void> {
  const { machines } = (await (await page.request.get('/api/v1/machines')).json()) as MachineList;
  await page.goto(`/racks/${machines.find(({ name }) => name === machine)?.id}`);
  await page.getByRole('button', { name: `Load pocket ${pocket}`, exact: true }).click();
  await page
    .getByRole('dialog')
    .getByRole('button', { name: new RegExp(`^${tool} `) })
    .click();
  await page.getByRole('button', { name: /^(Save|Record)/ }).click();
  await page.locator('nl-save-bar').waitFor({ state: 'detached' });
}
