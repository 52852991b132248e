import { View } from 'react-native';
import { ApiError } from '@/features/api/api-error';
import { failureWords } from '@/features/api/failure-words';
import { Text } from '@/features/ui';

/** Why a body was not taken: the sentence, and each error with the member it is about. */
export function RefusedFields({ error, what }: { error: unknown; what: string }) {
  if (!error) return null;
  const errors = error instanceof ApiError ? (error.problem?.errors ?? []) : [];
  const words = failureWords(error, what, 'What you typed is still here.');
  return (
    <View role="alert">
      <Text tone="oxide">{words.sentence}</Text>
      {errors.length > 1 ? (
        <View role="list">
          {errors.map(({ pointer, message }) => (
            <Text key={`${pointer} ${message}`} role="listitem" size={14} tone="oxide">
              <Text mono>{pointer}</Text> {message}
            </Text>
          ))}
        </View>
      ) : null}
    </View>
  );
}
