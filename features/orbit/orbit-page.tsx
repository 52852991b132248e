import { router } from 'expo-router';
import { type ReactNode, useState } from 'react';
import { View } from 'react-native';
import { useOrbitTrace } from '@/features/api/orbits';
import { entryHref } from '@/features/api/page-addresses';
import { StateWord } from '@/features/notation/state-word';
import { ClosureField, Report } from '@/features/orbit/check-report';
import { EntryIncipit } from '@/features/orbit/entry-incipit';
import { HowKnown } from '@/features/orbit/how-known';
import { Nearby } from '@/features/orbit/nearby';
import { OrbitActions } from '@/features/orbit/orbit-actions';
import { OrbitFigures } from '@/features/orbit/orbit-figures';
import { PeriodField, PointField, ReturnTimes, type ReturnTimesProps } from '@/features/orbit/orbit-numbers';
import { Provenance, References } from '@/features/orbit/provenance';
import { SystemLine } from '@/features/orbit/system-line';
import type { Trail } from '@/features/orbit/trail';
import { useNeighbours } from '@/features/orbit/use-neighbours';
import { Withdrawn } from '@/features/orbit/withdrawn';
import { Heading, LinkText, Page, space, Text, useLayout, usePageKeys } from '@/features/ui';
import type { Entry, System } from '@/schemas/generated/contract';

interface OrbitPageProps {
  entry: Entry;
  system: System | undefined;
  trail: Trail | null;
}

/** Everything about one entry. */
export function OrbitPage({ entry, system, trail }: OrbitPageProps) {
  const layout = useLayout();
  const [selected, select] = useState<number | null>(null);
  const trace = useOrbitTrace(entry.accession);
  const neighbours = useNeighbours(entry);
  const previous = trail ? trail.previous : hrefOf(neighbours.below[0]);
  const next = trail ? trail.next : hrefOf(neighbours.above[0]);
  usePageKeys({ k: () => go(previous), j: () => go(next), Escape: () => select(null) });

  const shared = { entry, system, selected, onSelect: select };
  const figures = <OrbitFigures {...shared} trace={trace} />;
  const nearby = <Nearby entry={entry} system={system} neighbours={neighbours} />;
  return (
    <Page
      title={entry.accession}
      large
      state={<StateWord state={entry.status} />}
      subtitle={<SystemLine entry={entry} system={system} />}
      back={backOf(trail, layout === 'phone')}
      aside={<PreviousNext previous={previous} next={next} />}
      {...(layout !== 'phone' && { actions: <OrbitActions entry={entry} /> })}
    >
      <View style={{ gap: space.three }}>
        {entry.withdrawal ? <Withdrawn withdrawal={entry.withdrawal} /> : null}
        <EntryIncipit {...shared} trace={trace.data ?? null} />
        {layout === 'wide' ? (
          <WideBody {...shared} figures={figures} nearby={nearby} />
        ) : (
          <NarrowBody {...shared} figures={figures} nearby={nearby} />
        )}
        <Text size={13} tone="muted">
          {entry.caution}
        </Text>
      </View>
      {layout === 'phone' ? <OrbitActions entry={entry} /> : null}
    </Page>
  );
}

const hrefOf = (entry: Entry | undefined): string | null => (entry ? entryHref(entry.accession) : null);

function go(href: string | null): void {
  if (href !== null) router.push(href);
}

function backOf(trail: Trail | null, isShort: boolean) {
  if (!trail) return { href: '/', label: 'Catalogue' };
  return { href: trail.href, label: isShort || !trail.detail ? trail.label : `${trail.label}: ${trail.detail}` };
}

function PreviousNext({ previous, next }: { previous: string | null; next: string | null }) {
  const phone = useLayout() === 'phone';
  const key = (letter: string) => (phone ? null : <Text mono size={14}>{` ${letter}`}</Text>);
  return (
    <View style={{ flexDirection: 'row', gap: space.two }}>
      {previous ? (
        <LinkText href={previous} size={16} target>
          previous{key('k')}
        </LinkText>
      ) : null}
      {next ? (
        <LinkText href={next} size={16} target>
          next{key('j')}
        </LinkText>
      ) : null}
    </View>
  );
}

interface BodyProps extends ReturnTimesProps {
  system: System | undefined;
  figures: ReactNode;
  nearby: ReactNode;
}

/** Text at the left, figures two abreast at the right. */
function WideBody({ figures, nearby, ...shared }: BodyProps) {
  const { entry, system } = shared;
  return (
    <View style={{ flexDirection: 'row', gap: space.eight, alignItems: 'flex-start' }}>
      <View style={{ width: 544, flexShrink: 1, gap: space.four }}>
        <View style={{ gap: space.half }}>
          <Heading level={2}>Numbers</Heading>
          <PeriodField entry={entry} />
          <PointField entry={entry} system={system} />
          <ReturnTimes {...shared} />
        </View>
        <HowKnown entry={entry} />
        <Report entry={entry} />
        <Provenance entry={entry} />
        <References entry={entry} />
      </View>
      <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0, gap: space.four }}>
        {figures}
        {nearby}
      </View>
    </View>
  );
}

/** One below the other. */
function NarrowBody({ figures, nearby, ...shared }: BodyProps) {
  const { entry, system } = shared;
  return (
    <View style={{ gap: space.four }}>
      <View>
        <PeriodField entry={entry} />
        <PointField entry={entry} system={system} />
        <ClosureField entry={entry} />
      </View>
      <HowKnown entry={entry} />
      <ReturnTimes {...shared} />
      {figures}
      <Report entry={entry} />
      <Provenance entry={entry} />
      <References entry={entry} />
      {nearby}
    </View>
  );
}
