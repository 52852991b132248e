import { View } from 'react-native';
import { useCitationLine, useOrbitRevisions } from '@/features/api/orbits';
import { longDate } from '@/features/notation/long-date';
import { CopyButton, DefinitionRows, Heading, LinkText, space, Text } from '@/features/ui';
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
          {(revisions.data?.items ?? []).map(({ revision, at, why, links }) => (
            <Text key={revision}>
              {revision === entry.revision ? (
                String(revision)
              ) : (
                <LinkText href={links.self} name={`Revision ${revision} as JSON`}>
                  {String(revision)}
                </LinkText>
              )}
              {`, ${longDate(at)}: ${why}`}
            </Text>
          ))}
          {revisions.data ? null : <Text>{String(entry.revision)}</Text>}
        </View>
      ),
    },
    { name: 'Licence', value: entry.licence },
    { name: 'Cite as', value: <CiteLine accession={entry.accession} /> },
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

/** The line to cite the entry by; *Cite* has it in the forms that programs read. */
function CiteLine({ accession }: { accession: string }) {
  const citation = useCitationLine(accession);
  if (citation.isError) return <Text tone="muted">The line did not come; Cite asks again.</Text>;
  const sentence = citation.data ?? '…';
  return (
    <View style={{ gap: space.half, alignItems: 'flex-start' }}>
      <Text style={{ overflowWrap: 'anywhere' } as object}>{sentence}</Text>
      <CopyButton text={sentence} what="citation" said="Copied">
        Copy
      </CopyButton>
    </View>
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
