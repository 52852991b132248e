import { View } from 'react-native';
import { OrbitFields } from '@/features/checking/orbit-fields';
import { RefusedFields } from '@/features/checking/refused-fields';
import { ReportView } from '@/features/checking/report-view';
import { Discussion } from '@/features/desk/discussion';
import { History } from '@/features/desk/history';
import { decisionWords } from '@/features/desk/reason-words';
import { useSavedDraft } from '@/features/desk/use-saved-draft';
import { WithdrawButton } from '@/features/desk/withdraw-button';
import { Button, Page, space, Text, useLayout } from '@/features/ui';
import type { Submission, System } from '@/schemas/generated/contract';

interface Props {
  submission: Submission;
  etag: string | null;
  systems: readonly System[];
}

const FORM_WIDTH = 416;

/** The owner's page of a draft or a returned submission: why it came back, the form saved as one types, and its report. */
export function DraftEditor({ submission, etag, systems }: Props) {
  const { draft, change, saved, error, messageAt, send, isSending } = useSavedDraft(submission, etag, systems);
  const wide = useLayout() === 'wide';
  const { number, revision, decision, report, check } = submission;
  return (
    <Page
      title={`Submission ${number}`}
      subtitle={<Text tone="muted">{`revision ${revision} · ${submission.reviewState} · ${saved}`}</Text>}
      back={{ href: '/desk', label: 'Desk' }}
    >
      <View style={{ flexDirection: wide ? 'row' : 'column', gap: space.six }}>
        <View style={{ width: wide ? FORM_WIDTH : '100%', gap: space.two }}>
          {decision ? (
            <View role="note">
              <Text weight="semibold" tone="oxide">
                {decisionWords(decision)}
              </Text>
              <Text>{decision.comment ?? ''}</Text>
            </View>
          ) : null}
          <OrbitFields systems={systems} draft={draft} onChange={change} messageAt={messageAt} />
          <RefusedFields error={error} what="Saving" />
          <Text size={14} tone="muted">
            What you send is released under CC-BY-4.0.
          </Text>
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.one }}>
            <Button filled onPress={send} disabledBecause={isSending ? 'Sending…' : null}>
              {submission.reviewState === 'returned' ? 'Send again' : 'Send'}
            </Button>
            <WithdrawButton id={submission.id} />
          </View>
        </View>
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: wide ? 0 : 'auto', minWidth: 0, gap: space.four }}>
          {report ? (
            <ReportView
              report={report}
              check={check}
              system={systems.find(({ slug }) => slug === draft.system)}
              section={draft.section}
              period={draft.period}
              muted={!submission.reportIsCurrent}
            />
          ) : null}
          <Discussion submission={submission} />
          <History submission={submission} />
        </View>
      </View>
    </Page>
  );
}
