import type { InfiniteData, UseInfiniteQueryResult } from '@tanstack/react-query';
import { View } from 'react-native';
import { failureWords } from '@/features/api/failure-words';
import { SubmissionItem } from '@/features/desk/submission-item';
import { Button, Empty, Failure, Heading, space, StaffLines, Text } from '@/features/ui';
import type { SubmissionPage, SubmissionSummary } from '@/schemas/generated/contract';

interface Props {
  title: string;
  list: UseInfiniteQueryResult<InfiniteData<SubmissionPage>>;
  /** The sentence when there is nothing. */
  empty: string;
}

/** Longer staves would be harder to compare, px. */
const WIDEST = 832;

type Turn = SubmissionSummary['turn'];

/** Whose turn it is, in the order that matters; those without a turn are decided. */
const groups: readonly { turn: Turn; title: string }[] = [
  { turn: 'contributor', title: 'Your turn' },
  { turn: 'curator', title: 'A curator’s turn' },
  { turn: 'machine', title: 'The machine’s turn' },
  { turn: null, title: 'Decided' },
];

/** One's own submissions by whose turn it is. */
export function SubmissionList({ title, list, empty }: Props) {
  return (
    <View style={{ gap: space.two, maxWidth: WIDEST }}>
      <Heading level={2}>{title}</Heading>
      <Body list={list} empty={empty} />
    </View>
  );
}

function Body({ list, empty }: Omit<Props, 'title'>) {
  if (list.isPending) return <StaffLines kind="loading" />;
  if (list.isError)
    return <Failure {...failureWords(list.error, 'The list', 'Nothing was lost.')} onRetry={list.refetch} />;
  const items = list.data.pages.flatMap((page) => page.items);
  if (items.length === 0) return <Empty>{empty}</Empty>;
  return (
    <View style={{ gap: space.two }}>
      {groups.map(({ turn, title }) => {
        const group = items.filter((item) => item.turn === turn);
        if (group.length === 0) return null;
        return (
          <View key={title}>
            <Text smallCaps size={14} tone="muted">
              {title} {group.length}
            </Text>
            <View role="list" aria-label={title}>
              {group.map((item) => (
                <SubmissionItem key={item.id} submission={item} />
              ))}
            </View>
          </View>
        );
      })}
      {list.hasNextPage ? <Button onPress={() => void list.fetchNextPage()}>Show more</Button> : null}
    </View>
  );
}
