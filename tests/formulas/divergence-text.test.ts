import { checkSystem } from '@/server/formulas/check-system';
import { divergenceText } from '@/server/formulas/divergence-text';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { randomStates } from '@/tests/systems/random-states';
import { StatedSystem } from '@/tests/systems/stated-system';

const STATES = 5;
/** Some dozens of roundings of terms of size 1 to 100. */
const ROUNDING = 1e-11;

function divergenceOf(equations: Record<string, string>, definitions: { name: string; formula: string }[] = []) {
  const names = Object.keys(equations);
  const result = checkSystem({
    name: 'under test',
    variables: names.map((name) => ({ name })),
    parameters: [{ name: 'k', value: '2' }],
    definitions,
    equations,
  });
  if (!result.ok) throw new Error(JSON.stringify(result.errors));
  return divergenceText(result.system);
}

describe('the divergence of a field', () => {
  it('is -(sigma + 1 + beta) for the Lorenz equations: E. N. Lorenz, J. Atmos. Sci. 20 (1963) 130–141 (from memory)', () => {
    const lorenz = builtInSystems.find(({ slug }) => slug === 'lorenz')!;
    const result = checkSystem(lorenz);
    expect(result.ok && divergenceText(result.system)).toBe('-sigma - 1 - beta');
  });

  it.each(builtInSystems.map((document) => ({ document, slug: document.slug })))(
    'is the sum of the derivatives that dual numbers give for $slug',
    ({ document }) => {
      const result = checkSystem(document);
      const text = result.ok ? divergenceText(result.system) : null;
      const stated = new StatedSystem(document);
      const n = document.variables.length;
      for (const x of randomStates(n, STATES)) {
        const expected = document.variables
          .map(({ name }, i) => {
            const direction = x.map((_, j) => (i === j ? 1 : 0));
            return stated.evaluate(document.equations[name]!, { x, direction }).d;
          })
          .reduce((sum, part) => sum + part, 0);
        expect(Math.abs(stated.at(text!, x) - expected)).toBeLessThan(ROUNDING);
      }
    },
  );

  it('multiplies out powers and products, and cancels what is equal', () => {
    expect(divergenceOf({ x: '(x + y)^2', y: '-(x + y)^2 + 3*k*y/2' })).toBe('3*k/2');
  });

  it('keeps decimals exact', () => {
    expect(divergenceOf({ x: '0.1*x + 1/3*x', y: '1e-3*y' })).toBe('1303/3000');
  });

  it('looks through definitions', () => {
    expect(divergenceOf({ x: 's*x', y: 'x' }, [{ name: 's', formula: 'x - y' }])).toBe('2*x - y');
  });

  it('takes functions of other variables as factors', () => {
    expect(divergenceOf({ x: 'x*sin(y)/k', y: 'exp(x)' })).toBe('sin(y)/k');
  });

  it('is null where it takes the derivative of a function', () => {
    expect(divergenceOf({ x: 'sin(x)', y: 'x' })).toBeNull();
  });

  it('is null where its text grows beyond what is read at a glance', () => {
    expect(divergenceOf({ x: '(x + y + k)^16', y: 'x' })).toBeNull();
  });
});
