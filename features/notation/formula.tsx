import { useMemo } from 'react';
import { Text, type TextProps } from '@/features/ui';
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
      className="r-math"
      role="math"
      aria-label={text}
      // A long equation scrolls in its own line, so the keyboard must reach it.
      // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- a scrolling region has to take focus
      tabIndex={0}
      style={{ fontSize: size }}
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
