import { View } from 'react-native';
import { useSystem } from '@/features/api/systems';
import { reportMusic } from '@/features/checking/report-music';
import { draftOfBody } from '@/features/checking/orbit-draft';
import { checkWords } from '@/features/desk/check-words';
import { orbitState, stateLook } from '@/features/notation/orbit-state';
import { Incipit } from '@/features/notation/incipit';
import { StateWord } from '@/features/notation/state-word';
import { colour, LinkText, space, Text } from '@/features/ui';
import type { SubmissionSummary } from '@/schemas/generated/contract';

/** One of one's own submissions in a list: number, both states, incipit, what it waits for. */
export function SubmissionItem({ submission }: { submission: SubmissionSummary }) {
  const { id, number, report, body, claim, blocked } = submission;
  const draft = draftOfBody(body);
  const system = useSystem(draft.system, draft.system !== '');
  const state = orbitState(submission.reviewState, submission.checkState, submission.verdict);
  const music = report ? reportMusic({ report, system: system.data, section: draft.section, state }) : null;
  const checked = checkWords(submission);
  const waits = [
    ...(checked === stateLook[state].word ? [] : [checked]),
    ...(blocked ? ['a finding blocks it'] : []),
    ...(claim ? [`claimed by ${claim.by}`] : []),
  ];
  return (
    <View
      role="listitem"
      style={{ borderTopWidth: 1, borderColor: colour.hairline, paddingVertical: space.one, gap: space.half }}
    >
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: space.one }}>
        <LinkText href={`/desk/${id}`} target>
          Submission {number}
        </LinkText>
        <StateWord state={state} size={14} />
      </View>
      {music ? <Incipit {...music} space={5} /> : null}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', columnGap: space.two }}>
        <Text size={14}>
          <Text italic>{system.data?.name ?? draft.system}</Text>
          {draft.returns ? ` · ${draft.returns} ${draft.returns === '1' ? 'return' : 'returns'}` : ''}
          {draft.period ? (
            <>
              {' · '}
              <Text italic>T</Text> <Text mono>{draft.period}</Text>
            </>
          ) : null}
        </Text>
        <Text size={14} tone="muted">
          {waits.join(' · ')}
        </Text>
      </View>
    </View>
  );
}
