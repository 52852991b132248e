import { checkOrbit } from '@/server/checks/check-orbit';
import type { CheckedSystem } from '@/server/formulas/checked-system';
import type { DatasetOrbit } from '@/tests/reference/dataset-line';

/** How far a check's figures are from those of a data set. */
export interface OrbitErrors {
  label: string;
  /** What is wrong, in words; empty where all agrees. */
  faults: string[];
  /** Relative. */
  period: number;
  /** Relative, of the unstable multiplier; 0 where the data set has none. */
  multiplier: number;
  /** Largest, relative to the period; 0 where the data set has none. */
  returnTimes: number;
  /** In sizes, as typed. */
  closure: number;
}

/** What is asked of every orbit. */
const PERIOD = 1e-12;
const MULTIPLIER = 1e-8;

/** Check one orbit of a data set as the server would, and compare. */
export function measureOrbit(system: CheckedSystem, { label, body, logMultiplier }: DatasetOrbit): OrbitErrors {
  const report = checkOrbit({ system, claim: body });
  const faults: string[] = [];
  const none = {
    label,
    faults,
    period: NaN,
    multiplier: NaN,
    returnTimes: NaN,
    closure: report.closure?.relative ?? NaN,
  };
  const blockers = report.findings.filter(({ severity }) => severity === 'blocker');
  if (!report.verdict.startsWith('closes')) faults.push(`verdict ${report.verdict}`);
  faults.push(...blockers.map(({ code }) => code));
  const { orbit } = report;
  if (orbit === null) return none;
  const period = Number(body.period);
  const moduli = orbit.multipliers.map(({ re, im }) => Math.hypot(Number(re), Number(im)));
  const errors = {
    period: Math.abs(Number(orbit.period) / period - 1),
    multiplier: logMultiplier === null ? 0 : Math.abs(Math.max(...moduli) / Math.exp(logMultiplier) - 1),
    returnTimes: Math.max(
      0,
      ...(body.returnTimes ?? []).map(
        (time, i) => Math.abs(Number(orbit.crossings[i]?.returnTime) - Number(time)) / period,
      ),
    ),
  };
  if (orbit.returns !== body.returns) faults.push(`${orbit.returns} returns, not ${body.returns}`);
  const isLettered = orbit.itinerary !== null && body.itinerary !== undefined;
  if (isLettered && orbit.itinerary !== body.itinerary) faults.push(`itinerary ${orbit.itinerary}`);
  if (!(errors.period <= PERIOD)) faults.push(`period off by ${errors.period.toExponential(1)}`);
  if (!(errors.returnTimes <= PERIOD)) faults.push(`return times off by ${errors.returnTimes.toExponential(1)}`);
  if (!(errors.multiplier <= MULTIPLIER)) faults.push(`multiplier off by ${errors.multiplier.toExponential(1)}`);
  return { ...none, ...errors };
}
