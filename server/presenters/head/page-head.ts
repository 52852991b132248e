/** A typed link (RFC 8288), as `Link` headers carry it. */
export interface PageLink {
  href: string;
  rel: string;
  type?: string;
}

/** What a page says of itself before any script runs. */
export interface PageHead {
  title: string;
  description: string;
  /** The one address of this page, whatever address it was asked under. */
  canonical: string;
  /** A schema.org description of what the page shows. */
  linkedData: object;
  links: readonly PageLink[];
}

/** The `Link` header of a page or file. */
export const linkHeader = (links: readonly PageLink[]): string =>
  links.map(({ href, rel, type }) => `<${href}>; rel="${rel}"${type ? `; type="${type}"` : ''}`).join(', ');

export const LICENCE_ADDRESS = 'https://creativecommons.org/licenses/by/4.0/';
