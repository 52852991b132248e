import { View } from 'react-native';
import { Heading, LinkText, Text } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

/** Where the system was published. */
export function SystemReferences({ system: { document } }: { system: System }) {
  const references = document.references ?? [];
  if (references.length === 0) return null;
  return (
    <View>
      <Heading level={2}>References</Heading>
      <View role="list">
        {references.map(({ citation, doi }, index) => (
          <View key={index} role="listitem">
            <Text size={14}>
              {citation}
              {doi ? (
                <>
                  {' '}
                  <LinkText href={`https://doi.org/${doi}`}>{`doi:${doi}`}</LinkText>
                </>
              ) : null}
            </Text>
          </View>
        ))}
      </View>
    </View>
  );
}
