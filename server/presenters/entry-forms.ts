import { presentEntry } from '@/server/presenters/entry';
import { entryTable } from '@/server/presenters/entry-csv';
import { citationOf } from '@/server/presenters/citation/citation';
import { toBibtex } from '@/server/presenters/citation/to-bibtex';
import { toCslJson } from '@/server/presenters/citation/to-csl-json';
import { toRis } from '@/server/presenters/citation/to-ris';
import { toSentence } from '@/server/presenters/citation/to-sentence';
import type { EntryRow } from '@/server/services/entry-rows';

interface EntryForm {
  /** What `Accept` asks for. */
  media: string;
  /** The end of an address or a file's name. */
  suffix: string;
  type: string;
  isCitation: boolean;
  render: (row: EntryRow, publicUrl: string) => string;
}

/** One entry as a file, beside JSON, the form that comes first. */
export const entryForms: readonly EntryForm[] = [
  {
    media: 'text/csv',
    suffix: 'csv',
    type: 'text/csv; charset=utf-8; header=present',
    isCitation: false,
    render: toCsv,
  },
  {
    media: 'application/x-bibtex',
    suffix: 'bib',
    type: 'application/x-bibtex; charset=utf-8',
    isCitation: true,
    render: (row, publicUrl) => toBibtex(citationOf(row, publicUrl)),
  },
  {
    media: 'application/vnd.citationstyles.csl+json',
    suffix: 'csl.json',
    type: 'application/vnd.citationstyles.csl+json; charset=utf-8',
    isCitation: true,
    render: (row, publicUrl) => toCslJson(citationOf(row, publicUrl)),
  },
  {
    media: 'application/x-research-info-systems',
    suffix: 'ris',
    type: 'application/x-research-info-systems; charset=utf-8',
    isCitation: true,
    render: (row, publicUrl) => toRis(citationOf(row, publicUrl)),
  },
  {
    media: 'text/plain',
    suffix: 'txt',
    type: 'text/plain; charset=utf-8',
    isCitation: true,
    render: (row, publicUrl) => toSentence(citationOf(row, publicUrl)),
  },
];

function toCsv(row: EntryRow): string {
  const shown = presentEntry(row);
  const table = entryTable({ dimension: shown.point.length, parameters: Object.keys(shown.parameters) });
  return table.header + table.record(shown);
}
