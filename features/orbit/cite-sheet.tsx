import { View } from 'react-native';
import { longDate } from '@/features/notation/long-date';
import { cutDecimals } from '@/features/notation/cut-decimals';
import { Button, CopyButton, Labelled, Sheet, Text } from '@/features/ui';
import type { Entry } from '@/schemas/generated/contract';

interface CiteSheetProps {
  entry: Entry;
  open: boolean;
  onClose: () => void;
}

/** The sentence to cite, and the permanent address. */
export function CiteSheet({ entry, open, onClose }: CiteSheetProps) {
  const address = permanentAddress(entry);
  const sentence = citation(entry);
  return (
    <Sheet open={open} onClose={onClose} title="Cite" footer={<Button onPress={onClose}>Close</Button>}>
      <View>
        <Labelled ruled={false} label="Sentence" action={<CopyButton text={sentence} what="sentence" said="Copied" />}>
          <Text>{sentence}</Text>
        </Labelled>
        <Labelled label="Permanent address" action={<CopyButton text={address} what="address" said="Copied" />}>
          <Text style={{ overflowWrap: 'anywhere' } as object}>{address}</Text>
        </Labelled>
        <Text size={14} tone="muted">
          Entries are released under {entry.licence}. An entry keeps its page and its address for ever, also when it is
          withdrawn.
        </Text>
      </View>
    </Sheet>
  );
}

const permanentAddress = ({ accession }: Entry): string => `${window.location.origin}/orbits/${accession}`;

/** One sentence that names the contributor, the orbit, the archive, the revision and the address. */
function citation(entry: Entry): string {
  const period = cutDecimals(entry.period, entry.evidence.digits);
  const returns = `${entry.returns} ${entry.returns === 1 ? 'return' : 'returns'}`;
  return (
    `${entry.contributor.name}: Periodic orbit ${entry.accession} of the system ${entry.system.name} ` +
    `(T = ${period.text}${period.more ? '…' : ''}, ${returns}). Ritornel, revision ${entry.revision}, ` +
    `accepted ${longDate(entry.acceptedAt)}${entry.withdrawal ? `, withdrawn ${longDate(entry.withdrawal.at)}` : ''}. ` +
    permanentAddress(entry)
  );
}
