import { View } from 'react-native';
import { formatCount } from '@/features/notation/format-count';
import { longDate } from '@/features/notation/long-date';
import { fileSize } from '@/features/releases/file-size';
import { CopyButton, DataTable, Heading, Labelled, LinkText, space, Text } from '@/features/ui';
import type { Release } from '@/schemas/generated/contract';

interface ReleaseItemProps {
  release: Release;
  /** It has the page to itself, whose heading names it. */
  isAlone: boolean;
}

/** One release: when, how much, what changed, its files with their hashes, how to cite it. */
export function ReleaseItem({ release, isAlone }: ReleaseItemProps) {
  const { id, note, citation, files } = release;
  return (
    <View style={{ gap: space.oneHalf }}>
      {isAlone ? null : (
        <Heading level={2}>
          <LinkText href={`/releases/${id}`}>Release {String(id)}</LinkText>
        </Heading>
      )}
      <Text>{stateSentence(release)}</Text>
      {note === '' ? null : <Text>{note}</Text>}
      {files.length > 0 ? <Files release={release} /> : null}
      {citation === null ? null : (
        <Labelled
          ruled={false}
          label="Cite"
          action={<CopyButton text={citation} what={`citation of release ${id}`} said="Copied" />}
        >
          <Text size={14} style={anywhere}>
            {citation}
          </Text>
        </Labelled>
      )}
      {isAlone ? (
        <Text size={13} tone="muted">
          {release.licence}. {release.caution}
        </Text>
      ) : null}
    </View>
  );
}

const anywhere = { overflowWrap: 'anywhere' } as object;

function stateSentence({ state, cutAt, cutBy, entries, changes, previous, failure, askedAt }: Release): string {
  if (state === 'cutting') return `Being cut since ${longDate(askedAt)}, asked for by ${cutBy}. The page follows it.`;
  if (state === 'failed' || !cutAt || !changes) return `It could not be cut: ${failure ?? 'the reason is not known.'}`;
  const size = `${formatCount(entries ?? 0)} ${entries === 1 ? 'entry' : 'entries'}`;
  const since =
    previous === null
      ? 'The first release.'
      : `Since release ${previous}: ${changes.added} added, ${changes.revised} revised, ${changes.withdrawn} withdrawn.`;
  return `${size}, cut on ${longDate(cutAt)} by ${cutBy}. ${since}`;
}

function Files({ release: { id, files } }: { release: Release }) {
  return (
    <DataTable
      caption={`Files of release ${id}`}
      hideCaption
      ruled
      columns={[
        { key: 'name', head: 'File' },
        { key: 'size', head: 'Size' },
        { key: 'sha256', head: 'SHA-256' },
      ]}
      rows={files.map(({ name, bytes, sha256, href }) => ({
        key: name,
        cells: {
          name: (
            <LinkText href={href} download={`ritornel-release-${id}-${name}`}>
              {name}
            </LinkText>
          ),
          size: fileSize(bytes),
          sha256: (
            <View style={{ flexDirection: 'row', alignItems: 'baseline', gap: space.one }}>
              <Text mono size={13} style={anywhere}>
                {sha256}
              </Text>
              <CopyButton text={sha256} what={`hash of ${name}`} said="Copied" />
            </View>
          ),
        },
      }))}
    />
  );
}
