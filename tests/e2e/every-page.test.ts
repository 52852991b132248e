import { AxeBuilder } from '@axe-core/playwright';
import type { Browser, Page, Request } from 'playwright-core';
import { signIn, startBrowser, visitor } from '@/tests/support/browser';
import { startWholeServer, type WholeServer } from '@/tests/support/whole-server';

/** Most JavaScript that the first page may fetch, bytes as they come over the network. */
const FIRST_PAGE_BYTES = 380_000;
/** Smaller files gain nothing from compression. */
const WORTH_COMPRESSING = 2000;

/** The two ends: a phone by day, a wide screen by night. */
const settings = [
  { size: { width: 390, height: 844 }, colorScheme: 'light' },
  { size: { width: 1440, height: 900 }, colorScheme: 'dark' },
] as const;

let server: WholeServer;
let browser: Browser;
beforeAll(async () => {
  server = await startWholeServer();
  browser = await startBrowser();
});
afterAll(async () => {
  await browser.close();
  await server.stop();
});

/** Serious and critical findings of axe on the page as it stands. */
async function seriousFindings(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, nodes }) => nodes.map(({ html }) => `${id}: ${html.slice(0, 160)}`));
}

async function open(page: Page, path: string): Promise<void> {
  await page.goto(server.url + path);
  await page.getByRole('heading', { level: 1 }).first().waitFor({ state: 'attached' });
  await page.waitForLoadState('networkidle');
}

describe('every page', () => {
  it.each([
    '/',
    '/?q=lorenz%203%20returns',
    '/orbits/RTN-0000001X',
    '/orbits/RTN-00000019',
    '/systems',
    '/systems/lorenz',
    '/bench?system=lorenz',
    '/releases',
    '/desk',
    '/sign-in',
    '/register',
    '/forgot',
    '/no-such-page',
  ])('gives axe nothing serious: %s', async (path) => {
    for (const { size, colorScheme } of settings) {
      const page = await visitor(browser, size);
      await page.emulateMedia({ colorScheme });
      await open(page, path);
      expect(await seriousFindings(page)).toEqual([]);
      expect(await page.evaluate(() => document.documentElement.scrollWidth <= window.innerWidth)).toBe(true);
      await page.context().close();
    }
  });

  it('gives axe nothing serious on the Desk of a curator and on a submission', async () => {
    const page = await visitor(browser);
    await signIn(page, server.url, server.accounts['curator']!);
    await open(page, '/desk');
    expect(await seriousFindings(page)).toEqual([]);
    await page
      .getByRole('link', { name: /^Submission/ })
      .first()
      .click();
    await page.getByRole('heading', { name: 'Decision' }).waitFor();
    await page.waitForLoadState('networkidle');
    expect(await seriousFindings(page)).toEqual([]);
  });

  it('lets the administrator alone see the accounts', async () => {
    const curator = await visitor(browser);
    await signIn(curator, server.url, server.accounts['curator']!);
    await open(curator, '/administration/users');
    await curator.getByText(/This page is for administrators/).waitFor();
    const administrator = await visitor(browser);
    await signIn(administrator, server.url, server.accounts['administrator']!);
    await open(administrator, '/administration/users');
    expect(await administrator.getByRole('combobox', { name: /^Role of/ }).count()).toBe(3);
    expect(await seriousFindings(administrator)).toEqual([]);
  });

  it('fetches little JavaScript for the first page, compressed and kept', async () => {
    const page = await visitor(browser);
    const requests: Request[] = [];
    page.on('requestfinished', (request) => {
      if (request.resourceType() === 'script') requests.push(request);
    });
    await open(page, '/');
    const scripts = await Promise.all(
      requests.map(async (request) => ({
        bytes: (await request.sizes()).responseBodySize,
        headers: (await request.response())?.headers() ?? {},
      })),
    );
    const bundles = scripts.filter(({ headers }) => headers['cache-control']?.includes('immutable'));
    expect(bundles.length).toBeGreaterThan(1);
    const large = bundles.filter(({ bytes }) => bytes > WORTH_COMPRESSING);
    expect(large.map(({ headers }) => headers['content-encoding'] ?? 'none')).not.toContain('none');
    expect(scripts.reduce((sum, { bytes }) => sum + bytes, 0)).toBeLessThan(FIRST_PAGE_BYTES);
  });
});
