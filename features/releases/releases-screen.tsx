import { View } from 'react-native';
import { failureWords } from '@/features/api/failure-words';
import { useReleases } from '@/features/api/releases';
import { hasRole, useSession } from '@/features/api/session';
import { CutRelease } from '@/features/releases/cut-release';
import { ReleaseItem } from '@/features/releases/release-item';
import { Empty, Failure, Hairline, Page, space, Text, Waiting } from '@/features/ui';
import type { Release } from '@/schemas/generated/contract';

interface ReleasesScreenProps {
  /** Number of the one release that the page is about; all where it is left out. */
  only?: string;
}

/** Dated copies of the whole catalogue, to take away and to cite. */
export function ReleasesScreen({ only }: ReleasesScreenProps) {
  const releases = useReleases();
  const session = useSession();
  const mayCut = only === undefined && hasRole(session.data?.user ?? null, 'curator');
  return (
    <Page
      title={only === undefined ? 'Releases' : `Release ${only}`}
      {...(only !== undefined && { back: { href: '/releases', label: 'Releases' } })}
    >
      <View style={{ gap: space.three }}>
        {only === undefined ? <Lead /> : null}
        {mayCut && releases.data ? <CutRelease releases={releases.data} /> : null}
        {releases.isPending ? <Waiting staves={2} /> : null}
        {releases.isError ? (
          <Failure
            {...failureWords(releases.error, 'The list of releases', 'Nothing was lost.')}
            onRetry={releases.refetch}
          />
        ) : null}
        {releases.data ? <Found releases={releases.data} only={only} /> : null}
      </View>
    </Page>
  );
}

const Lead = () => (
  <Text style={{ maxWidth: 544 }}>
    A release is the whole catalogue as it was on one day. It never changes: whoever cites it and whoever reads the
    citation years later have the same bytes, and the SHA-256 says so.
  </Text>
);

function Found({ releases, only }: { releases: Release[]; only: string | undefined }) {
  const shown = only === undefined ? releases : releases.filter(({ id }) => String(id) === only);
  if (shown.length === 0) {
    return <Empty>{only === undefined ? 'No release has been cut yet.' : `There is no release ${only}.`}</Empty>;
  }
  return (
    <View role="list" style={{ gap: space.three }}>
      {shown.map((release, index) => (
        <View role="listitem" key={release.id} style={{ gap: space.three }}>
          {index > 0 ? <Hairline /> : null}
          <ReleaseItem release={release} isAlone={only !== undefined} />
        </View>
      ))}
    </View>
  );
}
