import type { ReactNode } from 'react';
import { View } from 'react-native';
import { useCheckTrace } from '@/features/api/checks';
import { entryHref } from '@/features/api/page-addresses';
import { ReportFigures } from '@/features/checking/report-figures';
import { reportMusic } from '@/features/checking/report-music';
import { verdictSentence } from '@/features/checking/verdict-sentence';
import { FindingRow } from '@/features/notation/finding-row';
import { formatSize } from '@/features/notation/format-size';
import { Incipit } from '@/features/notation/incipit';
import type { OrbitState } from '@/features/notation/orbit-state';
import { Verdict } from '@/features/notation/verdict';
import { ProjectionFigure } from '@/features/plot/projection-figure';
import { Heading, LinkText, space, Text } from '@/features/ui';
import type { CheckReport, OrbitMatch, System } from '@/schemas/generated/contract';

export interface ReportViewProps {
  report: CheckReport;
  /** Id of the check: its trace is drawn. */
  check: string | null;
  system: System | undefined;
  section: string;
  period: string;
  /** How the barline ends; the verdict unless given. */
  state?: OrbitState;
  /** The report is of an older engine or revision. */
  muted?: boolean;
  /** After the figures: suggestion, next step. */
  children?: ReactNode;
}

const relations: Record<OrbitMatch['relation'], string> = {
  same: 'is the same orbit',
  'same-other-start': 'is the same orbit, from another start',
  'symmetric-image': 'is its image under a symmetry',
  'multiple-of': 'is the orbit that this one repeats',
};

/** A check report: verdict, picture, sentence, findings, figures, what is known already. */
export function ReportView(props: ReportViewProps) {
  const { report, check, system, section, period, state = report.verdict, muted = false, children } = props;
  const trace = useCheckTrace(check);
  const music = reportMusic({ report, system, section, state, trace: trace.data });
  return (
    <View style={{ gap: space.two }}>
      <Verdict
        verdict={report.verdict}
        sentence={verdictSentence(report, period)}
        aside={`engine ${report.engine.version}`}
      >
        {music ? <Incipit {...music} space={8} /> : null}
      </Verdict>
      <Findings report={report} />
      <ReportFigures report={report} muted={muted} />
      <Matches matches={report.matches} />
      {children}
      {trace.data ? (
        <ProjectionFigure trace={trace.data} fileName="orbit-projection" caption="One run over the period." />
      ) : null}
    </View>
  );
}

function Findings({ report }: { report: CheckReport }) {
  if (report.findings.length === 0) return <Text tone="muted">No findings.</Text>;
  const rank = { blocker: 0, warning: 1, note: 2 } as const;
  const sorted = [...report.findings].sort((a, b) => rank[a.severity] - rank[b.severity]);
  return (
    <View role="list" aria-label="Findings">
      {sorted.map((finding, index) => (
        <FindingRow key={index} {...finding} />
      ))}
    </View>
  );
}

function Matches({ matches }: { matches: readonly OrbitMatch[] }) {
  if (matches.length === 0) return null;
  return (
    <View>
      <Heading level={3}>In the catalogue</Heading>
      {matches.map(({ accession, relation, distance }) => (
        <Text key={`${accession}-${relation}`}>
          <LinkText href={entryHref(accession)}>{accession}</LinkText> {relations[relation]}; largest distance of a
          crossing <Text mono>{formatSize(distance)}</Text>.
        </Text>
      ))}
    </View>
  );
}
