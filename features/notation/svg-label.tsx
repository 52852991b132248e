import type { ReactNode } from 'react';
import { colour, font } from '@/features/ui';

export interface SvgLabelProps {
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
  underline?: boolean;
}

const HALO = 4;

/** Text in a drawing. */
export function SvgLabel(props: SvgLabelProps) {
  const { children, x, y, anchor = 'start', size = 13, face = 'number', paint = colour.muted, halo, underline } = props;
  return (
    <text
      x={x}
      y={y}
      textAnchor={anchor}
      style={{
        fontFamily: font[face],
        fontSize: size,
        fill: paint,
        ...(underline && { textDecoration: 'underline' }),
        ...(halo && { stroke: halo, strokeWidth: HALO, strokeLinejoin: 'round', paintOrder: 'stroke' }),
      }}
    >
      {children}
    </text>
  );
}
