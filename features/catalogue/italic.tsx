import type { ReactNode } from 'react';
import { font } from '@/features/ui';

/** A variable's name inside a label, at the label's own size. */
export const Italic = ({ children }: { children: ReactNode }) => (
  <span style={{ fontFamily: font.readingItalic }}>{children}</span>
);
