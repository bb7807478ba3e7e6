import { chromium, type Browser, type Page } from 'playwright-core';
import { demo } from '../../../fixtures/demo/index';
import type { Role } from '../../../shared/contracts/index';

/** Debian's Chromium with everything off that would reach for a network. */
export function openBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
      '--no-first-run',
    ],
  });
}

export interface Visit {
  readonly page: Page;
  /** What the page complained of: a broken policy, an uncaught error. Must stay empty. */
  readonly complaints: readonly string[];
}

export interface Looks {
  readonly width?: number;
  readonly height?: number;
  readonly theme?: 'light' | 'dark';
}

/** A fresh visitor with no cookies. */
export async function visit(browser: Browser, address: string, looks: Looks = {}): Promise<Visit> {
  const context = await browser.newContext({
    baseURL: address,
    viewport: { width: looks.width ?? 1440, height: looks.height ?? 1000 },
    colorScheme: looks.theme ?? 'light',
    acceptDownloads: true,
  });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('pageerror', (error) => complaints.push(error.message));
  page.on('console', (message) => {
    // A refused request (401 before sign-in, 409 on a clash) is logged by the browser itself.
    if (
      message.type() === 'error' &&
      !/the server responded with a status of 4/.test(message.text())
    ) {
      complaints.push(message.text());
    }
  });
  return { page, complaints };
}

/** Signs in through the page as the demo's person of that role. */
export async function signInAs(page: Page, role: Role): Promise<void> {
  const person = demo(new Date()).people.find(({ roles }) => roles.includes(role));
  if (!person) throw new Error(`The demo has no ${role}.`);
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(person.email);
  await page.getByLabel('Password', { exact: true }).fill(person.password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL('**/bench');
}
