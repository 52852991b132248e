import { type Finding } from '@/schemas/generated/contract';
import { type Claim } from '@/server/checks/claim';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { isEquilibrium } from '@/server/numerics/periodic/is-equilibrium';

/** Check that the flow moves at the point, as far as its digits say. */
export function equilibrium({ flow, point }: Claim, start: Float64Array): Finding[] {
  const halfUnits = Float64Array.from(point, ({ halfUnit }) => halfUnit);
  if (!isEquilibrium(flow, start, halfUnits)) return [];
  const speed = Math.hypot(...flow.field(start));
  return [
    finding('equilibrium', {
      message: `The point is an equilibrium: the flow stands still there (speed ${figure(speed)}), and every time closes.`,
      value: speed,
      limit: 0,
    }),
  ];
}
