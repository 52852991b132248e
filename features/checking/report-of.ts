import type { Check, CheckReport } from '@/schemas/generated/contract';

/** The report that a finished check carries; null while there is none. */
export function reportOf(check: Check): CheckReport | null {
  const { verdict, findings, matches, engine } = check;
  if (verdict === null || findings === null || matches === null || engine === null) return null;
  const { closure, correction, orbit, digits, expectedClosure, endPoint, suggestion } = check;
  return {
    verdict,
    closure,
    correction,
    orbit,
    findings,
    matches,
    digits,
    expectedClosure,
    endPoint,
    suggestion,
    engine,
  };
}
