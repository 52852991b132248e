import type { CheckReport } from '@/schemas/generated/contract';
import { readClaim } from '@/server/checks/read-claim';
import { caseRequest } from '@/tests/reference/case-request';
import { catalogued, checkBody, documentOf, soundSystem } from '@/tests/reference/check-body';
import { loadCases } from '@/tests/reference/load-cases';
import type { ComplexNumber, ReferenceCase } from '@/tests/reference/reference-case';

const EPS = Number.EPSILON;
const cases = loadCases();
const accepted = cases.filter(({ expect: { verdict } }) => verdict === 'accept');

/** Growth of a segment, at most; from it the accuracy of everything follows. */
const SEGMENT_NORM = 1e3;

/**
 * Share of the period to which it is found. A corrected orbit misses its nodes by at most 1e-12 + 100·eps·‖Mᵢ‖ with
 * ‖Mᵢ‖ < 1e3, which bounds it for all. Where the point is not moved along a family of dimension above 1 the miss is the
 * rounding of a few hundred steps, 1 ulp each.
 */
const periodTolerance = (units: number): number => (units > 4 ? 1e-12 + 100 * EPS * SEGMENT_NORM : 500 * EPS);

/**
 * Relative accuracy of a multiplier: M is a product of K segments with norms below 1e3, and an eigenvalue of it moves by
 * eps·‖M‖ times its condition (below 50 in these cases), unless the sweeps separate it; 1e-8 is what is asked of all.
 */
const multiplierTolerance = (segments: number): number => Math.min(1e-8, 50 * EPS * SEGMENT_NORM ** segments);

function reportOf(reference: ReferenceCase, inline = false): CheckReport {
  const { report, errors } = checkBody(caseRequest(reference, { inline }).body);
  expect(errors).toEqual([]);
  return report!;
}

/** Families whose field has a symplectic form. */
const HAMILTONIAN = new Set([
  'Restricted three-body (planar)',
  'Restricted three-body (spatial)',
  'Three-body (planar, equal masses)',
  'Henon-Heiles',
  'Collinear helium (eZe, regularised)',
]);

const codesOf = ({ findings }: CheckReport) => findings.map(({ code }) => code);
const blockersOf = ({ findings }: CheckReport) => findings.filter(({ severity }) => severity === 'blocker');

/** Lay the found multipliers on the expected ones, each expected one taking the nearest that is left. */
function expectMultipliers(found: ComplexNumber[], expected: ComplexNumber[], tolerance: number): void {
  const left = found.map(({ re, im }) => ({ re: Number(re), im: Number(im) }));
  expect(left).toHaveLength(expected.length);
  for (const value of expected) {
    const [re, im] = [Number(value.re), Number(value.im)];
    const distances = left.map((one) => Math.hypot(one.re - re, one.im - im));
    const nearest = distances.indexOf(Math.min(...distances));
    expect(distances[nearest]! / Math.hypot(re, im)).toBeLessThan(tolerance);
    left.splice(nearest, 1);
  }
}

/** Stability in our words, from the multipliers of the case. */
function stabilityOf({ multipliers, unit_multipliers: units }: ReferenceCase): string {
  const moduli = multipliers!.map(({ re, im }) => Math.hypot(Number(re), Number(im)));
  const outside = moduli.filter((modulus) => modulus > 1 + 1e-9).length;
  const inside = moduli.filter((modulus) => modulus < 1 - 1e-9).length;
  if (outside > 0) return outside === moduli.length - 1 ? 'unstable' : 'saddle';
  return inside === moduli.length - 1 && units === 1 ? 'stable' : 'neutral';
}

