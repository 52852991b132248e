import { View } from 'react-native';
import { FindingRow } from '@/features/notation/finding-row';
import { Text } from '@/features/ui';
import type { CheckReport } from '@/schemas/generated/contract';

/** What a check found, the gravest first. */
export function FindingList({ findings }: Pick<CheckReport, 'findings'>) {
  if (findings.length === 0) return <Text tone="muted">No findings.</Text>;
  const rank = { blocker: 0, warning: 1, note: 2 } as const;
  const sorted = [...findings].sort((a, b) => rank[a.severity] - rank[b.severity]);
  return (
    <View role="list" aria-label="Findings">
      {sorted.map((finding, index) => (
        <FindingRow key={index} {...finding} />
      ))}
    </View>
  );
}
