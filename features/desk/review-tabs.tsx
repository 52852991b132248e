import { useState } from 'react';
import { View } from 'react-native';
import { Discussion } from '@/features/desk/discussion';
import { History } from '@/features/desk/history';
import { changedMembers, memberText } from '@/features/desk/changed-members';
import { ReviewProjection, ReviewSection } from '@/features/desk/review-figures';
import { DataTable, DefinitionRows, space, Tabs, Text } from '@/features/ui';
import type { Submission, System } from '@/schemas/generated/contract';

type Key = 'section' | 'projection' | 'typed' | 'changes' | 'discussion' | 'history';

interface ReviewTabsProps {
  submission: Submission;
  system: System | undefined;
}

/** On the section, projection, numbers as typed, changes since the revision before, discussion, history. */
export function ReviewTabs({ submission, system }: ReviewTabsProps) {
  const [active, setActive] = useState<Key>('section');
  const tabs = [
    { key: 'section' as const, label: 'On the section' },
    { key: 'projection' as const, label: 'Projection' },
    { key: 'typed' as const, label: 'Numbers as typed' },
    ...(submission.revision > 1
      ? [{ key: 'changes' as const, label: `Changes since revision ${submission.revision - 1}` }]
      : []),
    { key: 'discussion' as const, label: 'Discussion', count: submission.comments.length },
    { key: 'history' as const, label: 'History' },
  ];
  return (
    <Tabs name="More about this submission" tabs={tabs} active={active} onChange={setActive}>
      <View style={{ paddingTop: space.two }}>
        {active === 'section' ? <ReviewSection submission={submission} system={system} /> : null}
        {active === 'projection' ? <ReviewProjection submission={submission} system={system} /> : null}
        {active === 'typed' ? <AsTyped submission={submission} /> : null}
        {active === 'changes' ? <Changes submission={submission} /> : null}
        {active === 'discussion' ? <Discussion submission={submission} /> : null}
        {active === 'history' ? <History submission={submission} /> : null}
      </View>
    </Tabs>
  );
}

function AsTyped({ submission }: { submission: Submission }) {
  const rows = Object.entries(submission.body).map(([name, value]) => ({
    name,
    value: (
      <Text mono size={14} style={{ overflowWrap: 'anywhere' } as object}>
        {memberText(value)}
      </Text>
    ),
  }));
  return <DefinitionRows rows={rows} ruled />;
}

function Changes({ submission }: { submission: Submission }) {
  const before = submission.revisions.find(({ revision }) => revision === submission.revision - 1);
  const changes = changedMembers(before?.body ?? {}, submission.body);
  if (changes.length === 0) return <Text>Nothing was changed.</Text>;
  return (
    <DataTable
      caption="What was changed, old and new"
      hideCaption
      ruled
      columns={[
        { key: 'member', head: 'Member' },
        { key: 'old', head: 'Before', mono: true },
        { key: 'new', head: 'Now', mono: true },
      ]}
      rows={changes.map(({ member, old, now }) => ({ key: member, cells: { member, old, new: now } }))}
    />
  );
}
