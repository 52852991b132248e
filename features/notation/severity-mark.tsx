import { colour } from '@/features/ui';

export type Severity = 'blocker' | 'warning' | 'note';

const DIAMOND = 'M7 1L13 7L7 13L1 7Z';
const STROKE = 1.4;

/** Filled diamond: blocker; half-filled: warning; open: note. The word stands beside it. */
export function SeverityMark({ severity }: { severity: Severity }) {
  const paint = { blocker: colour.oxide, warning: colour.ochre, note: colour.muted }[severity];
  return (
    <svg width={14} height={14} viewBox="0 0 14 14" aria-hidden>
      <path d={DIAMOND} fill={severity === 'blocker' ? paint : 'none'} stroke={paint} strokeWidth={STROKE} />
      {severity === 'warning' ? <path d="M7 1L1 7L7 13Z" fill={paint} /> : null}
    </svg>
  );
}
