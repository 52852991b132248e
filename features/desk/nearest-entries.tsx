import { View } from 'react-native';
import { useFewOrbits } from '@/features/api/orbits';
import { entryHref } from '@/features/api/page-addresses';
import { reportMusic } from '@/features/checking/report-music';
import { orbitState } from '@/features/notation/orbit-state';
import { type Beside, besideEntry } from '@/features/desk/letters-beside';
import { CrossingDistance } from '@/features/notation/crossing-distance';
import { toDouble } from '@/features/notation/to-double';
import { entryMusic } from '@/features/notation/entry-music';
import { formatDifference } from '@/features/notation/format-difference';
import { formatSize } from '@/features/notation/format-size';
import { Score, type ScoreStaff } from '@/features/notation/score';
import { Heading, LinkText, space, Text } from '@/features/ui';
import type { CheckedOrbit, Entry, Submission, System } from '@/schemas/generated/contract';

interface Props {
  submission: Submission;
  orbit: CheckedOrbit;
  system: System | undefined;
  section: string;
}

/** Orbits whose crossings all lie within this many tolerances are the same. */
const SAME_TOLERANCES = 10;
/** Entries shown beside the submission. */
const SHOWN = 3;

/** A submission as the first staff of a score, its nearest entries below it. */
export function NearestEntries({ submission, orbit, system, section }: Props) {
  const slug = system?.slug;
  const filter = { ...(slug && { system: slug }), near: orbit.point.join(','), sort: 'distance' };
  const near = useFewOrbits(filter, SHOWN, slug !== undefined);
  const { report } = submission;
  const own = report
    ? reportMusic({
        report,
        system,
        section,
        state: orbitState(submission.reviewState, submission.checkState, submission.verdict),
      })
    : null;
  if (!own || !near.data) return null;
  const { distances, incipits } = near.data;
  const items = near.data.items.filter(({ accession }) => accession !== submission.accession);
  const same = report?.matches.find(({ relation }) => relation === 'same' || relation === 'same-other-start');
  const staves: ScoreStaff[] = [
    {
      key: 'submission',
      title: <Text weight="semibold">Submission {submission.number}</Text>,
      note: `T ${orbit.period}`,
      music: own,
    },
    ...items.map((entry) => ({
      key: entry.accession,
      title: <LinkText href={entryHref(entry.accession)}>{entry.accession}</LinkText>,
      note: noteOf(entry, orbit, distances?.[entry.accession]),
      music: {
        ...entryMusic(entry, system, incipits?.[entry.accession] ?? null),
        start: besideEntry(orbit, entry)?.start ?? 0,
      },
    })),
  ];
  const beside = items.map((entry) => besideEntry(orbit, entry)).find((one) => one !== null);
  return (
    <View style={{ gap: space.one }}>
      <Heading level={2}>Beside its nearest entries</Heading>
      <Text tone="muted">
        {same
          ? `${same.accession} is the same orbit.`
          : items.length > 0
            ? 'None is the same orbit.'
            : 'The catalogue has no entry of this system.'}
      </Text>
      {items.length > 0 ? <Score staves={staves} /> : null}
      {beside ? <HowFarApart beside={beside} orbit={orbit} tolerance={report?.closure?.tolerance ?? 0} /> : null}
    </View>
  );
}

const noteOf = (entry: Entry, orbit: CheckedOrbit, distance: number | undefined): string =>
  [
    `ΔT ${formatDifference(entry.period, orbit.period)}`,
    `${entry.returns} ${entry.returns === 1 ? 'return' : 'returns'}`,
    ...(distance === undefined ? [] : [`${formatSize(distance)} away`]),
  ].join(' · ');

/** The distance of every crossing from its partner, against where the same orbit would lie. */
function HowFarApart({ beside, orbit, tolerance }: { beside: Beside; orbit: CheckedOrbit; tolerance: number }) {
  const { entry, differs, times, distances } = beside;
  return (
    <View>
      <Text>
        <Text weight="semibold">How far apart</Text>, crossing by crossing,{' '}
        <LinkText href={entryHref(entry.accession)}>{entry.accession}</LinkText>
        {differs.length > 0 ? `; ${differs.length} of ${orbit.returns} letters differ` : ''}
      </Text>
      <CrossingDistance
        times={times}
        period={toDouble(orbit.period)}
        distances={distances}
        same={SAME_TOLERANCES * tolerance}
      />
    </View>
  );
}
