import { useMemo } from 'react';
import { View } from 'react-native';
import { failureWords } from '@/features/api/failure-words';
import { isRefusal } from '@/features/api/api-error';
import { searchHref } from '@/features/api/page-addresses';
import { useSystem } from '@/features/api/systems';
import { formatCount } from '@/features/notation/format-count';
import { KnownTables } from '@/features/systems/known-tables';
import { sectionField } from '@/features/plot/section-field';
import { SectionSheetFigure } from '@/features/systems/section-sheet-figure';
import { ShortestOrbit } from '@/features/systems/shortest-orbit';
import { SystemEquations } from '@/features/systems/system-equations';
import { SystemFacts } from '@/features/systems/system-facts';
import { SystemReferences } from '@/features/systems/system-references';
import { SystemSections } from '@/features/systems/system-sections';
import { Button, CopyButton, Empty, Failure, Page, PageSkeleton, space, Strip, Text, useLayout } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

/** The page of one system. */
export function SystemScreen({ slug }: { slug: string }) {
  const system = useSystem(slug);
  const phone = useLayout() === 'phone';
  // On a phone the masthead holds the way back.
  const back = phone ? {} : { back: { href: '/systems', label: 'All systems' } };
  if (system.isPending) return <PageSkeleton title={slug} {...back} />;
  if (isRefusal(system.error, 'not-found')) {
    return (
      <Page title="Nothing here" {...back}>
        <Empty actions={<Button href="/systems">See the systems</Button>}>
          There is no system at the address <Text mono>{slug}</Text>.
        </Empty>
      </Page>
    );
  }
  if (system.isError) {
    return (
      <Page title={slug} {...back}>
        <Failure {...failureWords(system.error, 'The system', 'Nothing was lost.')} onRetry={system.refetch} />
      </Page>
    );
  }
  const { data } = system;
  return (
    <Page
      title={data.name}
      italic
      {...back}
      {...(!phone && {
        actions: (
          <>
            <CopyButton kind="button" text={() => JSON.stringify(data.document, null, 2)} said="Copied, as JSON">
              Copy definition
            </CopyButton>
            <Ways system={data} />
          </>
        ),
      })}
    >
      <SystemBody system={data} />
      {phone ? (
        <Strip name="Actions on the system">
          <Ways system={data} />
        </Strip>
      ) : null}
    </Page>
  );
}

/** To the Bench, and to the orbits of the system. */
function Ways({ system: { slug, entries } }: { system: System }) {
  const phone = useLayout() === 'phone';
  const orbits = entries === 1 ? 'See its orbit' : `See its ${formatCount(entries)} orbits`;
  return (
    <>
      <Button href={`/bench?system=${slug}`} quiet={phone} filled={entries === 0}>
        {phone ? 'Check an orbit' : 'Check an orbit of it'}
      </Button>
      {entries > 0 ? (
        <Button href={searchHref(slug)} filled>
          {orbits}
        </Button>
      ) : null}
    </>
  );
}

function SystemBody({ system }: { system: System }) {
  const layout = useLayout();
  const text = (
    <View style={{ gap: space.three }}>
      {system.summary ? <Text>{system.summary}</Text> : null}
      <SystemEquations system={system} />
      <SystemFacts system={system} />
    </View>
  );
  const known = <KnownTables system={system} />;
  const sections = <SystemSections system={system} />;
  const sheet = <SectionSheets system={system} />;
  const rest = (
    <>
      <ShortestOrbit system={system} />
      <SystemReferences system={system} />
    </>
  );
  if (layout === 'phone') {
    return (
      <View style={{ gap: space.four }}>
        {text}
        {sections}
        {sheet}
        {known}
        {rest}
      </View>
    );
  }
  if (layout === 'middle') {
    return (
      <View style={{ flexDirection: 'row', gap: space.four, alignItems: 'flex-start' }}>
        <View style={{ flexBasis: 0, flexGrow: 1, minWidth: 0, gap: space.four }}>
          {text}
          {rest}
        </View>
        <View style={{ flexBasis: 0, flexGrow: 1, minWidth: 0, gap: space.four }}>
          {sheet}
          {sections}
          {known}
        </View>
      </View>
    );
  }
  return (
    <View style={{ flexDirection: 'row', gap: space.six, alignItems: 'flex-start' }}>
      <View style={{ width: 352, flexShrink: 0, gap: space.four }}>
        {text}
        <ShortestOrbit system={system} />
      </View>
      <View style={{ flexBasis: 0, flexGrow: 1, minWidth: 0, gap: space.four }}>
        {sheet}
        {sections}
        <SystemReferences system={system} />
      </View>
      <View style={{ width: 296, flexShrink: 0 }}>{known}</View>
    </View>
  );
}

/** A sheet for every section that has entries and is a plane of two coordinates. */
function SectionSheets({ system }: { system: System }) {
  const drawn = useMemo(
    () =>
      system.sections.flatMap((section) => {
        const field = section.entries > 0 ? sectionField(system, section) : null;
        return field ? [{ section, field }] : [];
      }),
    [system],
  );
  return drawn.map(({ section, field }) => (
    <SectionSheetFigure key={section.name} system={system} section={section} field={field} />
  ));
}
