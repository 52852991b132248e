import { type Browser, chromium, type Page } from 'playwright-core';

const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Debian's Chromium, or the one that CHROMIUM names. */
export const startBrowser = (): Promise<Browser> =>
  chromium.launch({ executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium', args: FLAGS });

/** A visitor of their own, with a window of the given size. */
export async function visitor(browser: Browser, size = { width: 1440, height: 900 }): Promise<Page> {
  const context = await browser.newContext({ viewport: size, acceptDownloads: true });
  return context.newPage();
}

/** Sign in through the page, and wait until it is done. */
export async function signIn(page: Page, base: string, account: { email: string; password: string }): Promise<void> {
  await page.goto(`${base}/sign-in`);
  await page.getByLabel('E-mail').fill(account.email);
  await page.getByLabel('Password', { exact: true }).fill(account.password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL('**/desk');
}
