import type { ReactNode } from 'react';
import { Text as SvgText } from 'react-native-svg';
import { colour, font } from '@/features/ui';

export interface PlotLabelProps {
  children: ReactNode;
  /** Start, middle or end of the baseline, px. */
  x: number;
  y: number;
  anchor?: 'start' | 'middle' | 'end';
  /** px. */
  size?: number;
  face?: keyof typeof font;
  paint?: string;
  /** A halo of this colour, where the label crosses a line. */
  halo?: string;
}

const HALO = 4;

/** Text in a plot; its halo is the same text, stroked, under it. */
export function PlotLabel(props: PlotLabelProps) {
  const { children, x, y, anchor = 'start', size = 13, face = 'number', paint = colour.muted, halo } = props;
  const text = { x, y, textAnchor: anchor, fontFamily: font[face], fontSize: size } as const;
  return (
    <>
      {halo ? (
        <SvgText {...text} fill={halo} stroke={halo} strokeWidth={HALO} strokeLinejoin="round">
          {children}
        </SvgText>
      ) : null}
      <SvgText {...text} fill={paint}>
        {children}
      </SvgText>
    </>
  );
}
