import { View } from 'react-native';
import { useCheckTrace } from '@/features/api/checks';
import { closedOrbit } from '@/features/checking/closed-orbit';
import { draftOfBody } from '@/features/checking/orbit-draft';
import { FindingList } from '@/features/checking/finding-list';
import { MatchList } from '@/features/checking/match-list';
import { ReportFigures } from '@/features/checking/report-figures';
import { reportMusic } from '@/features/checking/report-music';
import { verdictSentence } from '@/features/checking/verdict-sentence';
import { checkWords } from '@/features/desk/check-words';
import { NearestEntries } from '@/features/desk/nearest-entries';
import { Incipit } from '@/features/notation/incipit';
import { Verdict } from '@/features/notation/verdict';
import { space, Text, useLayout } from '@/features/ui';
import type { CheckReport, Submission, System } from '@/schemas/generated/contract';

interface ReviewReportProps {
  submission: Submission;
  system: System | undefined;
}

/** The report as a curator reads it: verdict and findings, figures, then the orbit beside its nearest entries. */
export function ReviewReport({ submission, system }: ReviewReportProps) {
  const phone = useLayout() === 'phone';
  const { report, reportIsCurrent } = submission;
  if (!report) return <Text role="status">No report yet: {checkWords(submission)}.</Text>;
  const draft = draftOfBody(submission.body);
  const orbit = closedOrbit(report);
  const figures = <ReportFigures report={report} muted={!reportIsCurrent} columns={!phone} />;
  const nearest = orbit ? (
    <NearestEntries submission={submission} orbit={orbit} system={system} section={draft.section} />
  ) : null;
  return (
    <View style={{ gap: space.two }}>
      <Verdict
        verdict={report.verdict}
        sentence={verdictSentence(report, draft.period)}
        aside={report.findings.length === 0 ? 'no findings' : `engine ${report.engine.version}`}
      >
        {orbit ? null : <LostOrbit submission={submission} report={report} system={system} />}
      </Verdict>
      {report.findings.length > 0 ? <FindingList findings={report.findings} /> : null}
      {phone ? nearest : figures}
      <MatchList matches={report.matches} />
      {phone ? figures : nearest}
    </View>
  );
}

/** The run that did not come back, as far as it went. */
function LostOrbit({ submission, report, system }: ReviewReportProps & { report: CheckReport }) {
  const trace = useCheckTrace(submission.check);
  const { section } = draftOfBody(submission.body);
  const music = reportMusic({ report, system, section, state: report.verdict, trace: trace.data });
  return music ? <Incipit {...music} space={8} /> : null;
}
