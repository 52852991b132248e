import { useEffect, useRef } from 'react';
import { View } from 'react-native';
import { entryHref } from '@/features/api/page-addresses';
import type { Results } from '@/features/catalogue/use-results';
import { entryMusic, sectionStaff } from '@/features/notation/entry-music';
import { formatSize } from '@/features/notation/format-size';
import { OrbitCard } from '@/features/notation/orbit-card';
import { OrbitRow, OrbitRowHead } from '@/features/notation/orbit-row';
import { Button, colour, space, useLayout } from '@/features/ui';
import type { Entry, System } from '@/schemas/generated/contract';

/** The next page is asked for when so much is left to scroll: four rows. */
const AHEAD_PX = 224;
/** Height of the masthead, under which the column heads stick. */
const MASTHEAD_PX = 71;

interface ResultListProps {
  results: Results;
  systems: readonly System[];
  /** The one system of the search. */
  system: System | undefined;
  search: { text: string; sort: string };
  selected: number | null;
}

/** Results as rows of a thematic catalogue, or as cards. */
export function ResultList({ results, systems, system, search, selected }: ResultListProps) {
  const layout = useLayout();
  const slots = results.items.map((entry, index) => ({
    entry,
    props: {
      orbit: entry,
      music: entryMusic(
        entry,
        systems.find(({ slug }) => slug === entry.system.slug),
        results.incipits[entry.accession] ?? null,
      ),
      href: entryHref(entry.accession, search),
      selected: index === selected,
      ...distanceNote(results.distances, entry),
    },
  }));
  const sections = new Set(results.items.map((entry) => entry.section.name));
  const coordinate = system && sections.size === 1 ? sectionStaff(system, [...sections][0] ?? null).coordinate : null;
  return (
    <View style={{ gap: space.oneHalf, opacity: results.isOld ? 0.55 : 1 }} aria-busy={results.isOld}>
      {layout === 'wide' ? (
        <div>
          <div style={{ position: 'sticky', top: MASTHEAD_PX, zIndex: 5, background: colour.page, paddingTop: 8 }}>
            <OrbitRowHead coordinate={coordinate} />
          </div>
          <div role="list" aria-label="Orbits">
            {slots.map(({ entry, props }) => (
              <div role="listitem" key={entry.accession} data-result>
                <OrbitRow {...props} showSystem={!system} />
              </div>
            ))}
          </div>
        </div>
      ) : (
        <div role="list" aria-label="Orbits" style={layout === 'middle' ? TWO_COLUMNS : ONE_COLUMN}>
          {slots.map(({ entry, props }) => (
            <div role="listitem" key={entry.accession} data-result style={{ minWidth: 0 }}>
              <OrbitCard {...props} />
            </div>
          ))}
        </div>
      )}
      {results.hasMore ? <More results={results} /> : null}
    </View>
  );
}

const ONE_COLUMN = { display: 'grid', gridTemplateColumns: 'minmax(0, 1fr)', gap: space.oneHalf } as const;
const TWO_COLUMNS = { ...ONE_COLUMN, gridTemplateColumns: 'repeat(2, minmax(0, 1fr))' } as const;

/** With a point, a result shows how far its nearest crossing lies. */
function distanceNote(distances: Record<string, number>, { accession }: Entry): { note?: string } {
  const distance = distances[accession];
  return distance === undefined ? {} : { note: `${formatSize(distance)} away` };
}

/** The next page: by itself shortly before the end, or by its button. */
function More({ results }: { results: Results }) {
  const end = useRef<HTMLDivElement>(null);
  const latest = useRef(results);
  useEffect(() => {
    latest.current = results;
  });
  useEffect(() => {
    if (!end.current || typeof IntersectionObserver === 'undefined') return undefined;
    const observer = new IntersectionObserver(
      ([entry]) => {
        if (entry?.isIntersecting && !latest.current.isLoadingMore) latest.current.more();
      },
      { rootMargin: `0px 0px ${AHEAD_PX}px 0px` },
    );
    observer.observe(end.current);
    return () => observer.disconnect();
  }, [results.items.length]);
  return (
    <div ref={end} style={{ display: 'flex', justifyContent: 'center', padding: '16px 0' }}>
      <Button onPress={results.more} disabledBecause={results.isLoadingMore ? 'The next ones are on their way.' : null}>
        {results.isLoadingMore ? 'Loading…' : 'Show more'}
      </Button>
    </div>
  );
}
