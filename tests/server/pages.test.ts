import express from 'express';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import request from 'supertest';
import { crawlerRoutes } from '@/server/routes/crawlers';
import { pageRoutes } from '@/server/routes/pages';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { addLorenzEntries, addSystem } from '../support/catalogue';
import { testApp, type TestApp } from '../support/test-app';

const ADDRESS = 'https://orbits.example';

let t: TestApp;
let folder: string;
let site: express.Express;
beforeAll(async () => {
  t = await testApp({ publicUrl: ADDRESS });
  const systemId = await addSystem(t.dependencies.pool, 'lorenz');
  await addLorenzEntries(t.dependencies.pool, { systemId, orbits: loadLorenzOrbits().slice(0, 3) });
  folder = mkdtempSync(join(tmpdir(), 'ritornel-pages-'));
  writeFileSync(join(folder, 'index.html'), readFileSync(join(__dirname, '..', '..', 'public', 'index.html')));
  site = express().use(crawlerRoutes(t.dependencies), pageRoutes(t.dependencies, folder));
});
afterAll(async () => {
  rmSync(folder, { recursive: true });
  await t.close();
});

const page = (path: string): request.Test => request(site).get(path).set('Accept', 'text/html');

/** The one description in schema.org's words that a page holds. */
function linkedData(html: string): Record<string, unknown> {
  const found = [...html.matchAll(/<script type="application\/ld\+json">(.*?)<\/script>/gs)];
  expect(found).toHaveLength(1);
  return JSON.parse(found[0]![1]!) as Record<string, unknown>;
}

describe('the page of an entry, before any script runs', () => {
  it('says in title, description and address what it is about', async () => {
    const res = await page('/orbits/rtn-0000001x');
    expect([res.status, res.type]).toEqual([200, 'text/html']);
    expect(res.text).toContain('<title>RTN-0000001X · Ritornel</title>');
    expect(res.text).toMatch(/name="description"\s+content="Periodic orbit RTN-0000001X of the system Lorenz/);
    expect(res.text).toContain(`<link rel="canonical" href="${ADDRESS}/orbits/RTN-0000001X" />`);
  });

  it('describes the entry as a data set with its licence, author and files', async () => {
    expect(linkedData((await page('/orbits/RTN-0000001X')).text)).toMatchObject({
      '@context': 'https://schema.org',
      '@type': 'Dataset',
      identifier: 'RTN-0000001X',
      version: '1',
      license: 'https://creativecommons.org/licenses/by/4.0/',
      creator: { '@type': 'Person', name: 'Jana Nováková' },
      distribution: [
        { contentUrl: `${ADDRESS}/api/v1/orbits/RTN-0000001X.json`, encodingFormat: 'application/json' },
        { contentUrl: `${ADDRESS}/api/v1/orbits/RTN-0000001X.csv`, encodingFormat: 'text/csv' },
      ],
    });
  });

  it('signposts what to cite, its forms and its licence', async () => {
    const { link } = (await page('/orbits/RTN-0000001X')).headers;
    expect(link).toContain(`<${ADDRESS}/orbits/RTN-0000001X>; rel="cite-as"`);
    expect(link).toContain(
      `<${ADDRESS}/api/v1/orbits/RTN-0000001X.bib>; rel="describedby"; type="application/x-bibtex"`,
    );
    expect(link).toContain('rel="license"');
  });

  it('leads from its JSON back to the page', async () => {
    const { link } = (await request(t.app).get('/api/v1/orbits/RTN-0000001X')).headers;
    expect(link).toContain(`<${ADDRESS}/orbits/RTN-0000001X>; rel="collection"; type="text/html"`);
  });

  it('lets no text of a contributor end the script or an attribute', async () => {
    const name = `"><script>alert(1)</script>`;
    await t.dependencies.pool.query('update account set name = $1', [name]);
    const { text } = await page('/orbits/RTN-0000001X');
    expect(text).not.toContain('<script>alert');
    expect(linkedData(text)).toMatchObject({ creator: { name } });
  });

  it.each(['/orbits/RTN-00009997', '/orbits/RTN-00000171', '/orbits/nonsense', '/systems/nothing'])(
    'answers 404 with the client at %s',
    async (path) => {
      const res = await page(path);
      expect([res.status, res.headers['x-robots-tag']]).toEqual([404, 'noindex']);
      expect(res.text).toContain('<div id="root">');
    },
  );
});

it('describes a system as the data set of its orbits', async () => {
  const res = await page('/systems/lorenz');
  expect(res.text).toContain('<title>Lorenz · Ritornel</title>');
  expect(linkedData(res.text)).toMatchObject({
    '@type': 'Dataset',
    name: 'Periodic orbits of the system Lorenz',
    distribution: [{ contentUrl: `${ADDRESS}/api/v1/orbits.ndjson?system=lorenz` }, {}, {}],
  });
});

it('describes the archive, and keeps its searches out of indexes', async () => {
  const res = await page('/');
  expect(linkedData(res.text)).toMatchObject({ '@type': 'DataCatalog', name: 'Ritornel' });
  expect(res.headers['x-robots-tag']).toBeUndefined();
  expect((await page('/?system=lorenz')).headers['x-robots-tag']).toBe('noindex, follow');
});

describe('what is for crawlers', () => {
  it('forbids combinations of a search and names the map', async () => {
    const res = await request(site).get('/robots.txt');
    expect(res.text).toContain('Disallow: /*?\n');
    expect(res.text).toContain(`Sitemap: ${ADDRESS}/sitemap.xml`);
  });

  it('maps every system and every accepted entry once', async () => {
    const index = (await request(site).get('/sitemap.xml')).text;
    const files = [...index.matchAll(/<loc>https:\/\/orbits\.example(\/[^<]+)<\/loc>/g)].map(([, path]) => path!);
    expect(files).toEqual(['/sitemap-pages.xml', '/sitemap-entries-1.xml']);
    await t.dependencies.pool.query(
      `update orbit set status = 'withdrawn', withdrawn_at = now(), withdrawal_reason = 'Another' where number = 3`,
    );
    const pages = await Promise.all(files.map(async (file) => (await request(site).get(file)).text));
    const addresses = [...pages.join('').matchAll(/<loc>https:\/\/orbits\.example(\/[^<]*)<\/loc>/g)];
    expect(addresses.map(([, path]) => path)).toEqual([
      ...['/', '/systems', '/releases', '/systems/lorenz'],
      ...['/orbits/RTN-0000001X', '/orbits/RTN-00000028'],
    ]);
    expect(pages[1]).toMatch(/<lastmod>\d{4}-\d\d-\d\d<\/lastmod>/);
  });

  it.each(['/sitemap-entries-0.xml', '/sitemap-entries-2.xml', '/sitemap-entries-x.xml'])(
    'has no file %s',
    async (path) => {
      expect((await request(site).get(path)).status).toBe(404);
    },
  );
});
