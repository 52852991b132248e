import { View } from 'react-native';
import { entryHref } from '@/features/api/page-addresses';
import { longDate } from '@/features/notation/long-date';
import { LinkText, Text } from '@/features/ui';
import type { Entry } from '@/schemas/generated/contract';

/** Why an entry is no longer in the catalogue, and what replaces it. */
export function Withdrawn({ withdrawal }: { withdrawal: NonNullable<Entry['withdrawal']> }) {
  const { at, reason, replacement } = withdrawal;
  return (
    <View>
      <Text weight="semibold" tone="muted">
        withdrawn, {longDate(at)}
      </Text>
      <Text>
        {reason}{' '}
        {replacement ? (
          <>
            <LinkText href={entryHref(replacement)}>{replacement}</LinkText> replaces it.{' '}
          </>
        ) : null}
        Its numbers and history stay below; exports say that it was withdrawn.
      </Text>
    </View>
  );
}
