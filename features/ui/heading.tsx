import type { ReactNode } from 'react';
import { Text as NativeText, type StyleProp, type TextStyle } from 'react-native';
import { useLayout } from './layout';
import { colour, font, type TextSize, type Tone } from './tokens';
import { web } from './web';

export interface HeadingProps {
  children: ReactNode;
  level: 1 | 2 | 3;
  /** px; by level unless given. */
  size?: TextSize;
  tone?: Tone;
  /** Names of systems; set in the italic, never slanted by the browser. */
  italic?: boolean;
  id?: string;
  style?: StyleProp<TextStyle>;
}

/** Line height of headings in font sizes. */
const LEADING = 1.2;

/** A real heading: h1 to h3. It can take focus when a screen puts it there. */
export function Heading({ children, level, size, tone = 'ink', italic = false, id, style }: HeadingProps) {
  const phone = useLayout() === 'phone';
  const px = size ?? { 1: phone ? 26 : 28, 2: 19, 3: 16 }[level];
  return (
    <NativeText
      {...web({ role: 'heading', 'aria-level': level, tabIndex: -1, ...(id && { id }) })}
      style={[
        {
          color: colour[tone],
          fontFamily: italic ? font.readingItalic : font.readingSemibold,
          fontSize: px,
          lineHeight: Math.round(px * LEADING),
        },
        style,
      ]}
    >
      {children}
    </NativeText>
  );
}
