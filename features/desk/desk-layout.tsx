import { usePathname } from 'expo-router';
import { type ReactNode, useEffect, useMemo, useRef, useState } from 'react';
import { View } from 'react-native';
import { hasRole, useSession } from '@/features/api/session';
import { DeskContext, type Recorded } from '@/features/desk/desk-context';
import { QueueList } from '@/features/desk/queue-list';
import { queueWords } from '@/features/desk/queue-words';
import { ROOM_FOR_QUEUE } from '@/features/desk/room-for-queue';
import { useNow } from '@/features/desk/use-now';
import { useQueue } from '@/features/desk/use-queue';
import { useQueueKeys } from '@/features/desk/use-queue-keys';
import { Heading, space, Text, useContainerWidth } from '@/features/ui';

/** Width of the queue, px: 33 staff spaces. */
const QUEUE_WIDTH = 264;

/** What all pages of the Desk share; for curators with room, the queue at their left. */
export function DeskLayout({ children }: { children: ReactNode }) {
  const path = usePathname();
  const isCurator = hasRole(useSession().data?.user ?? null, 'curator');
  const hasRoom = useContainerWidth() >= ROOM_FOR_QUEUE;
  const [recorded, setRecorded] = useState<Recorded | null>(null);
  const [firstPath] = useState(path);
  const moved = useRef(false);
  useEffect(() => {
    if (path !== firstPath) moved.current = true;
  }, [path, firstPath]);
  const desk = useMemo(() => ({ recorded, setRecorded, hasMoved: () => moved.current }), [recorded]);
  const open = /^\/desk\/([^/]+)$/.exec(path)?.[1] ?? null;
  return (
    <DeskContext.Provider value={desk}>
      {isCurator ? <QueueKeys open={open} /> : null}
      {isCurator && hasRoom ? (
        <View style={{ flexDirection: 'row', alignItems: 'flex-start', gap: space.six }}>
          <QueueColumn open={open} />
          <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 }}>{children}</View>
        </View>
      ) : (
        children
      )}
    </DeskContext.Provider>
  );
}

function QueueKeys({ open }: { open: string | null }) {
  const { all } = useQueue(true);
  useQueueKeys(
    all.map(({ id }) => id),
    open,
  );
  return null;
}

/** The queue beside whatever is open; it scrolls apart from it. */
function QueueColumn({ open }: { open: string | null }) {
  const queue = useQueue(true);
  const now = useNow();
  const { review, waiting } = queue;
  return (
    <section className="r-side r-queue" aria-label="Queue" style={{ width: QUEUE_WIDTH }}>
      <View style={{ gap: space.two }}>
        <View>
          <Heading level={2}>Queue</Heading>
          <Text size={14} tone="muted">
            {queueWords(review.data?.pages[0]?.total, waiting[0], now)}
          </Text>
        </View>
        <QueueList queue={queue} open={open} narrow />
        <Text size={13} tone="muted">
          <Text mono>j k</Text> move · <Text mono>c</Text> claim · <Text mono>?</Text> all keys
        </Text>
      </View>
    </section>
  );
}
