import { View } from 'react-native';
import { closedOrbit } from '@/features/checking/closed-orbit';
import { FigureRow } from '@/features/notation/figure-row';
import { formatMultiplierSize } from '@/features/notation/format-multiplier';
import type { CheckReport } from '@/schemas/generated/contract';

/** Below this cosine a crossing is nearly tangent. */
const NEAR_TANGENT = 1e-3;
/** Significant digits of a cosine. */
const COSINE_DIGITS = 4;

export interface ReportFiguresProps {
  report: CheckReport;
  muted?: boolean;
  /** In two columns where there is room. */
  columns?: boolean;
}

/** The figures of a report, always in this order, with their limits. */
export function ReportFigures({ report, columns = false, ...look }: ReportFiguresProps) {
  return columns ? (
    <div className="r-columns">
      <Rows report={report} {...look} compact />
    </div>
  ) : (
    <View>
      <Rows report={report} {...look} />
    </View>
  );
}

function Rows({ report, ...look }: { report: CheckReport; muted?: boolean; compact?: boolean }) {
  const { closure, correction, digits } = report;
  const orbit = closedOrbit(report);
  const limit = closure?.tolerance ?? 0;
  const against = (value: number) => ({ value, relation: value <= limit ? ('≤' as const) : ('>' as const), limit });
  const [largest] = orbit?.multipliers ?? [];
  return (
    <>
      {closure ? <FigureRow name="Closure as typed" {...look} {...against(closure.relative)} /> : null}
      {correction ? (
        <>
          <FigureRow name="Correction moves the point by" {...look} {...against(correction.shift)} />
          <FigureRow name="… and the period by" {...look} {...against(correction.periodShift)} />
          <FigureRow name="Closure after correction" {...look} value={correction.residual} />
        </>
      ) : null}
      {orbit ? (
        <>
          <FigureRow
            name="Returns counted; prime"
            {...look}
            value={`${orbit.returns}; ${orbit.prime ? 'yes' : 'no'}`}
          />
          <FigureRow
            name="Transversality, smallest"
            {...look}
            value={orbit.smallestTransversality.toPrecision(COSINE_DIGITS)}
            relation={orbit.smallestTransversality >= NEAR_TANGENT ? '≥' : '<'}
            limit={NEAR_TANGENT}
          />
          {largest ? <FigureRow name="Largest multiplier" {...look} value={formatMultiplierSize(largest)} /> : null}
          <FigureRow name="Stability" {...look} value={orbit.stability} />
        </>
      ) : null}
      {digits ? (
        <FigureRow name="Digits typed; confirmed" {...look} value={`${digits.typed}; ${digits.confirmed}`} />
      ) : null}
    </>
  );
}
