import { View } from 'react-native';
import { searchHref } from '@/features/api/page-addresses';
import { KnownByReturns } from '@/features/notation/known-by-returns';
import { ParameterList } from '@/features/notation/parameter-list';
import { Heading, space, Text } from '@/features/ui';
import type { KnownByReturns as Table, System } from '@/schemas/generated/contract';

/** Known orbits by number of returns, for every set of parameters that has some. */
export function KnownTables({ system }: { system: System }) {
  const tables = system.knownByReturns.filter(({ rows }) => rows.length > 0);
  const hasAllowed = tables.some(({ rows }) => rows.some(({ allowed }) => allowed !== null));
  return (
    <View style={{ gap: space.one }}>
      <Heading level={2}>Known, by returns</Heading>
      <Text size={14} tone="muted">
        {tables.length === 0
          ? 'No orbit of this system is in the catalogue yet.'
          : hasAllowed
            ? 'Thick: in the catalogue. Thin: what the itineraries allow. Log scale.'
            : 'In the catalogue, on a log scale. How many there are is not known.'}
      </Text>
      {tables.map((table) => (
        <OneTable key={JSON.stringify([table.section, table.parameters])} table={table} system={system} />
      ))}
    </View>
  );
}

function OneTable({ table, system }: { table: Table; system: System }) {
  const own = new Map(system.document.parameters.map(({ name, value }) => [name, String(value)]));
  const other = Object.entries(table.parameters).filter(([name, value]) => own.get(name) !== value);
  const words = other.map(([name, value]) => `${name}=${value}`).join(' ');
  return (
    <View style={{ gap: space.half }}>
      <Text size={14}>
        On{' '}
        <Text mono size={14}>
          {table.section}
        </Text>
        {other.length > 0 ? (
          <>
            , with <ParameterList values={Object.fromEntries(other)} />
          </>
        ) : null}
      </Text>
      <KnownByReturns
        rows={table.rows}
        hrefOf={(returns) =>
          searchHref(
            [system.slug, words, `${returns} ${returns === 1 ? 'return' : 'returns'}`].filter(Boolean).join(' '),
          )
        }
      />
      {table.source ? (
        <Text size={13} tone="muted">
          {table.source}
        </Text>
      ) : null}
    </View>
  );
}
