import type { ReactNode } from 'react';
import { View } from 'react-native';
import { useCheckTrace } from '@/features/api/checks';
import { FindingList } from '@/features/checking/finding-list';
import { MatchList } from '@/features/checking/match-list';
import { ReportFigures } from '@/features/checking/report-figures';
import { ReportNumbers } from '@/features/checking/report-numbers';
import { reportMusic } from '@/features/checking/report-music';
import { verdictSentence } from '@/features/checking/verdict-sentence';
import { Incipit } from '@/features/notation/incipit';
import type { OrbitState } from '@/features/notation/orbit-state';
import { Verdict } from '@/features/notation/verdict';
import { ProjectionFigure } from '@/features/plot/projection-figure';
import { space } from '@/features/ui';
import type { CheckReport, System } from '@/schemas/generated/contract';

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
      <FindingList findings={report.findings} />
      <ReportFigures report={report} muted={muted} />
      <ReportNumbers report={report} variables={system?.document.variables.map(({ name }) => name) ?? []} />
      <MatchList matches={report.matches} />
      {children}
      {trace.data ? (
        <ProjectionFigure trace={trace.data} fileName="orbit-projection" caption="One run over the period." />
      ) : null}
    </View>
  );
}
