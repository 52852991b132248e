import { View } from 'react-native';
import { useCheckTrace } from '@/features/api/checks';
import { entryHref } from '@/features/api/page-addresses';
import { reportMusic } from '@/features/checking/report-music';
import { type Beside, besideEntry, drawnTimes } from '@/features/desk/letters-beside';
import { useNearest } from '@/features/desk/use-nearest';
import { CrossingDistance } from '@/features/notation/crossing-distance';
import { entryMusic } from '@/features/notation/entry-music';
import { formatDifference } from '@/features/notation/format-difference';
import { formatSize } from '@/features/notation/format-size';
import type { IncipitMusic } from '@/features/notation/incipit-props';
import { orbitState } from '@/features/notation/orbit-state';
import { Score, type ScoreStaff } from '@/features/notation/score';
import { ShortDigits } from '@/features/notation/short-digits';
import { toDouble } from '@/features/notation/to-double';
import { Heading, LinkText, space, Text } from '@/features/ui';
import type { CheckedOrbit, Submission, System } from '@/schemas/generated/contract';

interface Props {
  submission: Submission;
  orbit: CheckedOrbit;
  system: System | undefined;
  section: string;
}

/** Orbits whose crossings all lie within this many tolerances are the same. */
const SAME_TOLERANCES = 10;

/** What the submission's own staff shows: the orbit found, its letters, and the flow once it is there. */
function useOwnMusic({ submission, system, section }: Props): IncipitMusic | null {
  const trace = useCheckTrace(submission.check);
  const { report } = submission;
  if (!report) return null;
  const state = orbitState(submission.reviewState, submission.checkState, submission.verdict);
  return reportMusic({ report, system, section, state, trace: trace.data });
}

/** A submission as the first staff of a score, its nearest entries below it. */
export function NearestEntries(props: Props) {
  const { submission, orbit, system } = props;
  const { near, items } = useNearest(submission, orbit, system);
  const own = useOwnMusic(props);
  if (!own || !near.data) return null;
  const { distances, incipits } = near.data;
  const { report } = submission;
  const same = report?.matches.find(({ relation }) => relation === 'same' || relation === 'same-other-start');
  const beside = items.map((entry) => {
    const music = entryMusic(entry, system, incipits?.[entry.accession] ?? null);
    return { ...besideEntry(orbit, own.letters, entry, music.letters), music };
  });
  const staves: ScoreStaff[] = [
    {
      key: 'submission',
      title: <Text weight="semibold">Submission {submission.number}</Text>,
      note: <PeriodNote period={orbit.period} digits={report?.digits?.confirmed} />,
      music: own,
    },
    ...beside.map(({ entry, music, ...one }) => ({
      key: entry.accession,
      title: <LinkText href={entryHref(entry.accession)}>{entry.accession}</LinkText>,
      note: noteOf({ entry, ...one }, orbit, distances?.[entry.accession]),
      music: { ...music, start: one.start, differs: one.differs },
    })),
  ];
  const compared = beside.find((one) => one.distances !== null);
  return (
    <View style={{ gap: space.one }}>
      <Heading level={2}>Beside its nearest entries</Heading>
      <Text tone="muted">{leadOf(same?.accession, items.length, own.letters ?? null)}</Text>
      {items.length > 0 ? <Score staves={staves} /> : null}
      {compared ? <HowFarApart beside={compared} orbit={orbit} tolerance={report?.closure?.tolerance ?? 0} /> : null}
    </View>
  );
}

function PeriodNote({ period, digits }: { period: string; digits: number | undefined }) {
  return (
    <>
      <Text italic>T</Text> <ShortDigits value={period} {...(digits !== undefined && { verified: digits })} />
    </>
  );
}

function leadOf(same: string | undefined, count: number, letters: string | null): string {
  if (count === 0) return 'The catalogue has no entry of this system.';
  const how = letters ? ' Staves start where the letters agree best; letters that differ are underlined.' : '';
  return `${same ? `${same} is the same orbit.` : 'None is the same orbit.'}${how}`;
}

/** What makes an entry near: period, letters, returns, distance. */
function noteOf({ entry, differs, distances }: Beside, orbit: CheckedOrbit, distance: number | undefined): string {
  const difference = formatDifference(entry.period, orbit.period);
  return [
    difference === '0' ? 'same T' : `ΔT ${difference}`,
    distances !== null && orbit.itinerary !== null
      ? `${differs.length} of ${orbit.returns} letters differ`
      : `${entry.returns} ${entry.returns === 1 ? 'return' : 'returns'}`,
    ...(distance === undefined ? [] : [`${formatSize(distance)} away`]),
  ].join(' · ');
}

/** The distance of every crossing from its partner, against where the same orbit would lie. */
function HowFarApart({ beside, orbit, tolerance }: { beside: Beside; orbit: CheckedOrbit; tolerance: number }) {
  const { entry, differs, distances } = beside;
  return (
    <View>
      <Text>
        <Text weight="semibold">How far apart</Text>, crossing by crossing,{' '}
        <LinkText href={entryHref(entry.accession)}>{entry.accession}</LinkText>
      </Text>
      <CrossingDistance
        times={drawnTimes(orbit)}
        period={toDouble(orbit.period)}
        distances={distances ?? []}
        differs={differs}
        same={SAME_TOLERANCES * tolerance}
      />
    </View>
  );
}
