import { type Finding } from '@/schemas/generated/contract';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { RETURN_WINDOW } from '@/server/checks/limits';
import { type RawRun } from '@/server/checks/study';

/** The end counts as the farthest point when the extents reach no further than this. */
const FARTHEST = 1 - 1e-9;

/** Say that the flow does not come back to the section, and whether it is on its way out. */
export function noReturn(raw: RawRun, period: number): Finding[] {
  const findings = [
    finding('no-return', {
      message: `No crossing in the counted direction happens in 0 < t ≤ ${figure(RETURN_WINDOW * period)}.`,
      value: 0,
      limit: 1,
    }),
  ];
  if (runsAway(raw)) {
    const message =
      `The solution does not return: at t = ${figure(period)} it is farther from the start ` +
      `(${figure(raw.absolute)}) than at any time before.`;
    findings.push(finding('escapes', { message, value: raw.absolute }));
  }
  return findings;
}

/** Whether the end is the farthest place from the start, and farther than the start is from the origin. */
function runsAway({ extent, start, sizes, relative, absolute }: RawRun): boolean {
  const { lowest, highest } = extent;
  let farthest = 0;
  start.forEach((value, i) => {
    farthest = Math.max(farthest, (highest[i]! - value) / sizes[i]!, (value - lowest[i]!) / sizes[i]!);
  });
  return relative >= FARTHEST * farthest && absolute > Math.hypot(...start);
}
