import { colour } from '@/features/ui';
import type { Multiplier } from './format-multiplier';
import { dotPath } from './dot-path';
import { unitCirclePosition } from './unit-circle-position';

export interface ClefProps {
  /** `null`: not known yet, or meaningless: an empty circle without its tick. */
  multipliers: readonly Multiplier[] | null;
  radius: number;
  /** Centre, px. */
  x: number;
  y: number;
}

const STROKE = 1.4;
/** The trivial multiplier's tick at 1, in radii. */
const TICK = 0.32;
/** Radius of a multiplier's dot, in radii of the circle. */
const DOT = 0.22;
const LEAST_DOT = 1.7;

/** A unit circle with the multipliers on it, part of a drawing. */
export function Clef({ multipliers, radius, x, y }: ClefProps) {
  const dot = Math.max(LEAST_DOT, radius * DOT);
  const dots = (multipliers ?? []).map(unitCirclePosition);
  return (
    <g>
      <circle cx={x} cy={y} r={radius} fill="none" stroke={colour.ink} strokeWidth={STROKE} />
      {multipliers ? (
        <path
          d={`M${x + radius * (1 - TICK)} ${y}H${x + radius * (1 + TICK)}`}
          stroke={colour.ink}
          strokeWidth={STROKE}
        />
      ) : null}
      <path d={dots.map((p) => dotPath(x + p.x * radius, y - p.y * radius, dot)).join('')} fill={colour.ink} />
    </g>
  );
}
