import { View } from 'react-native';
import { failureWords } from '@/features/api/failure-words';
import { isUnderWay, useRefinements, useRefineOrbit } from '@/features/api/refinements';
import { useUser } from '@/features/api/session';
import { Button, space, Text } from '@/features/ui';
import type { Entry, Refinement } from '@/schemas/generated/contract';

/** Digits that one can ask for with one press. */
const CHOICES = [60, 100] as const;

/** What is being computed of an entry, and for people with an account the buttons that ask for more. */
export function MoreDigits({ entry }: { entry: Entry }) {
  const { accession, evidence, status } = entry;
  const refinements = useRefinements(accession);
  const refine = useRefineOrbit(accession);
  const user = useUser();
  const underWay = (refinements.data ?? []).filter(isUnderWay);
  const known = evidence.level === 're-integrated' ? 0 : evidence.digits;
  const choices = CHOICES.filter((digits) => digits > known);
  return (
    <View style={{ gap: space.one }}>
      {underWay.map((one) => (
        <Text key={one.id} role="status" tone="muted">
          {progressWords(one)}
        </Text>
      ))}
      {user && status === 'accepted' && choices.length > 0 ? (
        <View role="group" aria-label="More digits" style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.one }}>
          {choices.map((digits) => (
            <Button
              key={digits}
              name={`Refine to ${digits} digits`}
              disabledBecause={hindrance(underWay, digits, refine.isPending)}
              onPress={() => refine.mutate(digits)}
            >
              {`${digits} digits`}
            </Button>
          ))}
        </View>
      ) : null}
      {refine.isError ? (
        <Text role="alert" tone="oxide">
          {failureWords(refine.error, 'The refinement', 'The entry stays as it is.').sentence}
        </Text>
      ) : null}
    </View>
  );
}

const progressWords = ({ digits, state }: Refinement): string =>
  state === 'queued'
    ? `${digits} digits wait for their turn. You can leave; the entry will have them.`
    : `${digits} digits are being computed. You can leave; the entry will have them.`;

function hindrance(underWay: readonly Refinement[], digits: number, isAsking: boolean): string | null {
  if (isAsking) return 'This is being asked for.';
  return underWay.some((one) => one.digits >= digits) ? 'These digits are on their way.' : null;
}
