import { View } from 'react-native';
import { closedOrbit } from '@/features/checking/closed-orbit';
import { FigureRow } from '@/features/notation/figure-row';
import { formatMultiplierSize } from '@/features/notation/format-multiplier';
import type { CheckReport } from '@/schemas/generated/contract';

/** Below this cosine a crossing is nearly tangent. */
const NEAR_TANGENT = 1e-3;
/** Significant digits of a cosine. */
const COSINE_DIGITS = 4;

/** The figures of a report, always in this order, with their limits. */
export function ReportFigures({ report, muted = false }: { report: CheckReport; muted?: boolean }) {
  const { closure, correction, digits } = report;
  const orbit = closedOrbit(report);
  const limit = closure?.tolerance ?? 0;
  const against = (value: number) => ({ value, relation: value <= limit ? ('≤' as const) : ('>' as const), limit });
  const [largest] = orbit?.multipliers ?? [];
  return (
    <View>
      {closure ? <FigureRow name="Closure as typed" muted={muted} {...against(closure.relative)} /> : null}
      {correction ? (
        <>
          <FigureRow name="Correction moves the point by" muted={muted} {...against(correction.shift)} />
          <FigureRow name="… and the period by" muted={muted} {...against(correction.periodShift)} />
          <FigureRow name="Closure after correction" muted={muted} value={correction.residual} />
        </>
      ) : null}
      {orbit ? (
        <>
          <FigureRow
            name="Returns counted; prime"
            muted={muted}
            value={`${orbit.returns}; ${orbit.prime ? 'yes' : 'no'}`}
          />
          <FigureRow
            name="Transversality, smallest"
            muted={muted}
            value={orbit.smallestTransversality.toPrecision(COSINE_DIGITS)}
            relation={orbit.smallestTransversality >= NEAR_TANGENT ? '≥' : '<'}
            limit={NEAR_TANGENT}
          />
          {largest ? <FigureRow name="Largest multiplier" muted={muted} value={formatMultiplierSize(largest)} /> : null}
          <FigureRow name="Stability" muted={muted} value={orbit.stability} />
        </>
      ) : null}
      {digits ? (
        <FigureRow name="Digits typed; confirmed" muted={muted} value={`${digits.typed}; ${digits.confirmed}`} />
      ) : null}
    </View>
  );
}
