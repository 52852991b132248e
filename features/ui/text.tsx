import { createContext, type ReactNode, useContext } from 'react';
import { Text as NativeText, type Role, type StyleProp, type TextStyle } from 'react-native';
import { colour, font, type TextSize, type Tone } from './tokens';
import { web } from './web';

const InText = createContext(false);

/** Line height of running text, px. */
const LINE_HEIGHT: Record<TextSize, number> = {
  11: 14,
  13: 20,
  14: 20,
  16: 24,
  19: 26,
  23: 28,
  26: 32,
  28: 34,
  34: 41,
};

export interface TextProps {
  children?: ReactNode;
  /** px; 16 unless inside another text, where it is inherited. */
  size?: TextSize;
  tone?: Tone;
  weight?: 'regular' | 'semibold';
  italic?: boolean;
  /** Iosevka: numbers, code, symbols. */
  mono?: boolean;
  smallCaps?: boolean;
  align?: 'left' | 'right' | 'center';
  nowrap?: boolean;
  /** Cut after this many lines. */
  lines?: number;
  role?: Role;
  id?: string;
  title?: string;
  style?: StyleProp<TextStyle>;
}

function familyOf({ italic, mono, weight }: TextProps): string {
  if (mono) return weight === 'semibold' ? font.numberSemibold : font.number;
  if (italic) return font.readingItalic;
  return weight === 'semibold' ? font.readingSemibold : font.reading;
}

function styleOf(props: TextProps, nested: boolean): TextStyle {
  const { size, tone, weight, italic, mono, smallCaps, align, nowrap } = props;
  const setsFace = !nested || weight !== undefined || italic !== undefined || mono !== undefined;
  const given = size ?? (nested ? undefined : 16);
  return {
    ...(setsFace && { fontFamily: familyOf(props) }),
    ...(given && { fontSize: given, ...(!nested && { lineHeight: LINE_HEIGHT[given] }) }),
    ...((tone !== undefined || !nested) && { color: colour[tone ?? 'ink'] }),
    ...(smallCaps === false && ({ fontVariant: 'normal', letterSpacing: 0, textTransform: 'none' } as object)),
    ...(smallCaps && { fontVariant: ['small-caps'], letterSpacing: 1, textTransform: 'lowercase' }),
    ...(align && { textAlign: align }),
    ...(nowrap && ({ whiteSpace: 'nowrap' } as TextStyle)),
  };
}

/** Text in the house's type. Inside another `Text` it changes only what is asked for. */
export function Text(props: TextProps) {
  const { children, lines, role, id, title, style } = props;
  const nested = useContext(InText);
  return (
    <InText.Provider value={true}>
      <NativeText
        style={[styleOf(props, nested), style]}
        {...(lines !== undefined && { numberOfLines: lines })}
        {...(role && { role })}
        {...(id && { id })}
        {...(title && web({ title }))}
      >
        {children}
      </NativeText>
    </InText.Provider>
  );
}
