import { CAUTION } from '@/server/caution';
import { citationOf } from '@/server/presenters/citation/citation';
import { entryForms } from '@/server/presenters/entry-forms';
import { LICENCE_ADDRESS, type PageHead, type PageLink } from '@/server/presenters/head/page-head';
import { archiveOf } from '@/server/presenters/head/archive-head';
import type { EntryRow } from '@/server/services/entry-rows';

/** What the page of an entry says of itself. */
export function entryHead(row: EntryRow, publicUrl: string): PageHead {
  const { title, address } = citationOf(row, publicUrl);
  const withdrawn = row.withdrawal_reason === null ? '' : `Withdrawn: ${row.withdrawal_reason} `;
  const description =
    `${withdrawn}${title}, on the section ${row.section_formula} = 0. Point, period, return times, crossings and ` +
    `multipliers, integrated again by the archive. ${CAUTION}`;
  return {
    title: `${row.accession} · Ritornel`,
    description,
    canonical: address,
    links: entryLinks(row, publicUrl),
    linkedData: {
      '@context': 'https://schema.org',
      '@type': 'Dataset',
      '@id': address,
      url: address,
      identifier: row.accession,
      name: title,
      description,
      version: String(row.revision),
      license: LICENCE_ADDRESS,
      isAccessibleForFree: true,
      creator: creatorOf(row),
      datePublished: row.accepted_at.toISOString(),
      dateModified: row.revised_at.toISOString(),
      citation: row.references.map(({ citation }) => citation),
      variableMeasured: [
        { '@type': 'PropertyValue', name: 'period', value: row.content.period },
        { '@type': 'PropertyValue', name: 'returns to the section', value: row.returns },
        { '@type': 'PropertyValue', name: 'stability', value: row.stability },
      ],
      distribution: [
        download(`${publicUrl}/api/v1/orbits/${row.accession}.json`, 'application/json'),
        download(`${publicUrl}/api/v1/orbits/${row.accession}.csv`, 'text/csv'),
      ],
      includedInDataCatalog: archiveOf(publicUrl),
    },
  };
}

/** Signposts of an entry: what to cite, where its forms are, whose it is and under which licence. */
function entryLinks({ accession, contributor_orcid }: EntryRow, publicUrl: string): PageLink[] {
  const file = `${publicUrl}/api/v1/orbits/${accession}`;
  const citations = entryForms.filter(({ isCitation }) => isCitation);
  return [
    { href: `${publicUrl}/orbits/${accession}`, rel: 'cite-as' },
    ...citations.map(({ suffix, media }) => ({ href: `${file}.${suffix}`, rel: 'describedby', type: media })),
    { href: `${file}.json`, rel: 'item', type: 'application/json' },
    { href: `${file}.csv`, rel: 'item', type: 'text/csv' },
    { href: 'https://schema.org/Dataset', rel: 'type' },
    { href: 'https://schema.org/AboutPage', rel: 'type' },
    { href: LICENCE_ADDRESS, rel: 'license' },
    ...(contributor_orcid === null ? [] : [{ href: orcidAddress(contributor_orcid), rel: 'author' }]),
  ];
}

/** Signposts of an entry's JSON: the page that it belongs to, and what to cite. */
export const entryFileLinks = ({ accession }: Pick<EntryRow, 'accession'>, publicUrl: string): PageLink[] => [
  { href: `${publicUrl}/orbits/${accession}`, rel: 'cite-as' },
  { href: `${publicUrl}/orbits/${accession}`, rel: 'collection', type: 'text/html' },
  { href: LICENCE_ADDRESS, rel: 'license' },
];

const creatorOf = ({ contributor_name: name, contributor_orcid: orcid }: EntryRow): object => ({
  '@type': 'Person',
  name,
  ...(orcid !== null && { '@id': orcidAddress(orcid) }),
});

const orcidAddress = (orcid: string): string => `https://orcid.org/${orcid}`;

const download = (contentUrl: string, encodingFormat: string): object => ({
  '@type': 'DataDownload',
  contentUrl,
  encodingFormat,
});