describe.each([
  ['the built-in systems', false],
  ['documents of their own', true],
])('the orbits of the reference cases, in %s', (_, inline) => {
  const list = inline ? accepted.filter((one) => caseRequest(one).slug !== null) : accepted;

  it.each(list.map((one) => [one.id, one] as const))('%s is confirmed with every figure', (_, reference) => {
    const report = reportOf(reference, inline);
    expect(blockersOf(report)).toEqual([]);
    expect(report.verdict).toBe('closes');
    const orbit = report.orbit!;
    const units = reference.unit_multipliers!;
    const tolerance = periodTolerance(units);
    const period = Number(reference.period);
    expect(Math.abs(Number(orbit.period) - period) / period).toBeLessThan(tolerance);
    expect(orbit.returns).toBe(reference.crossings!.directed);
    expect(orbit.prime).toBe(true);
    orbit.crossings.forEach(({ returnTime }, i) => {
      // A return time is a difference of two crossings, each as far off as the orbit is, over the cosine there.
      const slack = (4 * tolerance * period) / orbit.smallestTransversality;
      expect(Math.abs(Number(returnTime) - Number(reference.return_times![i]))).toBeLessThan(slack);
    });
    expect(orbit.unitMultipliers).toBe(units);
    const all = [...orbit.multipliers, { re: '1', im: '0' }];
    expectMultipliers(all, reference.multipliers!, multiplierTolerance(report.correction!.segments));
    expect(orbit.stability).toBe(stabilityOf(reference));
    const { flow, liouville, pairing } = orbit.selfCheck;
    // Rounding in one segment; through a close approach a segment's derivative is larger on the way than at its end.
    expect(flow).toBeLessThan(report.correction!.segments === 1 ? 1e-14 : 2e-12);
    expect(Math.abs(liouville!)).toBeLessThan(1e-10);
    if (HAMILTONIAN.has(reference.family)) expect(pairing).toBeLessThan(1e-10);
  });
});

describe('the crossings of the reference cases', () => {
  it.each(accepted.map((one) => [one.id, one] as const))('%s crosses where it is said to', (_, reference) => {
    const orbit = reportOf(reference).orbit!;
    const directed = reference.crossing_list!.filter(({ sign }) => sign === reference.section.direction);
    expect(orbit.crossings).toHaveLength(directed.length);
    orbit.crossings.forEach(({ point }, k) => {
      reference.system.variables.forEach((name, i) => {
        const [low, high] = orbit.extent[i]!;
        const size = Math.max(high! - low!, 1e-6 * Math.max(...orbit.extent.map(([a, b]) => b! - a!)));
        // Nodes are right to the residual allowed to a segment; from there to a crossing it grows by less than 1e3.
        const slack = SEGMENT_NORM * (1e-12 + 100 * EPS * SEGMENT_NORM);
        expect(Math.abs(Number(point[i]) - Number(directed[k]!.point[name])) / size).toBeLessThan(slack);
      });
    });
  });
});

/** The findings that say each reason; at least one of them is there, as a blocker. */
const BLOCKERS: Record<string, readonly string[]> = {
  'multiple-of-prime': ['period-is-multiple'],
  'off-section': ['point-off-section'],
  'wrong-direction': ['wrong-crossing-direction'],
  'too-few-digits': ['too-few-digits'],
  equilibrium: ['equilibrium'],
  collision: ['singularity'],
  escape: ['escapes', 'singularity'],
  'wrong-claim': ['returns-differ', 'return-times-differ', 'multipliers-differ'],
  'zero-period': ['no-return'],
  'non-transverse': ['tangent-crossing'],
};

/** Blockers that are true as well: what runs away does not return either. */
const TRUE_AS_WELL: Record<string, readonly string[]> = { escape: ['no-return'], 'not-closed': ['no-return'] };

/** What does not close is explained by the orbit that the correction ends on or that closes later, where there is one. */
const EXPLAINED = new Set(['wrong-period', 'half-period']);
const OPEN = new Set([...EXPLAINED, 'not-closed', 'wrong-system']);
const MALFORMED = new Set(['bad-number', 'bad-point', 'bad-system', 'zero-period']);

