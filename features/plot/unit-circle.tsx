import { View } from 'react-native';
import { dotPath } from '@/features/notation/dot-path';
import { type Multiplier, multiplierSize } from '@/features/notation/format-multiplier';
import { SvgLabel } from '@/features/notation/svg-label';
import { toDouble } from '@/features/notation/to-double';
import { unitCirclePosition } from '@/features/notation/unit-circle-position';
import { colour } from '@/features/ui';
import { multiplierText } from './multiplier-text';

export interface UnitCircleProps {
  /** `null`: not known, or meaningless. */
  multipliers: readonly Multiplier[] | null;
  width: number;
  height: number;
}

/** Largest distance of a multiplier from the centre, in radii. */
const REACH = 2.53;
/** Beyond this many, values are left to the table. */
const LABELLED = 4;
/** Within this of 1 a modulus counts as on the circle. */
const ON_CIRCLE = 1e-6;
/** Real multipliers closer than this, px, do not both have room above. */
const CLOSE = 84;

const sideOf = (multiplier: Multiplier): string => {
  const size = multiplierSize(multiplier);
  if (Math.abs(size - 1) < ON_CIRCLE) return 'on the circle';
  return size > 1 ? 'unstable' : 'stable';
};

interface Placed {
  multiplier: Multiplier;
  x: number;
  y: number;
}

/** A pair of complex multipliers: its values outside, beside the dots. */
function ComplexLabel({ placed: { multiplier, x, y }, centre }: { placed: Placed; centre: number }) {
  const isRight = x >= centre;
  return (
    <SvgLabel
      x={x + (isRight ? 10 : -10)}
      y={y + 4}
      anchor={isRight ? 'start' : 'end'}
      paint={colour.ink}
      halo={colour.page}
    >
      {multiplierText(multiplier)}
    </SvgLabel>
  );
}

/** Real multipliers: value above and word below; of two close ones the second value stands below. */
function RealLabels({ placed }: { placed: readonly Placed[] }) {
  const sorted = [...placed].sort((a, b) => a.x - b.x);
  return sorted.map(({ multiplier, x, y }, i) => {
    const isAfterClose = i % 2 === 1 && x - (sorted[i - 1]?.x ?? -Infinity) < CLOSE;
    const isBeforeClose = i % 2 === 0 && (sorted[i + 1]?.x ?? Infinity) - x < CLOSE;
    return (
      <g key={i}>
        <SvgLabel x={x} y={isAfterClose ? y + 21 : y - 12} anchor="middle" paint={colour.ink} halo={colour.page}>
          {multiplierText(multiplier)}
        </SvgLabel>
        {isAfterClose || isBeforeClose ? null : (
          <SvgLabel x={x} y={y + 21} anchor="middle" face="reading" halo={colour.page}>
            {sideOf(multiplier)}
          </SvgLabel>
        )}
      </g>
    );
  });
}

function Labels({ placed, centre }: { placed: readonly Placed[]; centre: number }) {
  const labelled = placed.slice(0, LABELLED);
  const isReal = ({ multiplier }: Placed) => toDouble(multiplier.im) === 0;
  return (
    <g>
      <RealLabels placed={labelled.filter(isReal)} />
      {labelled
        .filter((one) => !isReal(one))
        .map((one, i) => (
          <ComplexLabel key={i} placed={one} centre={centre} />
        ))}
    </g>
  );
}

/** The multipliers around the unit circle: the same mapping as on the clef, large. */
export function UnitCircle({ multipliers, width, height }: UnitCircleProps) {
  const radius = Math.min(height / 2 - 20, width / (2 * REACH) - 4, 64);
  const isReal = (multipliers ?? []).every(({ im }) => toDouble(im) === 0);
  const onlyRight = isReal && (multipliers ?? []).every((m) => toDouble(m.re) >= 0 || multiplierSize(m) <= 1);
  const x = onlyRight ? width * 0.36 : width / 2;
  const y = height / 2;
  const scale = onlyRight ? Math.min(height / 2 - 20, (width * 0.6) / REACH, 80) : radius;
  const placed = (multipliers ?? []).map((multiplier) => {
    const p = unitCirclePosition(multiplier);
    return { multiplier, x: x + p.x * scale, y: y - p.y * scale };
  });
  const words = multipliers
    ? `${multipliers.length} ${multipliers.length === 1 ? 'multiplier' : 'multipliers'}: ${multipliers.map((m) => `${multiplierText(m)}, ${sideOf(m)}`).join('; ')}`
    : 'multipliers are not known';
  return (
    <View role="img" aria-label={words}>
      <svg width={width} height={height} aria-hidden>
        <path d={`M8 ${y}H${width - 8}`} stroke={colour.staff} />
        <circle cx={x} cy={y} r={scale} fill="none" stroke={colour.ink} strokeWidth={1.6} />
        {multipliers ? <path d={`M${x + scale - 5} ${y}h10`} stroke={colour.ink} strokeWidth={2.4} /> : null}
        <path d={placed.map((p) => dotPath(p.x, p.y, 4)).join('')} fill={colour.ink} />
        <SvgLabel x={x} y={y + scale + 16} anchor="middle" halo={colour.page}>
          |μ| = 1
        </SvgLabel>
        <Labels placed={placed} centre={x} />
      </svg>
    </View>
  );
}
