import { StaffLines, type StaffLinesProps } from '@/features/ui';

export interface StaffProps {
  kind: StaffLinesProps['kind'];
  width?: number;
  /** Distance of two lines, px. */
  space?: number;
}

/** A staff without music, at the size of an incipit: empty, stopping, or loading. */
export function Staff({ kind, width, space = 8 }: StaffProps) {
  return <StaffLines kind={kind} lineGap={space} {...(width !== undefined && { width })} />;
}
