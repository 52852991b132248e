import { type ReactNode, useMemo } from 'react';
import { View } from 'react-native';
import { useCheckTrace } from '@/features/api/checks';
import { failureWords } from '@/features/api/failure-words';
import { closedOrbit } from '@/features/checking/closed-orbit';
import { draftOfBody } from '@/features/checking/orbit-draft';
import { useNearest } from '@/features/desk/use-nearest';
import { Formula } from '@/features/notation/formula';
import { toDouble } from '@/features/notation/to-double';
import { planeLevel } from '@/features/plot/plane-level';
import { ProjectionFigure } from '@/features/plot/projection-figure';
import { sectionAxes } from '@/features/plot/section-axes';
import { sectionField } from '@/features/plot/section-field';
import { SectionFigure } from '@/features/plot/section-figure';
import { Failure, StaffLines, Text } from '@/features/ui';
import type { Entry, Submission, System, Trace } from '@/schemas/generated/contract';

interface ReviewFigureProps {
  submission: Submission;
  system: System | undefined;
}

/** A square as wide as this stands beside what is said of it without a scroll, px. */
const WIDEST = 480;

/** The run of a submission's check, drawn by `draw`; while it is on its way, empty staves. */
function Traced({ submission, draw }: { submission: Submission; draw: (trace: Trace) => ReactNode }) {
  const trace = useCheckTrace(submission.check);
  if (submission.check === null) return <Text>It was not checked yet, so there is nothing to draw.</Text>;
  if (trace.isPending) return <StaffLines kind="loading" />;
  if (trace.isError)
    return <Failure {...failureWords(trace.error, 'The curve', 'The figures are complete.')} onRetry={trace.refetch} />;
  return <View style={{ maxWidth: WIDEST }}>{draw(trace.data)}</View>;
}

/** The submission's crossings on the section, over those of the nearest entries. */
export function ReviewSection({ submission, system }: ReviewFigureProps) {
  const orbit = submission.report && closedOrbit(submission.report);
  const { items } = useNearest(submission, orbit, system);
  return (
    <Traced
      submission={submission}
      draw={(trace) =>
        trace.crossings.length > 0 ? (
          <OnSection {...{ submission, system, trace }} nearest={items} />
        ) : (
          <Text>The run has no crossing of the section to draw.</Text>
        )
      }
    />
  );
}

/** The field on a section, the same as long as the submission is. */
function useSectionField(system: System | undefined, formula: string, { body }: Submission) {
  return useMemo(
    () => (system ? sectionField(system, { formula }, draftOfBody(body).parameters) : null),
    [system, formula, body],
  );
}

interface OnSectionProps extends ReviewFigureProps {
  trace: Trace;
  nearest: readonly Entry[];
}

function OnSection({ submission, system, trace, nearest }: OnSectionProps) {
  const draft = draftOfBody(submission.body);
  const named = system?.sections.find(({ name }) => name === draft.section);
  const formula = named?.formula ?? draft.section;
  const names = sectionAxes(trace.variables, planeLevel(formula, trace.variables));
  const field = useSectionField(system, formula, submission);
  const [a, b] = [trace.variables.indexOf(names[0]), trace.variables.indexOf(names[1])];
  const others = nearest
    .filter((entry) => entry.section.formula === formula)
    .map(({ accession, crossings }) => ({
      name: accession,
      points: crossings.map(({ point }) => [toDouble(point[a] ?? '0'), toDouble(point[b] ?? '0')] as const),
    }));
  return (
    <SectionFigure
      trace={trace}
      title={
        <>
          The section <Formula text={formula} />
        </>
      }
      names={names}
      others={others}
      {...(field && { sign: field.sign })}
      caption={
        'Notes: this submission, numbered in order of time.' +
        (others.length > 0 ? ' Open marks: the nearest entries.' : '') +
        (field ? ' Dashed: where the flow is tangent to the section.' : '')
      }
      fileName={`submission-${submission.number}-section`}
    />
  );
}

/** The submission's run, projected. */
export function ReviewProjection({ submission, system }: ReviewFigureProps) {
  const draft = draftOfBody(submission.body);
  const formula = system?.sections.find(({ name }) => name === draft.section)?.formula ?? draft.section;
  return (
    <Traced
      submission={submission}
      draw={(trace) => (
        <ProjectionFigure
          trace={trace}
          section={planeLevel(formula, trace.variables)}
          caption="One run over the period; notes are crossings, numbered in order of time."
          fileName={`submission-${submission.number}-projection`}
        />
      )}
    />
  );
}
