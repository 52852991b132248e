import { useCallback } from 'react';
import { View } from 'react-native';
import { failureWords } from '@/features/api/failure-words';
import { entryHref } from '@/features/api/page-addresses';
import { CatalogueStrip } from '@/features/catalogue/catalogue-strip';
import { EmptyResult } from '@/features/catalogue/empty-result';
import { FilterFields } from '@/features/catalogue/filter-fields';
import { NoSuchEntry } from '@/features/notation/no-such-entry';
import { ResultHead } from '@/features/catalogue/result-head';
import { ResultList } from '@/features/catalogue/result-list';
import { SearchField } from '@/features/catalogue/search-field';
import { searchFilter } from '@/features/catalogue/search-filter';
import { defaultSort } from '@/features/catalogue/sort-choices';
import { SystemChips } from '@/features/catalogue/system-chips';
import { usePeriodSlices } from '@/features/catalogue/use-period-slices';
import { useResultCount } from '@/features/catalogue/use-result-count';
import { useResults, type Results } from '@/features/catalogue/use-results';
import { useRowKeys } from '@/features/catalogue/use-row-keys';
import { type SearchLine, useSearchLine } from '@/features/catalogue/use-search-line';
import { systemOf, variablesOf } from '@/features/catalogue/variables-of';
import { DoubleRule, Failure, Heading, Page, space, useLayout, Waiting } from '@/features/ui';

export interface CatalogueScreenProps {
  /** The search line as the address has it. */
  text: string;
  /** An order, or empty for the usual one. */
  sort: string;
  /** Put a search into the address; undefined takes a member out. */
  onSearch: (search: { q?: string | undefined; sort?: string | undefined }) => void;
  onOpen: (href: string) => void;
}

/** The catalogue: search line, filters, results. */
export function CatalogueScreen({ text, sort, onSearch, onOpen }: CatalogueScreenProps) {
  const wide = useLayout() === 'wide';
  const line = useSearchLine(
    text,
    useCallback((q: string) => onSearch({ q: q || undefined }), [onSearch]),
  );
  const filter = searchFilter(line.asked, sort);
  const accession = line.asked.find((term) => term.kind === 'accession')?.value ?? null;
  const results = useResults(filter, accession, line.isReady);
  const order = sort || defaultSort(filter);
  const count = useResultCount(results, order);
  const hrefs = results.items.map((entry) => entryHref(entry.accession, { text, sort }));
  const [selected, clear] = useRowKeys(hrefs, onOpen);
  const onEnter = () => {
    line.commit();
    const typed = line.terms.find((term) => term.kind === 'accession');
    if (typed) onOpen(entryHref(typed.value));
    clear();
  };
  const found = (
    <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
      <SearchField line={line} count={count} onEnter={onEnter} />
      {line.text === '' ? <SystemChips systems={line.systems} onChoose={line.setText} /> : null}
      <View style={{ marginTop: space.one, marginBottom: space.oneHalf }}>
        <DoubleRule />
      </View>
      <Found {...{ line, results, filter, order, text, sort, selected }} onSort={(next) => onSearch({ sort: next })} />
    </View>
  );
  return (
    <Page title="Catalogue" hideHeading>
      {wide ? (
        <View style={{ flexDirection: 'row', gap: 56, alignItems: 'flex-start' }}>
          <FilterColumn line={line} />
          {found}
        </View>
      ) : (
        found
      )}
      <CatalogueStrip line={line} results={results} filter={filter} />
    </Page>
  );
}

/** Under the masthead, beside the results. */
const COLUMN = { position: 'sticky', top: 88, width: 224, flexShrink: 0 } as const;

function FilterColumn({ line }: { line: SearchLine }) {
  return (
    <section style={COLUMN} aria-label="Narrow the search">
      <View style={{ gap: space.oneHalf }}>
        <Heading level={2}>Narrow the search</Heading>
        <Filters line={line} shape="column" />
      </View>
    </section>
  );
}

function Filters({ line, shape }: { line: SearchLine; shape: 'column' | 'row' }) {
  const variables = variablesOf(line.terms, line.systems);
  const periods = usePeriodSlices(line.asked);
  return <FilterFields {...{ shape, variables, periods }} text={line.text} terms={line.terms} onText={line.setText} />;
}

interface FoundProps {
  line: SearchLine;
  results: Results;
  filter: ReturnType<typeof searchFilter>;
  order: string;
  text: string;
  sort: string;
  selected: number | null;
  onSort: (sort: string) => void;
}

function Found({ line, results, filter, order, text, sort, selected, onSort }: FoundProps) {
  const layout = useLayout();
  const accession = line.asked.find((term) => term.kind === 'accession')?.value;
  if (results.error && accession !== undefined && results.isUnknown) {
    return <NoSuchEntry accession={accession} error={results.error} onSearch={() => line.setText('')} />;
  }
  if (results.error) {
    const words = failureWords(results.error, 'The search', 'Your search is kept in the address; nothing was lost.');
    return <Failure {...words} onRetry={results.retry} />;
  }
  if (results.isPending) return <Waiting staves={layout === 'phone' ? 3 : 6} />;
  const system = systemOf(line.asked, line.systems);
  return (
    <View style={{ gap: space.oneHalf }}>
      {layout === 'middle' ? <Filters line={line} shape="row" /> : null}
      {results.items.length === 0 ? (
        <EmptyResult text={line.text} terms={line.asked} filter={filter} onText={line.setText} />
      ) : (
        <>
          <ResultHead
            total={results.total}
            upToSymmetry={results.upToSymmetry}
            filter={filter}
            sort={order}
            onSort={onSort}
            system={system}
          />
          <ResultList
            results={results}
            systems={line.systems}
            system={system}
            search={{ text, sort }}
            selected={selected}
          />
        </>
      )}
    </View>
  );
}
