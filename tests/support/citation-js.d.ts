/** The part of the citation reader that tests use; the package brings no types. */
declare module '@citation-js/core' {
  export class Cite {
    constructor(text: string);
    data: Record<string, unknown>[];
  }
}
declare module '@citation-js/plugin-bibtex';
declare module '@citation-js/plugin-csl';
declare module '@citation-js/plugin-ris';
