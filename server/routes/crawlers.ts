import { Router } from 'express';
import type { AppDependencies } from '@/server/app-dependencies';
import { escapeHtml } from '@/server/http/escape-html';
import { countSitemapFiles, entriesOfSitemap, systemsOfSitemap } from '@/server/services/sitemap';

/** A map may be an hour old. */
const HOUR = 'public, max-age=3600';
const NAMESPACE = 'http://www.sitemaps.org/schemas/sitemap/0.9';

/**
 * What programs that read the whole site may and may not follow: every entry and system once, none of the endlessly many
 * combinations of a search.
 */
export function crawlerRoutes({ pool, config: { publicUrl } }: AppDependencies): Router {
  const router = Router();

  router.get('/robots.txt', (_req, res) => {
    const closed = ['/*?', '/bench', '/desk', '/administration', '/api/v1/checks', '/api/v1/submissions'];
    res
      .set('Cache-Control', HOUR)
      .type('text/plain')
      .send(
        `User-agent: *\n${closed.map((path) => `Disallow: ${path}\n`).join('')}\nSitemap: ${publicUrl}/sitemap.xml\n`,
      );
  });

  router.get('/sitemap.xml', async (_req, res) => {
    const files = await countSitemapFiles(pool);
    const names = ['pages', ...Array.from({ length: files }, (_, i) => `entries-${i + 1}`)];
    const items = names.map((name) => element('sitemap', { loc: `${publicUrl}/sitemap-${name}.xml` }));
    res.set('Cache-Control', HOUR).type('application/xml').send(mapOf('sitemapindex', items));
  });

  router.get('/sitemap-pages.xml', async (_req, res) => {
    const systems = await systemsOfSitemap(pool);
    const paths = ['/', '/systems', '/releases', ...systems.map((slug) => `/systems/${slug}`)];
    const items = paths.map((path) => element('url', { loc: publicUrl + path }));
    res.set('Cache-Control', HOUR).type('application/xml').send(mapOf('urlset', items));
  });

  router.get('/sitemap-entries-:file.xml', async (req, res, next) => {
    const file = /^[1-9]\d{0,5}$/.test(req.params.file) ? parseInt(req.params.file, 10) : 0;
    const entries = file === 0 ? [] : await entriesOfSitemap(pool, file);
    if (entries.length === 0) {
      next();
      return;
    }
    const items = entries.map(({ accession, day }) =>
      element('url', { loc: `${publicUrl}/orbits/${accession}`, lastmod: day }),
    );
    res.set('Cache-Control', HOUR).type('application/xml').send(mapOf('urlset', items));
  });

  return router;
}

const element = (name: string, members: Record<string, string>): string =>
  `<${name}>${Object.entries(members)
    .map(([key, value]) => `<${key}>${escapeHtml(value)}</${key}>`)
    .join('')}</${name}>`;

const mapOf = (name: string, items: readonly string[]): string =>
  `<?xml version="1.0" encoding="UTF-8"?>\n<${name} xmlns="${NAMESPACE}">\n${items.join('\n')}\n</${name}>\n`;
