import { useEffect, useRef } from 'react';
import { View } from 'react-native';
import { failureWords } from '@/features/api/failure-words';
import { NextStep } from '@/features/bench/next-step';
import { Suggestion } from '@/features/bench/suggestion';
import type { useBench } from '@/features/bench/use-bench';
import { reportOf } from '@/features/checking/report-of';
import { ReportView } from '@/features/checking/report-view';
import { BarlineState } from '@/features/notation/barline-state';
import { formatSize } from '@/features/notation/format-size';
import { Empty, Failure, space, Text, useAnnounce } from '@/features/ui';
import type { Check, System } from '@/schemas/generated/contract';

interface Props {
  systems: readonly System[];
  bench: ReturnType<typeof useBench>;
}

/** The check of this orbit: under way, done, or failed. */
export function CheckPanel({ systems, bench }: Props) {
  const { current, check } = bench;
  useSaidVerdict(check.data);
  if (!current) return <Empty>Nothing checked yet. The report will stand here.</Empty>;
  if (check.isError)
    return (
      <Failure {...failureWords(check.error, 'The check', 'The form is as you left it.')} onRetry={check.refetch} />
    );
  if (!check.data) return <Text role="status">Waiting for the archive’s answer…</Text>;
  const report = reportOf(check.data);
  if (!report) return <UnderWay check={check.data} />;
  const { draft } = current;
  const system = systems.find(({ slug }) => slug === draft.system);
  return (
    <ReportView report={report} check={current.id} system={system} section={draft.section} period={draft.period}>
      <Suggestion report={report} draft={draft} onFollow={bench.follow} />
      <NextStep report={report} body={bench.bodyOf(draft)} />
    </ReportView>
  );
}

/** A verdict is said once to a screen reader. */
function useSaidVerdict(check: Check | undefined): void {
  const announce = useAnnounce();
  const said = useRef<string | null>(null);
  useEffect(() => {
    if (!check?.verdict || said.current === check.id) return;
    said.current = check.id;
    announce(`Check done: ${check.verdict.replace(/-/g, ' ')}`);
  }, [check, announce]);
}

function UnderWay({ check }: { check: Check }) {
  const { checkState, progress, failure } = check;
  if (checkState === 'failed') {
    return (
      <Failure
        title="The check broke"
        sentence={`${failure?.message ?? 'Something broke on our side.'} It was tried ${failure?.attempts ?? 0} times. This says nothing about the orbit; the form is as you left it.`}
      />
    );
  }
  return (
    <View role="status" style={{ gap: space.one }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.one }}>
        <BarlineState state={checkState === 'queued' ? 'queued' : 'checking'} />
      </View>
      <Text>
        {progress
          ? `Returned ${progress.returns} times, ${formatSize(progress.time, 3)} of ${formatSize(progress.period, 3)}.`
          : 'Waiting for its turn.'}{' '}
        You can leave; the result waits here.
      </Text>
    </View>
  );
}
