import type { CheckReport } from '@/schemas/generated/contract';
import { checkOrbit } from '@/server/checks/check-orbit';
import { type ClaimBody, readClaim } from '@/server/checks/read-claim';
import { systemOf } from './claims';

/** Kepler's problem: about every bound orbit a family of energy, angular momentum and direction. */
const kepler = systemOf({
  name: 'Kepler',
  variables: [{ name: 'x' }, { name: 'y' }, { name: 'u' }, { name: 'v' }],
  parameters: [],
  equations: { x: 'u', y: 'v', u: '-x/(x^2 + y^2)^(3/2)', v: '-y/(x^2 + y^2)^(3/2)' },
  invariants: [
    { name: 'energy', formula: '(u^2 + v^2)/2 - 1/sqrt(x^2 + y^2)' },
    { name: 'angular_momentum', formula: 'x*v - y*u' },
  ],
});

/** Eccentricity 0.6: pericentre 0.4, speed there 2, period 2π. */
const ELLIPSE: ClaimBody = {
  section: { formula: 'y' },
  point: ['0.4', '0', '0', '2'],
  period: '6.283185307179586',
};

const kept = (claim: Partial<ClaimBody>): CheckReport =>
  checkOrbit({ system: kepler, claim: { ...ELLIPSE, ...claim } });

describe('the quantity held in a family', () => {
  it('is the point unless one is named', () => {
    const { correction, orbit, verdict } = kept({});
    expect(verdict).toBe('closes');
    expect(correction!.held).toBe('the point, as near as its family allows; the period is free');
    expect(correction!.freeDirections).toBe(3);
    expect(orbit!.unitMultipliers).toBe(4);
  });

  it.each(['x', 'v', 'energy', 'angular_momentum'])('may be %s', (hold) => {
    const { correction, verdict } = kept({ hold });
    expect(verdict).toBe('closes');
    expect(correction!.held).toBe(`${hold}, and the point, as near as its family allows; the period is free`);
    expect(correction!.freeDirections).toBe(3);
  });

  it('keeps its value where the correction moves the point', () => {
    // Circles of every radius r < 1 about the origin in the plane w = 0, which attracts: w' = −w. A start above the plane is
    // moved onto it and to y = 0; what becomes of x depends on what is held.
    const system = systemOf({
      name: 'attracting plane',
      variables: [{ name: 'x' }, { name: 'y' }, { name: 'w' }],
      parameters: [],
      equations: { x: '-y', y: 'x', w: '-w' },
      invariants: [{ name: 'radius', formula: 'sqrt(x^2 + y^2)' }],
    });
    const moved = (hold?: string): number[] => {
      const claim = { section: { formula: 'y - w/2' }, point: ['0.6', '0.1', '0.2'], period: '6.28' };
      const report = checkOrbit({ system, claim: { ...claim, ...(hold !== undefined && { hold }) } });
      expect(report.correction!.freeDirections).toBe(1);
      return report.orbit!.point.map(Number);
    };
    const at = (point: number[], expected: number[]) =>
      point.forEach((value, i) => expect(Math.abs(value - expected[i]!)).toBeLessThan(1e-14));
    // Without it, the shortest way: about where it was.
    expect(Math.abs(moved()[0]! - 0.6)).toBeLessThan(1e-4);
    at(moved('x'), [0.6, 0, 0]);
    at(moved('radius'), [Math.hypot(0.6, 0.1), 0, 0]);
  });

  it('is said not to change along the family where it does not', () => {
    // Circles of one radius about every centre on a line: z is the family, x'' = −x does not know it.
    const system = systemOf({
      name: 'cylinder of cycles',
      variables: [{ name: 'x' }, { name: 'y' }, { name: 'z' }],
      parameters: [],
      equations: { x: 'x - y - x*(x^2 + y^2)', y: 'x + y - y*(x^2 + y^2)', z: '0' },
    });
    const claim = { section: { formula: 'y' }, point: ['1', '0', '0.3'], period: '6.283185307179586', hold: 'x' };
    const { correction } = checkOrbit({ system, claim });
    expect(correction!.freeDirections).toBe(1);
    expect(correction!.held).toMatch(/x does not change along the family/);
  });

  it('has no effect on an isolated orbit', () => {
    const system = systemOf({
      name: 'Hopf',
      variables: [{ name: 'x' }, { name: 'y' }],
      parameters: [],
      equations: { x: 'x - y - x*(x^2 + y^2)', y: 'x + y - y*(x^2 + y^2)' },
    });
    const claim = {
      section: { formula: 'y' },
      point: ['1.00001', '0'],
      period: '6.2832',
      hold: 'x',
      tolerance: '1e-4',
    };
    const { correction, orbit } = checkOrbit({ system, claim });
    expect(Math.abs(Number(orbit!.point[0]) - 1)).toBeLessThan(1e-14);
    expect(correction!.held).toBe('the section; point and period are free');
  });

  it('is a variable or an invariant, and the error says which there are', () => {
    const read = readClaim(kepler, { ...ELLIPSE, hold: 'jacobi' });
    expect(read.ok || read.errors).toMatchObject([
      {
        pointer: '/hold',
        message:
          'Only a variable or an invariant can be held: x, y, u, v, energy, angular_momentum. jacobi is neither.',
      },
    ]);
  });
});

describe('reciprocal pairs of multipliers', () => {
  it('are measured in a Hamiltonian flow that is given in velocities', () => {
    expect(kept({}).orbit!.selfCheck.pairing).toBe(0);
  });

  it('are measured on an orbit that a reversing symmetry maps onto itself', () => {
    // x' = y, y' = −x, z' = 0.3 x z: no symplectic form in three dimensions, but (x, −y, z) turns time round … of z too.
    const system = systemOf({
      name: 'reversible',
      variables: [{ name: 'x' }, { name: 'y' }, { name: 'z' }],
      parameters: [],
      equations: { x: 'y', y: '-x', z: '3/10*y*z' },
      symmetries: [{ name: 'mirror', map: { x: 'x', y: '-y', z: 'z' }, reversesTime: true }],
    });
    const claim = { section: { formula: '-y' }, point: ['1', '0', '0'], period: '6.283185307179586' };
    expect(checkOrbit({ system, claim }).orbit!.selfCheck.pairing).toBeLessThan(1e-14);
  });

  it('are not asked of a flow that contracts', () => {
    const system = systemOf({
      name: 'Hopf',
      variables: [{ name: 'x' }, { name: 'y' }],
      parameters: [],
      equations: { x: 'x - y - x*(x^2 + y^2)', y: 'x + y - y*(x^2 + y^2)' },
    });
    const claim = { section: { formula: 'y' }, point: ['1', '0'], period: '6.283185307179586' };
    expect(checkOrbit({ system, claim }).orbit!.selfCheck.pairing).toBeNull();
  });
});
