import { failureWords } from '@/features/api/failure-words';
import { Text } from '@/features/ui';

interface Props {
  error: unknown;
  /** What failed: "Signing in". */
  what: string;
  /** A sentence in place of the server's own. */
  sentence?: string | null;
}

/** Why a form was not taken, under its fields; it is read out when it appears. */
export function FormFailure({ error, what, sentence }: Props) {
  if (!error) return null;
  const words = failureWords(error, what, 'What you typed is still here.');
  return (
    <Text role="alert" tone="oxide">
      {sentence ?? words.sentence}
    </Text>
  );
}
