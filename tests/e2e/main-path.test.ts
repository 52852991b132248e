import { readFileSync } from 'node:fs';
import type { Browser, Page } from 'playwright-core';
import { validatorOf } from '@/server/schema-registry';
import { signIn, startBrowser, visitor } from '@/tests/support/browser';
import { startWholeServer, type WholeServer } from '@/tests/support/whole-server';
import type { Entry, EntryExport } from '@/schemas/generated/contract';

/** Lorenz, 10, 28, 8/3, orbit AB on z = 27: tests/reference/lorenz-12.ndjson, first line. */
const AB = { x: '-13.763610682134201', y: '-19.578751942451796', z: '27', period: '1.5586522107161747' };

let server: WholeServer;
let browser: Browser;
beforeAll(async () => {
  server = await startWholeServer({ DEMO: 'accounts' });
  browser = await startBrowser();
});
afterAll(async () => {
  await browser.close();
  await server.stop();
});

async function fillBench(page: Page): Promise<void> {
  await page.goto(`${server.url}/bench?system=lorenz`);
  for (const name of ['x', 'y', 'z'] as const) {
    await page.getByRole('textbox', { name, exact: true }).fill(AB[name]);
  }
  await page.getByLabel('Period T').fill(AB.period);
  await page.getByRole('textbox', { name: /^Returns/ }).fill('2');
  await page.getByRole('button', { name: /Check/ }).click();
  await page.getByRole('heading', { name: 'Closes', exact: true }).waitFor();
}

describe('the main path', () => {
  let entry: Entry;

  it('takes an orbit from the Bench to the queue', async () => {
    const contributor = await visitor(browser);
    await signIn(contributor, server.url, server.accounts['contributor']!);
    await fillBench(contributor);
    expect(await contributor.getByText('2; yes').count()).toBe(1);
    await contributor.getByRole('button', { name: 'Send to the curators' }).click();
    await contributor.waitForURL(/\/desk\/[^/]+$/);
    await contributor.getByRole('heading', { name: 'Closes', exact: true }).waitFor();
  });

  it('shows it to a curator, who accepts it by the keyboard alone', async () => {
    const curator = await visitor(browser);
    await signIn(curator, server.url, server.accounts['curator']!);
    await curator.getByRole('link', { name: /^Submission/ }).waitFor();
    await curator.keyboard.press('j');
    await curator.keyboard.press('Enter');
    await curator.getByRole('heading', { name: 'Decision' }).waitFor();
    await curator.keyboard.press('a');
    await curator.keyboard.press('Control+Enter');
    await curator.getByText('In the catalogue as RTN-0000001X.').waitFor();
  });

  it('lets a reader find it by system and period and take it away', async () => {
    const reader = await visitor(browser, { width: 390, height: 844 });
    await reader.goto(`${server.url}/?q=${encodeURIComponent('lorenz 1.5587')}`);
    await reader
      .getByRole('link', { name: /RTN-0000001X/ })
      .first()
      .waitFor();

    const answer = await reader.request.get(`${server.url}/api/v1/orbits.json?system=lorenz&period=1.5587`);
    const exported = (await answer.json()) as EntryExport;
    const isValid = validatorOf('entry-export');
    expect(isValid(exported) ? null : isValid.errors).toBeNull();
    expect(exported.items).toHaveLength(1);
    entry = exported.items[0]!;
    expect(entry).toMatchObject({ accession: 'RTN-0000001X', returns: 2, itinerary: 'AB', stability: 'saddle' });
    expect(entry.period.slice(0, 14)).toBe('1.558652210716');
  });

  it('exports from the page exactly what the search shows', async () => {
    const reader = await visitor(browser);
    await reader.goto(`${server.url}/?q=${encodeURIComponent('lorenz 1.5587')}`);
    const [download] = await Promise.all([
      reader.waitForEvent('download'),
      reader.getByRole('link', { name: 'NDJSON' }).click(),
    ]);
    const lines = readFileSync(await download.path(), 'utf8')
      .trim()
      .split('\n');
    expect(lines).toHaveLength(2);
    expect(JSON.parse(lines[0]!)).toMatchObject({ accession: 'RTN-0000001X' });
    expect(JSON.parse(lines[1]!)).toMatchObject({ end: true, count: 1 });
  });

  it('recognises what was submitted when it comes again', async () => {
    const contributor = await visitor(browser);
    await signIn(contributor, server.url, server.accounts['contributor']!);
    const sent = await contributor.request.post(`${server.url}/api/v1/checks`, {
      data: entry.submitted,
      headers: { Prefer: 'wait=30' },
    });
    expect(await sent.json()).toMatchObject({
      verdict: 'closes',
      matches: [{ accession: 'RTN-0000001X', relation: 'same' }],
      findings: [{ code: 'already-known', severity: 'note' }],
    });
  });
});
