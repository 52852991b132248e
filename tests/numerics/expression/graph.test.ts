import { buildNode } from '@/server/numerics/expression/build-node';
import { Graph } from '@/server/numerics/expression/graph';
import { parseFormula } from '@/server/formulas/parse-formula';

const names = ['x', 'y', 'c'];

/** A graph with the states x and y and the parameter c, and a way to add formulas to it. */
function graphOf() {
  const graph = new Graph();
  const known = new Map([
    ['x', graph.state(0)],
    ['y', graph.state(1)],
    ['c', graph.parameter(0)],
  ]);
  const add = (formula: string): number => {
    const parsed = parseFormula(formula, new Set(names));
    if (!parsed.ok) throw new Error(parsed.error.message);
    return buildNode(graph, parsed.expression, known);
  };
  return { graph, add };
}

describe('Graph', () => {
  it.each([
    ['x*y', 'y*x'],
    ['x + y', 'y + x'],
    ['x*x', 'x^2'],
    ['x*x*(x*x)', 'x^4'],
    ['(-x)^2', 'x^2'],
    ['x - (-y)', 'x + y'],
    ['-(x - y)', 'y - x'],
    ['1/sqrt(x)', 'x^(-1/2)'],
    ['y/(x + y)^(3/2)', 'y*(x + y)^(-3/2)'],
    ['y/sqrt(x)^3', 'y*x^(-3/2)'],
    ['sqrt(x)^2', 'x'],
    ['2*3*x', '6*x'],
    ['x^0', '1'],
    ['0/x + y', 'y'],
    ['x^c*0', '0'],
  ])('holds %s and %s as one node', (one, other) => {
    const { add } = graphOf();
    expect(add(one)).toBe(add(other));
  });

  it('keeps 1/0 and 1/(-0) apart', () => {
    const { graph, add } = graphOf();
    expect(graph.node(add('1/0')).value).toBe(Infinity);
    expect(graph.node(add('1/(-0)')).value).toBe(-Infinity);
  });

  it('marks as static what depends on parameters alone', () => {
    const { graph, add } = graphOf();
    expect(graph.node(add('sin(c)^2/3 + c^c')).isStatic).toBe(true);
    expect(graph.node(add('sin(c)*x')).isStatic).toBe(false);
  });

  it('makes sine and cosine together, each the partner of the other', () => {
    const { graph, add } = graphOf();
    const [sine, cosine] = [add('sin(x)'), add('cos(x)')];
    expect([graph.node(sine).partner, graph.node(cosine).partner]).toEqual([cosine, sine]);
  });

  it('multiplies integer powers out up to 16 and makes a series of higher ones', () => {
    const { graph, add } = graphOf();
    expect(graph.node(add('x^16')).operation).toBe('square');
    expect(graph.node(add('x^15')).operation).toBe('multiply');
    expect(graph.node(add('x^17')).operation).toBe('power');
    expect(graph.node(add('x^-3')).operation).toBe('divide');
  });

  it('writes a varying exponent with exp and log', () => {
    const { add } = graphOf();
    expect(add('x^y')).toBe(add('exp(y*log(x))'));
  });
});
