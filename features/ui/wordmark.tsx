import { colour } from './tokens';

/** A loop that starts at a note and returns to it before the repeat sign. 36 × 28 px. */
export function Wordmark() {
  const lines = [4, 8.8, 13.6, 18.4, 23.2].map((y) => `M0 ${y}H35`).join('');
  return (
    <svg width={36} height={28} viewBox="0 0 36 28" aria-hidden>
      <path d={lines} stroke={colour.staff} strokeWidth={0.8} />
      <ellipse cx={13} cy={13.6} rx={7.2} ry={10} fill="none" stroke={colour.verdigris} strokeWidth={2} />
      <ellipse cx={5.2} cy={13.6} rx={4.7} ry={3.4} fill={colour.ink} transform="rotate(-20 5.2 13.6)" />
      <circle cx={25.2} cy={11.2} r={1.5} fill={colour.ink} />
      <circle cx={25.2} cy={16} r={1.5} fill={colour.ink} />
      <path d="M29.4 4V23.2" stroke={colour.ink} strokeWidth={1.2} />
      <path d="M33.4 3.6V23.6" stroke={colour.ink} strokeWidth={3.2} />
    </svg>
  );
}
