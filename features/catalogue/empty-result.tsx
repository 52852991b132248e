import { useFewOrbits, type OrbitFilter } from '@/features/api/orbits';
import { termInText } from '@/features/catalogue/describe-term';
import { replaceTerm } from '@/features/catalogue/edit-search-line';
import { roundOutwards } from '@/features/catalogue/round-outwards';
import type { SearchTerm } from '@/features/catalogue/search-term';
import { toDouble } from '@/features/notation/to-double';
import { Button, Empty, Text } from '@/features/ui';

interface EmptyResultProps {
  text: string;
  terms: readonly SearchTerm[];
  filter: OrbitFilter;
  onText: (text: string) => void;
}

/** Significant digits of a neighbouring period in the sentence. */
const SAID_DIGITS = 4;

/** Nothing found: what was asked, the nearest periods, and a wider range that would find them. */
export function EmptyResult({ text, terms, filter, onText }: EmptyResultProps) {
  const near = useNearestPeriods(filter);
  const widened = widenedPeriod(near);
  return (
    <Empty
      actions={
        <>
          {widened ? (
            <Button
              onPress={() => onText(replaceTerm(text, terms, { kinds: ['period', 'period-range'], words: widened }))}
            >
              {`Widen to ${widened}`}
            </Button>
          ) : null}
          {terms.length > 1 && !widened ? (
            <Button onPress={() => onText(terms.find(({ kind }) => kind === 'system') ? systemWords(text, terms) : '')}>
              Search with less
            </Button>
          ) : null}
          <Button href="/bench">Check an orbit</Button>
        </>
      }
    >
      <Asked terms={terms} />
      {nearestSentence(near)}
    </Empty>
  );
}

function Asked({ terms }: { terms: readonly SearchTerm[] }) {
  const system = terms.find((term) => term.kind === 'system');
  const rest = terms.filter((term) => term !== system);
  return (
    <>
      No orbit
      {system ? (
        <>
          {' '}
          of the <Text italic>{system.name}</Text> system
        </>
      ) : null}
      {rest.length > 0 ? ` ${askedWords(rest)}` : ' is in the catalogue yet'}.
    </>
  );
}

/** "has a period between 2.0 and 2.1"; with more than one thing asked, "fits 9 returns, period 2.0 to 2.1". */
function askedWords(terms: readonly SearchTerm[]): string {
  const [only] = terms;
  if (terms.length > 1 || only?.kind !== 'period-range' || only.min === null || only.max === null) {
    return `fits ${terms.map(termInText).join(', ')}`;
  }
  return `has a period between ${only.min} and ${only.max}`;
}

const systemWords = (text: string, terms: readonly SearchTerm[]): string => {
  const system = terms.find((term) => term.kind === 'system');
  return system ? text.slice(system.start, system.end) : '';
};

interface Nearest {
  below: string | null;
  above: string | null;
}

/** The periods next to the one asked for, under the other filters. */
function useNearestPeriods(filter: OrbitFilter): Nearest {
  const { period, periodMin, periodMax, sort: _sort, ...others } = filter;
  const from = period ?? periodMin;
  const to = period ?? periodMax;
  const below = useFewOrbits({ ...others, ...(from && { periodMax: from }), sort: '-period' }, 1, from !== undefined);
  const above = useFewOrbits({ ...others, ...(to && { periodMin: to }), sort: 'period' }, 1, to !== undefined);
  return { below: below.data?.items[0]?.period ?? null, above: above.data?.items[0]?.period ?? null };
}

function nearestSentence({ below, above }: Nearest): string {
  const said = [below, above].filter((one) => one !== null).map((one) => toDouble(one).toPrecision(SAID_DIGITS));
  if (said.length === 0) return '';
  return said.length === 1 ? ` The nearest is ${said[0]}.` : ` The nearest are ${said.join(' and ')}.`;
}

function widenedPeriod({ below, above }: Nearest): string | null {
  const from = below === null ? null : roundOutwards(below, 1, 'down');
  const to = above === null ? null : roundOutwards(above, 1, 'up');
  if (from !== null && to !== null) return `${from} to ${to}`;
  if (from !== null) return `period from ${from}`;
  return to === null ? null : `period up to ${to}`;
}
