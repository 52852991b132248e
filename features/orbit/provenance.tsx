import { View } from 'react-native';
import { useOrbitRevisions } from '@/features/api/orbits';
import { longDate } from '@/features/notation/long-date';
import { DefinitionRows, Heading, LinkText, Text } from '@/features/ui';
import type { Entry } from '@/schemas/generated/contract';

/** Who contributed and accepted the entry, and when; how it was checked; its revisions. */
export function Provenance({ entry }: { entry: Entry }) {
  const revisions = useOrbitRevisions(entry.accession);
  const rows = [
    { name: 'Contributed', value: <Person person={entry.contributor} at={entry.submittedAt} /> },
    { name: 'Accepted', value: <Person person={entry.curator} at={entry.acceptedAt} /> },
    { name: 'Checked by', value: `engine ${entry.evidence.engine}` },
    ...(entry.note ? [{ name: 'Note', value: entry.note }] : []),
    {
      name: entry.revision === 1 ? 'Revision' : 'Revisions',
      value: (
        <View>
          {(revisions.data?.items ?? []).map(({ revision, at, why }) => (
            <Text key={`${revision} ${at}`}>{`${revision}, ${longDate(at)}: ${why}`}</Text>
          ))}
          {revisions.data ? null : <Text>{String(entry.revision)}</Text>}
        </View>
      ),
    },
    { name: 'Licence', value: entry.licence },
  ];
  return (
    <View>
      <Heading level={2}>Who and when</Heading>
      <DefinitionRows rows={rows} />
    </View>
  );
}

function Person({ person, at }: { person: Entry['contributor']; at: string }) {
  return (
    <Text>
      {person.orcid ? <LinkText href={`https://orcid.org/${person.orcid}`}>{person.name}</LinkText> : person.name},{' '}
      {longDate(at)}
    </Text>
  );
}

/** Where the orbit was published. */
export function References({ entry }: { entry: Entry }) {
  if (entry.references.length === 0) return null;
  return (
    <View>
      <Heading level={2}>References</Heading>
      <View role="list">
        {entry.references.map(({ citation, doi }, index) => (
          <View key={index} role="listitem">
            <Text>
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
