import { View } from 'react-native';
import { useCitation } from '@/features/api/orbits';
import { Button, CopyButton, Failure, Labelled, Sheet, StaffLines, Text } from '@/features/ui';
import type { Entry } from '@/schemas/generated/contract';

interface CiteSheetProps {
  entry: Entry;
  open: boolean;
  onClose: () => void;
}

/** The sentence to cite, the same as BibTeX, and the permanent address. */
export function CiteSheet({ entry, open, onClose }: CiteSheetProps) {
  const address = `${window.location.origin}/orbits/${entry.accession}`;
  return (
    <Sheet open={open} onClose={onClose} title="Cite" footer={<Button onPress={onClose}>Close</Button>}>
      <View>
        <Citation entry={entry} enabled={open} />
        <Labelled label="Permanent address" action={<CopyButton text={address} what="address" said="Copied" />}>
          <Text style={anywhere}>{address}</Text>
        </Labelled>
        <Text size={14} tone="muted">
          CSL-JSON and RIS are under Export. Entries are released under {entry.licence}. An entry keeps its page and its
          address for ever, also when it is withdrawn.
        </Text>
      </View>
    </Sheet>
  );
}

const anywhere = { overflowWrap: 'anywhere' } as object;

function Citation({ entry, enabled }: { entry: Entry; enabled: boolean }) {
  const citation = useCitation(entry.accession, enabled);
  if (citation.isError) {
    const kept = 'The permanent address below is enough to find the entry.';
    return <Failure title="The citation did not come" error={citation.error} kept={kept} onRetry={citation.refetch} />;
  }
  if (!citation.data) return <StaffLines kind="loading" />;
  const { sentence, bibtex } = citation.data;
  return (
    <>
      <Labelled ruled={false} label="Sentence" action={<CopyButton text={sentence} what="sentence" said="Copied" />}>
        <Text>{sentence}</Text>
      </Labelled>
      <Labelled label="BibTeX" action={<CopyButton text={bibtex} what="BibTeX" said="Copied" />}>
        <Text mono size={13} style={{ ...anywhere, whiteSpace: 'pre-wrap' } as object}>
          {bibtex}
        </Text>
      </Labelled>
    </>
  );
}
