import type { SystemDocument } from '@/schemas/generated/contract';
import { checkSystem } from '@/server/formulas/check-system';
import { parseSection } from '@/server/formulas/parse-section';

const rotor: SystemDocument = {
  name: 'rotor',
  variables: [{ name: 'v' }, { name: 'theta', modulus: '2*pi' }],
  parameters: [{ name: 'omega', value: '3/2' }],
  equations: { v: 'cos(theta) - v', theta: 'omega' },
};

const pointersOf = (change: Partial<SystemDocument>): string[] => {
  const checked = checkSystem({ ...rotor, ...change });
  return checked.ok ? [] : checked.errors.map(({ pointer }) => pointer);
};

describe('checkAngles', () => {
  it.each<[string, Partial<SystemDocument>]>([
    ['a field of sines', {}],
    ['half the modulus in a square', { equations: { v: 'sin(theta/2)^2 - v', theta: 'omega' } }],
    ['what cancels to zero', { equations: { v: 'sin(theta)^2 + cos(theta)^2 - 1', theta: 'omega' } }],
    ['a steep function of the angle', { equations: { v: 'exp(20*sin(theta))*tan(theta) - v', theta: 'omega' } }],
    [
      'a symmetry that turns the angle',
      { symmetries: [{ name: 'half', map: { v: '-v', theta: 'theta + pi' }, reversesTime: false }] },
    ],
    [
      'a symmetry that reverses the angle',
      { symmetries: [{ name: 'back', map: { v: 'v', theta: '-theta' }, reversesTime: true }] },
    ],
  ])('lets %s pass', (_, change) => {
    expect(pointersOf(change)).toEqual([]);
  });

  it.each<[string, Partial<SystemDocument>, string]>([
    ['the bare angle', { equations: { v: 'theta - v', theta: 'omega' } }, '/equations/v'],
    ['half the modulus', { equations: { v: 'sin(theta/2) - v', theta: 'omega' } }, '/equations/v'],
    ['a faint dependence', { equations: { v: '1e-10*theta', theta: 'omega' } }, '/equations/v'],
    [
      'a formula that is defined for large coordinates only',
      { equations: { v: 'sqrt(v - 5)*theta', theta: 'omega' } },
      '/equations/v',
    ],
    ['a section', { sections: [{ name: 's', formula: 'theta - 1' }] }, '/sections/0/formula'],
    [
      'a letter',
      { sections: [{ name: 's', formula: 'sin(theta)', letters: [{ letter: 'A', where: 'theta' }] }] },
      '/sections/0/letters/0/where',
    ],
    ['an invariant', { invariants: [{ name: 'phase', formula: 'v*theta' }] }, '/invariants/0/formula'],
    [
      'the image of a coordinate',
      { symmetries: [{ name: 's', map: { v: 'v + theta', theta: 'theta' }, reversesTime: false }] },
      '/symmetries/0/map/v',
    ],
    [
      'half a turn of an image',
      { symmetries: [{ name: 's', map: { v: 'v', theta: 'theta/2' }, reversesTime: false }] },
      '/symmetries/0/map/theta',
    ],
    [
      'a definition that a formula uses',
      { definitions: [{ name: 'a', formula: 'theta^2' }], equations: { v: 'a', theta: 'omega' } },
      '/equations/v',
    ],
  ])('refuses %s', (_, change, pointer) => {
    expect(pointersOf(change)).toEqual([pointer]);
  });

  it('refuses an inline section with the name of the angle, and says how to write it', () => {
    const checked = checkSystem(rotor);
    if (!checked.ok) throw new Error('refused');
    expect(parseSection(checked.system, { formula: 'theta - 1' })).toMatchObject({
      ok: false,
      errors: [{ pointer: '/section/formula', message: expect.stringMatching(/theta.*sin\(theta - c\)/) }],
    });
    expect(parseSection(checked.system, { formula: 'sin(theta - 1)' })).toMatchObject({ ok: true });
  });
});
