import { type ReactNode, type RefObject, useEffect, useRef } from 'react';
import { View } from 'react-native';
import { Button } from './button';
import { Heading } from './heading';
import { StaffLines } from './staff-lines';
import { Text } from './text';
import { space } from './tokens';

export interface FailureProps {
  /** Anything thrown; `title`, `detail`, `message` and `requestId` are read where they are strings. */
  error?: unknown;
  /** What happened and what is safe, in place of the error's own words. */
  sentence?: string;
  requestId?: string | null;
  /** What failed: "The search did not answer". */
  title?: string;
  /** What is safe: "Your search is kept in the address; nothing was lost." */
  kept?: string;
  onRetry?: () => unknown;
  /** Other ways on. */
  children?: ReactNode;
}

function stringOf(error: unknown, key: string): string | null {
  if (typeof error !== 'object' || error === null) return null;
  const value: unknown = Reflect.get(error, key);
  return typeof value === 'string' && value !== '' ? value : null;
}

/** Puts the focus on the heading when the failure appears. */
function useFocusOnHeading(error: unknown): RefObject<View | null> {
  const box = useRef<View>(null);
  useEffect(() => {
    const node: unknown = box.current;
    if (node instanceof HTMLElement) node.querySelector<HTMLElement>('h2')?.focus();
  }, [error]);
  return box;
}

/** An error where content should be: what failed, that nothing was lost, Retry, the request's id. It takes the focus. */
export function Failure(props: FailureProps) {
  const { error, title, sentence, kept = 'Nothing was lost.', onRetry, children } = props;
  const box = useFocusOnHeading(error);
  const detail = stringOf(error, 'detail') ?? stringOf(error, 'message');
  const requestId = props.requestId ?? stringOf(error, 'requestId');
  return (
    <View ref={box} style={{ gap: space.two, paddingVertical: space.two, maxWidth: 544 }}>
      <StaffLines kind="stopping" />
      <View style={{ gap: space.half }}>
        <Heading level={2}>{title ?? stringOf(error, 'title') ?? 'The archive did not answer'}</Heading>
        <Text>{sentence ?? (detail ? `${detail} ${kept}` : kept)}</Text>
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.one }}>
        {onRetry ? (
          <Button filled onPress={() => void onRetry()}>
            Try again
          </Button>
        ) : null}
        {children}
      </View>
      {requestId ? (
        <Text size={13} tone="muted">
          request <Text mono>{requestId}</Text>
        </Text>
      ) : null}
    </View>
  );
}
