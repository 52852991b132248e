import { View } from 'react-native';
import { Formula } from '@/features/notation/formula';
import { CopyButton, Heading, space } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

/** The equations, typeset, to be copied as text or MathML. */
export function SystemEquations({ system: { text, mathml } }: { system: System }) {
  return (
    <View style={{ gap: space.half }}>
      <Heading level={2}>Equations</Heading>
      <Formula text={text} mathml={mathml} size={19} />
      <View style={{ flexDirection: 'row', columnGap: space.two }}>
        <CopyButton size={14} text={text} what="equations" said="Copied, as text">
          Copy as text
        </CopyButton>
        <CopyButton size={14} text={mathml} what="equations" said="Copied, as MathML">
          Copy as MathML
        </CopyButton>
      </View>
    </View>
  );
}
