/** A value and its derivative along one direction: a number a + b ε with ε² = 0. */
export interface Dual {
  v: number;
  d: number;
}

type Rule = [value: (x: number) => number, derivative: (x: number) => number];

const FUNCTIONS = new Map<string, Rule>([
  ['sqrt', [Math.sqrt, (x) => 0.5 / Math.sqrt(x)]],
  ['exp', [Math.exp, Math.exp]],
  ['log', [Math.log, (x) => 1 / x]],
  ['sin', [Math.sin, Math.cos]],
  ['cos', [Math.cos, (x) => -Math.sin(x)]],
]);

const constant = (v: number): Dual => ({ v, d: 0 });

const binary: Record<string, (a: Dual, b: Dual) => Dual> = {
  '+': (a, b) => ({ v: a.v + b.v, d: a.d + b.d }),
  '-': (a, b) => ({ v: a.v - b.v, d: a.d - b.d }),
  '*': (a, b) => ({ v: a.v * b.v, d: a.d * b.v + a.v * b.d }),
  '/': (a, b) => ({ v: a.v / b.v, d: (a.d * b.v - a.v * b.d) / (b.v * b.v) }),
};

/** a^b for a constant exponent. */
function power(a: Dual, b: Dual): Dual {
  if (b.d !== 0) throw new RangeError('the exponent depends on the state');
  return { v: a.v ** b.v, d: b.v === 0 ? 0 : b.v * a.v ** (b.v - 1) * a.d };
}

/**
 * Evaluate a formula in dual numbers by recursive descent. It shares nothing with the product's parser and compiler, so
 * the two can be held against each other.
 */
export function evaluateDual(formula: string, names: ReadonlyMap<string, Dual>): Dual {
  const tokens = formula.match(/\d+(?:\.\d+)?|[A-Za-z]\w*|[-+*/^()]/g) ?? [];
  let at = 0;
  const take = (...wanted: string[]) => (wanted.includes(tokens[at] ?? '') ? tokens[at++] : undefined);

  function chain(operators: string[], operand: () => Dual): Dual {
    let left = operand();
    for (let o = take(...operators); o !== undefined; o = take(...operators)) left = binary[o]!(left, operand());
    return left;
  }
  const sum = (): Dual => chain(['+', '-'], product);
  const product = (): Dual => chain(['*', '/'], signed);

  function signed(): Dual {
    if (take('-')) return binary['-']!(constant(0), signed());
    const base = atom();
    return take('^') ? power(base, signed()) : base;
  }

  function atom(): Dual {
    if (take('(')) {
      const inner = sum();
      if (!take(')')) throw new SyntaxError(`a parenthesis stays open in ${formula}`);
      return inner;
    }
    const token = tokens[at++] ?? '';
    const rule = FUNCTIONS.get(token);
    if (rule) {
      const x = atom();
      return { v: rule[0](x.v), d: rule[1](x.v) * x.d };
    }
    if (/^\d/.test(token)) return constant(Number(token));
    const value = token === 'pi' ? constant(Math.PI) : names.get(token);
    if (!value) throw new SyntaxError(`${token} is no name in ${formula}`);
    return value;
  }

  const value = sum();
  if (at < tokens.length) throw new SyntaxError(`${tokens[at]} is left over in ${formula}`);
  return value;
}
