import { View } from 'react-native';
import { Circle, G, Path, Svg } from 'react-native-svg';
import { dotPath } from '@/features/notation/dot-path';
import { type Multiplier, multiplierSize } from '@/features/notation/format-multiplier';
import { toDouble } from '@/features/notation/to-double';
import { unitCirclePosition } from '@/features/notation/unit-circle-position';
import { colour } from '@/features/ui';
import { multiplierLabels, sideOf } from './multiplier-labels';
import { multiplierText } from './multiplier-text';
import { PlotLabel } from './plot-label';
import { polylinePath } from './polyline-path';

export interface UnitCircleProps {
  /** `null`: not known, or meaningless. */
  multipliers: readonly Multiplier[] | null;
  width: number;
  height: number;
}

/** Largest distance of a multiplier from the centre, in radii. */
const REACH = 2.53;
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
  const labels = multiplierLabels(placed, { width, height, x, y, radius: scale });
  const words = multipliers
    ? `${multipliers.length} ${multipliers.length === 1 ? 'multiplier' : 'multipliers'}: ${multipliers.map((m) => `${multiplierText(m)}, ${sideOf(m)}`).join('; ')}`
    : 'multipliers are not known';
  return (
    <View role="img" aria-label={words}>
      <Svg width={width} height={height} aria-hidden>
        <Path d={`M8 ${y}H${width - 8}`} stroke={colour.staff} />
        <Circle cx={x} cy={y} r={scale} fill="none" stroke={colour.ink} strokeWidth={1.6} />
        {multipliers ? <Path d={`M${x + scale - 5} ${y}h10`} stroke={colour.ink} strokeWidth={2.4} /> : null}
        <Path d={placed.map((p) => dotPath(p.x, p.y, 4)).join('')} fill={colour.ink} />
        <PlotLabel x={x} y={y + scale + 16} anchor="middle" halo={colour.page}>
          |μ| = 1
        </PlotLabel>
        {labels.map(({ text, kind, leader, ...place }) => (
          <G key={`${text} ${place.x} ${place.y}`}>
            {leader ? (
              <Path d={polylinePath(leader.map((end) => [end.x, end.y] as const))} stroke={colour.staff} />
            ) : null}
            <PlotLabel
              {...place}
              anchor="middle"
              halo={colour.page}
              {...(kind === 'value' ? { paint: colour.ink } : { face: 'reading' as const })}
            >
              {text}
            </PlotLabel>
          </G>
        ))}
      </Svg>
    </View>
  );
}
