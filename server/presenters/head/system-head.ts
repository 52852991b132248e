import { CAUTION } from '@/server/caution';
import { archiveOf } from '@/server/presenters/head/archive-head';
import { LICENCE_ADDRESS, type PageHead } from '@/server/presenters/head/page-head';
import type { ListedSystem } from '@/server/services/list-systems';

const FORMATS = [
  { suffix: 'ndjson', media: 'application/x-ndjson' },
  { suffix: 'csv', media: 'text/csv' },
  { suffix: 'json', media: 'application/json' },
];

/** What the page of a system says of itself: the data set of all its orbits. */
export function systemHead(
  { slug, version, document, entries, accepted_at }: ListedSystem,
  publicUrl: string,
): PageHead {
  const address = `${publicUrl}/systems/${slug}`;
  const orbits = entries === 1 ? '1 periodic orbit' : `${entries} periodic orbits`;
  const description =
    `${document.name}: equations, parameters, sections and ${orbits} in the archive. ` +
    `${document.summary ? `${document.summary} ` : ''}${CAUTION}`;
  const files = FORMATS.map(({ suffix, media }) => ({
    href: `${publicUrl}/api/v1/orbits.${suffix}?system=${slug}`,
    media,
  }));
  return {
    title: `${document.name} · Ritornel`,
    description,
    canonical: address,
    links: [
      { href: `${publicUrl}/api/v1/systems/${slug}`, rel: 'describedby', type: 'application/json' },
      ...files.map(({ href, media }) => ({ href, rel: 'item', type: media })),
      { href: LICENCE_ADDRESS, rel: 'license' },
    ],
    linkedData: {
      '@context': 'https://schema.org',
      '@type': 'Dataset',
      '@id': address,
      url: address,
      name: `Periodic orbits of the system ${document.name}`,
      description,
      version: String(version),
      datePublished: accepted_at.toISOString(),
      license: LICENCE_ADDRESS,
      isAccessibleForFree: true,
      distribution: files.map(({ href, media }) => ({
        '@type': 'DataDownload',
        contentUrl: href,
        encodingFormat: media,
      })),
      includedInDataCatalog: archiveOf(publicUrl),
    },
  };
}
