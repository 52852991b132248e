import type { SystemDocument } from '@/schemas/generated/contract';
import { checkSystem } from '@/server/formulas/check-system';
import { parseSection } from '@/server/formulas/parse-section';

const oscillator: SystemDocument = {
  name: 'oscillator',
  variables: [{ name: 'q' }, { name: 'p' }],
  parameters: [{ name: 'omega', value: '1/2' }],
  equations: { q: 'omega*p', p: '-omega*q' },
  sections: [{ name: 'rising', formula: 'q - 0', letters: [{ letter: 'A', where: 'p' }] }],
};
const forced: SystemDocument = {
  name: 'forced',
  variables: [{ name: 'v' }, { name: 'theta', modulus: '2*pi' }],
  parameters: [],
  equations: { v: 'cos(theta) - v', theta: '1' },
};

const errorsOf = (change: Partial<SystemDocument>) => {
  const checked = checkSystem({ ...oscillator, ...change }, '/system');
  return checked.ok ? [] : checked.errors;
};

describe('checkSystem', () => {
  it('reads parameters exactly and equations in the order of the variables', () => {
    const checked = checkSystem({ ...oscillator, equations: { p: '-omega*q', q: 'omega*p' } });
    if (!checked.ok) throw new Error('refused');
    expect(checked.system.parameters[0]).toMatchObject({ name: 'omega', read: { text: '1/2', value: 0.5 } });
    expect(checked.system.equations[1]).toMatchObject({ operator: '*', right: { name: 'q' } });
  });

  it('reads the modulus of an angle', () => {
    const checked = checkSystem(forced);
    expect(checked).toMatchObject({ ok: true, system: { variables: [{ modulus: null }, { modulus: 2 * Math.PI }] } });
  });

  it.each<[string, Partial<SystemDocument>, string, RegExp]>([
    ['an unknown name', { equations: { q: 'omega*r', p: '-q' } }, '/system/equations/q', /name r/],
    ['a missing equation', { equations: { q: 'p' } }, '/system/equations', /equation of p is missing/],
    ['an equation of nothing', { equations: { q: 'p', p: '-q', r: '1' } }, '/system/equations/r', /not a variable/],
    [
      'a symmetry of a stranger',
      { symmetries: [{ name: 's', map: { q: 'q', p: 'p', r: 'q' }, reversesTime: false }] },
      '/system/symmetries/0/map/r',
      /not a variable/,
    ],
    [
      'a symmetry with an image missing',
      { symmetries: [{ name: 's', map: { q: '-q' }, reversesTime: false }] },
      '/system/symmetries/0/map',
      /image of p is missing/,
    ],
    [
      'an equation of every object’s prototype',
      { equations: JSON.parse('{ "q": "p", "p": "-q", "__proto__": "1" }') as Record<string, string> },
      '/system/equations/__proto__',
      /not a variable/,
    ],
    [
      'a section that is a number',
      { sections: [{ name: 's', formula: 'omega - 1/2' }] },
      '/system/sections/0/formula',
      /no variable/,
    ],
    [
      'an incipit of a stranger',
      { sections: [{ name: 's', formula: 'q', incipit: { coordinate: 'r', levels: [2, 1, 0, -1, -2] } }] },
      '/system/sections/0/incipit/coordinate',
      /r is not a variable/,
    ],
    [
      'a modulus of zero',
      { variables: [{ name: 'q', modulus: '0*pi' }, { name: 'p' }] },
      '/system/variables/0/modulus',
      /positive/,
    ],
    ['a name twice', { parameters: [{ name: 'q', value: 1 }] }, '/system/parameters/0/name', /two things/],
    ['a function’s name', { parameters: [{ name: 'sin', value: 1 }] }, '/system/parameters/0/name', /function/],
    [
      'a parameter that is no number',
      { parameters: [{ name: 'omega', value: 'one' }] },
      '/system/parameters/0/value',
      /not a number/,
    ],
    [
      'a later definition',
      {
        definitions: [
          { name: 'a', formula: 'b' },
          { name: 'b', formula: 'q' },
        ],
      },
      '/system/definitions/0/formula',
      /name b/,
    ],
    [
      'a definition of itself',
      { definitions: [{ name: 'a', formula: 'a + 1' }] },
      '/system/definitions/0/formula',
      /name a/,
    ],
    [
      '33 parameters',
      { parameters: Array.from({ length: 33 }, (_, i) => ({ name: `c${i}`, value: 1 })) },
      '/system/parameters',
      /at most 32.*33/,
    ],
    [
      '17 variables',
      { variables: Array.from({ length: 17 }, (_, i) => ({ name: `v${i}` })) },
      '/system/variables',
      /at most 16.*17/,
    ],
    ['64,001 characters', { summary: 'x'.repeat(64_001) }, '/system', /at most 64000/],
  ])('refuses %s', (_, change, pointer, message) => {
    expect(errorsOf(change)).toContainEqual(
      expect.objectContaining({ pointer, message: expect.stringMatching(message) }),
    );
  });

  it('counts shared subexpressions once, and refuses more than 2,000', () => {
    const wide = Array.from({ length: 2100 }, (_, i) => `sin(q + ${i})`);
    const halves = [wide.slice(0, 330), wide.slice(330, 660), wide.slice(660, 990)].map((part) => part.join('+'));
    const definitions = halves.map((formula, i) => ({ name: `d${i}`, formula }));
    expect(errorsOf({ definitions })).toContainEqual(
      expect.objectContaining({ pointer: '/system/equations', message: expect.stringMatching(/at most 2000/) }),
    );
    const same = Array.from({ length: 900 }, () => 'sin(q)').join('+');
    expect(errorsOf({ equations: { q: same, p: 'q' } })).toEqual([]);
  });

  it('refuses a field that changes when an angle turns once', () => {
    const checked = checkSystem({ ...forced, equations: { v: 'theta - v', theta: '1' } });
    expect(checked).toMatchObject({
      ok: false,
      errors: [{ pointer: '/equations/v', message: expect.stringMatching(/sin\(theta - c\)/) }],
    });
  });
});

describe('parseSection', () => {
  const system = () => {
    const checked = checkSystem(oscillator);
    if (!checked.ok) throw new Error('refused');
    return checked.system;
  };

  it('knows an inline formula that equals a named section, with its letters', () => {
    expect(parseSection(system(), { formula: ' q-0' })).toMatchObject({
      section: { name: 'rising', letters: [{ letter: 'A' }] },
    });
    expect(parseSection(system(), { formula: 'q - 1' })).toMatchObject({ section: { name: null, letters: [] } });
  });

  it('turns a plane into a formula with the numbers as typed', () => {
    const plane = parseSection(system(), { plane: { normal: ['0', '-1/3'], through: ['5', '0.25'] } });
    expect(plane).toMatchObject({ section: { formula: '-1/3*(p - 0.25)' } });
  });

  it.each([
    ['an unknown section', 'falling', '/section', /no section falling.*rising/],
    ['a formula with an unknown name', { formula: 'r' }, '/section/formula', /name r/],
    [
      'a plane of the wrong dimension',
      { plane: { normal: ['1'], through: ['0', '0'] } },
      '/section/plane/normal',
      /2 variables/,
    ],
    ['a plane without normal', { plane: { normal: ['0', '0'], through: ['0', '0'] } }, '/section/plane/normal', /zero/],
  ])('refuses %s', (_, choice, pointer, message) => {
    expect(parseSection(system(), choice)).toMatchObject({
      ok: false,
      errors: [{ pointer, message: expect.stringMatching(message) }],
    });
  });
});
