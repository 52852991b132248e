import type { CheckReport } from '@/schemas/generated/contract';
import { checkOrbit, type CheckOptions } from '@/server/checks/check-orbit';
import { validatorOf } from '@/server/schema-registry';
import { lorenz, LORENZ_AB } from './claims';

const check = (digits: number, more: Partial<CheckOptions> = {}): CheckReport =>
  checkOrbit({ system: lorenz, claim: { ...LORENZ_AB, digits }, ...more });

/** Computed elsewhere with 70 digits; agrees with D. Viswanath, Nonlinearity 16 (2003) 1035, in the 14 printed there. */
const PERIOD = '1.558652210716174727567870209212696070528480548997243935889522';

describe('a check that asks for more digits than doubles have', () => {
  it('gives point, period and times that many, and says so', () => {
    const report = check(45);
    const validate = validatorOf('check-report');
    expect(validate(report) || validate.errors).toBe(true);
    const { period, point, crossings } = report.orbit!;
    expect(period).toMatch(/^1\.5586522107161747275678702092126960705284805\d$/);
    expect(Math.abs(Number(period.slice(40)) - Number(PERIOD.slice(40, period.length)))).toBeLessThanOrEqual(1);
    expect(report.digits!.confirmed).toBe(45);
    expect(crossings.map(({ point: [x] }) => x!.replace('-', '').length)).toEqual([46, 46]);
    expect(crossings.at(-1)).toMatchObject({ time: period, point });
    expect(crossings[0]!.transversality).toBeGreaterThan(0.5);
    expect(report.findings).toEqual([]);
  });

  it('leaves a report as it is up to the digits of doubles', () => {
    const { engine: one, ...plain } = checkOrbit({ system: lorenz, claim: LORENZ_AB });
    const { engine: two, ...asked } = check(17);
    expect(asked).toEqual(plain);
    expect(one.version).toBe(two.version);
  });

  it('does not look for digits of what does not close', () => {
    const report = checkOrbit({ system: lorenz, claim: { ...LORENZ_AB, period: '1.7', digits: 40 } });
    expect(report.verdict).toBe('does-not-close');
    expect(report.findings.map(({ code }) => code)).not.toContain('not-refined');
  });

  it('keeps the digits of doubles and warns where its time ends before more are found', () => {
    let asked = 0;
    check(17, { shouldStop: () => (asked += 1) < 0 });
    const whole = asked;
    asked = 0;
    const report = check(100, { shouldStop: () => (asked += 1) > whole + 150 });
    expect(report.verdict).toBe('closes');
    expect(report.orbit!.period.length).toBeLessThan(20);
    expect(report.findings).toEqual([
      expect.objectContaining({ code: 'not-refined', severity: 'warning', value: 17, limit: 100 }),
    ]);
  });
});