describe('the refused and flagged reference cases', () => {
  const refused = cases.filter(({ expect: { verdict, reason } }) => verdict !== 'accept' && reason !== 'duplicate');

  it.each(refused.map((one) => [one.id, one.expect.reason, one] as const))(
    '%s is told its reason, %s, and nothing false',
    (id, reason, reference) => {
      const { report, errors } = checkBody(caseRequest(reference).body);
      if (report === null) {
        expect(MALFORMED).toContain(reason);
        expect(errors.length).toBeGreaterThan(0);
        return;
      }
      const blockers = blockersOf(report).map(({ code }) => code);
      if (OPEN.has(reason)) {
        expect(report.verdict).toBe('does-not-close');
        expect(blockers.filter((code) => !(TRUE_AS_WELL[reason] ?? []).includes(code))).toEqual([]);
        if (EXPLAINED.has(reason)) expect(codesOf(report)).toEqual(['orbit-nearby']);
        return;
      }
      if (id === 'as-published-butterfly1') {
        // Fifteen digits are typed, of which five belong to the orbit: it is another one, and said to be near.
        expect(report.verdict).toBe('does-not-close');
        expect(codesOf(report)).toEqual(['orbit-nearby']);
        return;
      }
      const wanted = BLOCKERS[reason]!;
      expect(blockers.filter((code) => wanted.includes(code))).toHaveLength(1);
      expect(blockers.filter((code) => ![...wanted, ...(TRUE_AS_WELL[reason] ?? [])].includes(code))).toEqual([]);
    },
  );

  it.each([
    ['half-period-lorenz-AB', '1.5586522107161747'],
    ['half-period-moebius', '12.566370614359172'],
    ['third-period-duffing', '6.283185307179587'],
  ])('%s is offered its whole period', (id, value) => {
    const { report } = checkBody(caseRequest(cases.find((one) => one.id === id)!).body);
    expect(report!.suggestion).toEqual({ field: 'period', value, verdict: 'closes' });
  });
});

describe('orbits that are known already', () => {
  const byId = (id: string) => cases.find((one) => one.id === id)!;
  const sectionOf = (reference: ReferenceCase): string => {
    const { body } = caseRequest(reference);
    const read = readClaim(soundSystem(documentOf(body)), body);
    return read.ok ? read.claim.section : '';
  };
  const entry = (id: string) => catalogued(`entry of ${id}`, sectionOf(byId(id)), reportOf(byId(id)));
  const lorenz = accepted.filter(({ id }) => /^lorenz-[AB]+$/.test(id));
  const catalogue = lorenz.map(({ id }) => entry(id));

  it.each(cases.filter(({ expect: { reason } }) => reason === 'duplicate').map((one) => [one.id, one] as const))(
    '%s is recognised from another start',
    (_, reference) => {
      const { report } = checkBody(caseRequest(reference).body, catalogue);
      expect(report!.matches).toEqual([
        expect.objectContaining({
          accession: `entry of ${reference.duplicate_of}`,
          relation: 'same-other-start',
          lettersDiffering: 0,
        }),
        ...report!.matches.slice(1),
      ]);
      expect(codesOf(report!)).toContain('already-known');
    },
  );

  it('are recognised on another section, and as images of each other', () => {
    const { report } = checkBody(caseRequest(byId('lorenz-gt-5-a')).body, catalogue);
    expect(report!.matches[0]).toMatchObject({ accession: 'entry of lorenz-AABAB', relation: 'same-other-start' });
    const mirrored = checkBody(caseRequest(byId('lorenz-ABB')).body, [entry('lorenz-AAB')]).report!;
    expect(mirrored.matches).toEqual([
      expect.objectContaining({ relation: 'symmetric-image', symmetry: 'half-turn', lettersDiffering: 1 }),
    ]);
    expect(codesOf(mirrored)).not.toContain('already-known');
  });

  it('are recognised when they are run through three times', () => {
    const { report } = checkBody(caseRequest(byId('triple-period-lorenz-AB')).body, catalogue);
    expect(report!.matches).toEqual([
      expect.objectContaining({ accession: 'entry of lorenz-AB', relation: 'multiple-of' }),
    ]);
  });

  it('are told apart from all others', () => {
    for (const { id } of lorenz) {
      const { report } = checkBody(caseRequest(byId(id)).body, catalogue);
      const same = report!.matches.filter(({ relation }) => relation !== 'symmetric-image');
      expect(same).toEqual([expect.objectContaining({ accession: `entry of ${id}`, relation: 'same' })]);
    }
  });
});
