import { View } from 'react-native';
import { exportAddress, type ExportFormat, type OrbitFilter } from '@/features/api/orbits';
import { completenessOf } from '@/features/catalogue/completeness-of';
import { countWords, symmetryWords, wholeNumber } from '@/features/catalogue/count-words';
import { sortChoicesFor, sortLabel } from '@/features/catalogue/sort-choices';
import { Completeness } from '@/features/notation/completeness';
import { CopyButton, Heading, LinkText, Menu, space, Text, useLayout } from '@/features/ui';
import type { OrbitPage, System } from '@/schemas/generated/contract';

export interface ResultHeadProps {
  total: OrbitPage['total'];
  upToSymmetry: OrbitPage['upToSymmetry'];
  filter: OrbitFilter;
  sort: string;
  onSort: (sort: string) => void;
  system: System | undefined;
}

const FORMATS: { format: ExportFormat; label: string }[] = [
  { format: 'json', label: 'JSON' },
  { format: 'ndjson', label: 'NDJSON' },
  { format: 'csv', label: 'CSV' },
];

/** What is exported, in words: "12", "more than 10,000". */
export const exportedWords = ({ value, relation }: OrbitPage['total']): string =>
  `${relation === 'at-least' ? 'more than ' : ''}${wholeNumber(value)}`;

/** Ways to take the whole result away, as items of a menu. */
export const exportItems = (filter: OrbitFilter) =>
  FORMATS.map(({ format, label }) => ({
    key: format,
    label,
    href: exportAddress(filter, format),
    download: `ritornel-orbits.${format}`,
  }));

/** Count, sort, link and export of a result, and how complete the catalogue is. */
export function ResultHead({ total, upToSymmetry, filter, sort, onSort, system }: ResultHeadProps) {
  const wide = useLayout() === 'wide';
  return (
    <View style={{ gap: space.half }}>
      <View style={BETWEEN}>
        <Heading level={2}>
          {countWords(total)}
          {symmetryWords(upToSymmetry)}
        </Heading>
        <View style={INLINE}>
          <Sorting sort={sort} onSort={onSort} hasPoint={filter.near !== undefined} />
          {wide ? (
            <>
              <CopyButton size={14} text={() => window.location.href} said="Link copied">
                Copy link
              </CopyButton>
              {total.value > 0 ? <ExportLinks total={total} filter={filter} /> : null}
            </>
          ) : null}
        </View>
      </View>
      {system ? <HowComplete system={system} filter={filter} /> : null}
    </View>
  );
}

const BETWEEN = {
  flexDirection: 'row',
  flexWrap: 'wrap',
  alignItems: 'baseline',
  justifyContent: 'space-between',
  columnGap: space.two,
} as const;
const INLINE = { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', columnGap: space.three } as const;

function Sorting({ sort, onSort, hasPoint }: { sort: string; onSort: (sort: string) => void; hasPoint: boolean }) {
  const phone = useLayout() === 'phone';
  return (
    <View style={{ flexDirection: 'row', alignItems: 'baseline', gap: space.half, zIndex: 30 }}>
      <Text size={14} tone="muted">
        {phone ? 'by' : 'Sorted by'}
      </Text>
      <Menu
        kind="link"
        align="right"
        title="Sort by"
        label={sortLabel(sort)}
        name={`Sorted by ${sortLabel(sort)}: change`}
        items={sortChoicesFor(hasPoint).map(({ value, label }) => ({
          key: value,
          label,
          ...(value === sort && { detail: 'now' }),
          onSelect: () => onSort(value),
        }))}
      />
    </View>
  );
}

function ExportLinks({ total, filter }: Pick<ResultHeadProps, 'total' | 'filter'>) {
  return (
    <Text size={14} tone="muted">
      Export all {exportedWords(total)} as
      {exportItems(filter).map(({ key, label, href, download }) => (
        <Text key={key}>
          {'  '}
          <LinkText href={href} download={download} name={`Export as ${label}`}>
            {label}
          </LinkText>
        </Text>
      ))}
      {'  ·  '}
      <LinkText href="/releases" name="Releases of the whole catalogue">
        Releases
      </LinkText>
    </Text>
  );
}

function HowComplete({ system, filter }: { system: System; filter: OrbitFilter }) {
  const complete = completenessOf(system, filter.parameters);
  if (!complete) return null;
  return (
    <Completeness
      system={system.name}
      parameters={Object.fromEntries(complete.parameters)}
      known={complete.known}
      {...(complete.kind !== 'unknown' && { allowed: complete.allowed, upTo: complete.upTo })}
    />
  );
}
