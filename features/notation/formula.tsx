import { useMemo } from 'react';
import { font, Text, type TextProps } from '@/features/ui';
import { formulaTokens } from './formula-tokens';
import { mathmlElements } from './mathml-elements';

export interface FormulaProps extends Pick<TextProps, 'size' | 'tone' | 'weight'> {
  /** The formula as typed; also the accessible name. */
  text: string;
  /** MathML as the server stored it; drawn in place of the text. */
  mathml?: string | null;
}

/** A displayed formula. */
function Displayed({ mathml, text, size = 19 }: FormulaProps & { mathml: string }) {
  const drawn = useMemo(() => mathmlElements(mathml), [mathml]);
  if (drawn === null) return <Text mono>{text}</Text>;
  return (
    <div
      role="math"
      aria-label={text}
      style={{ fontFamily: font.reading, fontSize: size, overflowX: 'auto', maxWidth: '100%' }}
    >
      {drawn}
    </div>
  );
}

/** A formula: as a line of text with italic variables, or as MathML. */
export function Formula(props: FormulaProps) {
  const { text, mathml, size, tone, weight } = props;
  if (mathml) return <Displayed {...props} mathml={mathml} />;
  return (
    <Text {...(size && { size })} {...(tone && { tone })} {...(weight && { weight })}>
      {formulaTokens(text).map((token, index) =>
        token.italic ? (
          <Text key={index} italic>
            {token.text}
          </Text>
        ) : (
          token.text
        ),
      )}
    </Text>
  );
}
