import { useEffect, useState } from 'react';
import { View } from 'react-native';
import { Page, type PageProps } from './page';
import { StaffLines } from './staff-lines';
import { Text } from './text';
import { space } from './tokens';

export interface PageSkeletonProps {
  title: string;
  back?: PageProps['back'];
  /** What is waited for, shown after four seconds. */
  waitingFor?: string;
  /** Staves drawn while waiting. */
  staves?: number;
}

/** Waiting longer than this is explained. */
const EXPLAIN_AFTER_MS = 4000;

/** True once something has taken so long that it needs a word. */
export function useTakesLong(): boolean {
  const [long, setLong] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setLong(true), EXPLAIN_AFTER_MS);
    return () => clearTimeout(timer);
  }, []);
  return long;
}

export interface WaitingProps {
  waitingFor?: string;
  staves?: number;
}

/** Empty staves at final size, and after four seconds the words. */
export function Waiting({ waitingFor = 'Waiting for the archive’s answer…', staves = 3 }: WaitingProps) {
  const long = useTakesLong();
  return (
    <View role="status" aria-busy style={{ gap: space.two }}>
      {long ? <Text tone="muted">{waitingFor}</Text> : <div className="r-hidden">Loading</div>}
      {Array.from({ length: staves }, (_, index) => (
        <StaffLines key={index} kind="loading" />
      ))}
    </View>
  );
}

/** A page that waits for its content. */
export function PageSkeleton({ title, back, waitingFor, staves = 3 }: PageSkeletonProps) {
  return (
    <Page title={title} {...(back && { back })}>
      <Waiting staves={staves} {...(waitingFor && { waitingFor })} />
    </Page>
  );
}
