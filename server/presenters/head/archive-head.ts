import { CAUTION } from '@/server/caution';
import { LICENCE_ADDRESS, type PageHead } from '@/server/presenters/head/page-head';

const DESCRIPTION =
  'A checked archive of periodic orbits of flows, found via Poincaré sections: every entry was integrated again and ' +
  'closes within a stated tolerance. Search by system, period, point or itinerary; take results away as JSON, NDJSON or CSV.';

/** The archive as schema.org's catalogue of data. */
export const archiveOf = (publicUrl: string): object => ({
  '@type': 'DataCatalog',
  '@id': `${publicUrl}/`,
  name: 'Ritornel',
  url: `${publicUrl}/`,
});

/** What the catalogue's page says of itself. */
export const archiveHead = (publicUrl: string): PageHead => ({
  title: 'Ritornel',
  description: DESCRIPTION,
  canonical: `${publicUrl}/`,
  links: [
    { href: `${publicUrl}/api/v1/openapi.json`, rel: 'service-desc', type: 'application/openapi+json' },
    { href: LICENCE_ADDRESS, rel: 'license' },
  ],
  linkedData: {
    '@context': 'https://schema.org',
    ...archiveOf(publicUrl),
    description: `${DESCRIPTION} ${CAUTION}`,
    license: LICENCE_ADDRESS,
    isAccessibleForFree: true,
  },
});
