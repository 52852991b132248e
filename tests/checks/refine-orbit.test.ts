import Decimal from 'decimal.js';
import type { CheckRequest } from '@/schemas/generated/contract';
import { refineOrbit, type Refinement } from '@/server/checks/refine-orbit';
import { caseRequest } from '@/tests/reference/case-request';
import { checkBody, documentOf, soundSystem } from '@/tests/reference/check-body';
import { loadCases } from '@/tests/reference/load-cases';
import type { ReferenceCase } from '@/tests/reference/reference-case';

const Exact = Decimal.clone({ precision: 120 });
const cases = loadCases();
const byId = (id: string): ReferenceCase => cases.find((one) => one.id === id)!;

function refine(body: CheckRequest, digits: number, shouldStop?: () => boolean) {
  const { report } = checkBody(body);
  return refineOrbit({ system: soundSystem(documentOf(body)), claim: body, orbit: report!.orbit!, digits, shouldStop });
}

function refined(body: CheckRequest, digits: number): Refinement {
  const result = refine(body, digits);
  if (!result.ok) throw new Error(result.message);
  return result;
}

/** A figure of a size, right to half a unit of its last digit asked for; half a unit is its rounding, the rest ours. */
function expectDigits(text: string, expected: string, { digits, size }: { digits: number; size: Decimal.Value }): void {
  const place = new Exact(10).pow(
    new Exact(size)
      .abs()
      .log(10)
      .floor()
      .minus(digits - 1),
  );
  const miss = new Exact(text).minus(expected).abs();
  expect(miss.lessThan(place.times(0.51)) ? 'right' : `${miss.toExponential(2)} of ${place.toExponential(0)}`).toBe(
    'right',
  );
}

/** Orbits that are alone: no family, so that every digit is decided by the system and its parameters. */
const isolated = cases.filter(
  ({ kind, expect: { verdict }, unit_multipliers: units, stability }) =>
    kind === 'orbit' && verdict === 'accept' && units === 1 && stability !== undefined,
);

describe('an orbit refined to 38 digits', () => {
  it('has enough cases to be held against', () => {
    expect(isolated.length).toBeGreaterThan(20);
  });

  it.each(isolated.map((one) => [one.id, one] as const))('%s has the digits of the reference', (_, reference) => {
    const { body, exact } = caseRequest(reference);
    const digits = 38;
    const result = refined(body, digits);
    expect(result.held).toBeNull();
    expectDigits(result.period, exact.period, { digits, size: exact.period });
    const { extent } = checkBody(body).report!.orbit!;
    result.point.forEach((text, i) => {
      const [low, high] = extent[i]!;
      expectDigits(text, exact.point[i]!, { digits, size: high! - low! });
    });
    reference.return_times!.forEach((time, k) => {
      // The reference prints fewer digits of these: half a unit of its last place.
      const unit = new Exact(10).pow(-(time.split('.')[1]?.length ?? 0));
      expect(new Exact(result.returnTimes[k]!).minus(time).abs().lessThan(unit.times(0.51))).toBe(true);
    });
    expect(result.crossings.at(-1)!.point).toEqual(result.point);
  });
});

describe('the Lorenz orbit AB', () => {
  const { body } = caseRequest(byId('lorenz-AB'));

  /** Computed elsewhere with 70 digits; agrees with D. Viswanath, Nonlinearity 16 (2003) 1035, in the 14 printed there. */
  it('has the sixty digits that are known of it', () => {
    const { period, point } = refined(body, 61);
    expect(period).toBe('1.558652210716174727567870209212696070528480548997243935889522'.slice(0, 62));
    expect(point[0]!.slice(0, 63)).toBe(
      '-13.763610682134200525014401054361653864100864854092368453537864'.slice(0, 63),
    );
    expect(point[2]).toBe('27');
  });

  it('has a hundred digits that a hundred and three confirm, for at most 3.3 whole integrations', () => {
    const hundred = refined(body, 100);
    const more = refined(body, 103);
    expectDigits(hundred.period, more.period, { digits: 100, size: 1 });
    expectDigits(hundred.point[1]!, more.point[1]!, { digits: 100, size: 44 });
    expect(hundred.flows).toBeLessThan(3.3);
    expect(refined(body, 30).flows).toBeLessThan(2);
  });

  it('crosses at half its period at the image of its start: the half-turn maps it to itself', () => {
    const { period, returnTimes, crossings, point } = refined(body, 50);
    expectDigits(returnTimes[0]!, new Exact(period).div(2).toString(), { digits: 49, size: 1 });
    expectDigits(crossings[0]!.point[0]!, new Exact(point[0]!).negated().toString(), { digits: 49, size: 32 });
  });
});

describe('an orbit of a family', () => {
  const familyOf = (id: string, hold?: string): CheckRequest => {
    const { body, exact } = caseRequest(byId(id));
    return { ...body, point: exact.point, ...(hold !== undefined && { hold }) };
  };

  /** The published initial conditions fix x; with it held at its digits, the period follows to all of them. */
  it.each(['cr3bp-sharp01', 'cr3bp-bs'])('%s is one orbit when a coordinate is held', (id) => {
    const digits = 36;
    const { period, point, held } = refined(familyOf(id, 'x'), digits);
    const reference = byId(id);
    expect(held).toBe('x');
    expect(point[0]).toBe(new Exact(reference.point['x']!).toDecimalPlaces(point[0]!.split('.')[1]!.length).toString());
    expectDigits(period, reference.period, { digits, size: reference.period });
  });

  it('says that the point is as near as its family allows where nothing is held', () => {
    const result = refined(familyOf('cr3bp-oterma-L1'), 30);
    expect(result.held).toBe('the point, as near as its family allows');
    // It is another member, within the rounding of doubles; it closes to all its digits all the same.
    expect(Math.abs(Number(result.period) - Number(byId('cr3bp-oterma-L1').period))).toBeLessThan(1e-12);
    expect(Number(result.residual)).toBeLessThan(1e-30);
  });
});

describe('the member of a family', () => {
  /** Half a unit of the last digit for either rounding, sizes below 10. */
  it('is the same whatever number of digits is asked for, and when it is refined again', () => {
    const { body } = caseRequest(byId('cr3bp-oterma-L1'));
    const [thirty, sixty, hundred] = [30, 60, 100].map((digits) => refined(body, digits)) as [
      Refinement,
      Refinement,
      Refinement,
    ];
    expectDigits(thirty.period, sixty.period, { digits: 29, size: 1 });
    expectDigits(sixty.period, hundred.period, { digits: 59, size: 1 });
    const again = refineOrbit({
      ...{ system: soundSystem(documentOf(body)), claim: body, orbit: thirty, digits: 60 },
    }) as Refinement;
    expectDigits(again.period, thirty.period, { digits: 29, size: 1 });
    again.point.forEach((text, i) => expectDigits(text, thirty.point[i]!, { digits: 29, size: 1 }));
  });
});

describe('what cannot be refined', () => {
  const { body } = caseRequest(byId('lorenz-AB'));

  it('is an orbit that does not close', () => {
    const system = soundSystem(documentOf(body));
    const orbit = { point: ['-13.7', '-19.5', '27'], period: '1.9' };
    const result = refineOrbit({
      system,
      claim: { ...body, point: orbit.point, period: orbit.period },
      orbit,
      digits: 30,
    });
    expect(result).toMatchObject({ ok: false, reason: 'not-closed' });
  });

  it('says so when its time is over', () => {
    let asked = 0;
    const result = refine(body, 100, () => (asked += 1) > 400);
    expect(result).toMatchObject({ ok: false, reason: 'too-long' });
  });
});
