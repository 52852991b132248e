/** Values of names. */
export type Scope = Readonly<Record<string, number>>;
/** A formula as a function of its names; NaN where a name has no value. For drawing: the checks compute elsewhere. */
export type FormulaValue = (scope: Scope) => number;

const FUNCTIONS: Readonly<Record<string, (x: number) => number>> = {
  sqrt: Math.sqrt,
  exp: Math.exp,
  log: Math.log,
  sin: Math.sin,
  cos: Math.cos,
  tan: Math.tan,
  asin: Math.asin,
  acos: Math.acos,
  atan: Math.atan,
  sinh: Math.sinh,
  cosh: Math.cosh,
  tanh: Math.tanh,
};
const TOKEN = /\s*(?:(\d+(?:\.\d*)?(?:[eE][+-]?\d+)?|\.\d+(?:[eE][+-]?\d+)?)|([A-Za-z][A-Za-z0-9_]*)|([-+*/^()]))/y;

/** A piece of a formula that cannot be read. */
class Unreadable extends Error {}

/** Reads one formula by recursive descent: sums of products of powers. */
class Reader {
  private readonly tokens: string[] = [];
  private at = 0;

  constructor(text: string) {
    TOKEN.lastIndex = 0;
    const source = text.trimEnd();
    while (TOKEN.lastIndex < source.length) {
      const match = TOKEN.exec(source);
      if (!match) throw new Unreadable();
      this.tokens.push(match[0].trim());
    }
  }

  whole(): FormulaValue {
    const value = this.sum();
    if (this.at < this.tokens.length) throw new Unreadable();
    return value;
  }

  private take(...wanted: string[]): string | null {
    const token = this.tokens[this.at];
    if (token === undefined || !wanted.includes(token)) return null;
    this.at += 1;
    return token;
  }

  private sum(): FormulaValue {
    let left = this.product();
    for (let sign = this.take('+', '-'); sign; sign = this.take('+', '-')) {
      const [a, b] = [left, this.product()];
      left = sign === '+' ? (scope) => a(scope) + b(scope) : (scope) => a(scope) - b(scope);
    }
    return left;
  }

  private product(): FormulaValue {
    let left = this.signed();
    for (let sign = this.take('*', '/'); sign; sign = this.take('*', '/')) {
      const [a, b] = [left, this.signed()];
      left = sign === '*' ? (scope) => a(scope) * b(scope) : (scope) => a(scope) / b(scope);
    }
    return left;
  }

  private signed(): FormulaValue {
    const sign = this.take('+', '-');
    if (sign === null) return this.power();
    const value = this.signed();
    return sign === '-' ? (scope) => -value(scope) : value;
  }

  private power(): FormulaValue {
    const base = this.atom();
    if (!this.take('^')) return base;
    const exponent = this.signed();
    return (scope) => base(scope) ** exponent(scope);
  }

  private atom(): FormulaValue {
    const token = this.tokens[this.at];
    this.at += 1;
    if (token === undefined) throw new Unreadable();
    if (token === '(') return this.closed();
    if (/^[\d.]/.test(token)) {
      const value = parseFloat(token);
      return () => value;
    }
    if (!/^[A-Za-z]/.test(token)) throw new Unreadable();
    const apply = FUNCTIONS[token];
    if (apply) {
      if (!this.take('(')) throw new Unreadable();
      const argument = this.closed();
      return (scope) => apply(argument(scope));
    }
    return token === 'pi' ? () => Math.PI : (scope) => scope[token] ?? NaN;
  }

  private closed(): FormulaValue {
    const value = this.sum();
    if (!this.take(')')) throw new Unreadable();
    return value;
  }
}

/** A formula as typed, as a function to draw with; null where it cannot be read. */
export function compileFormula(text: string): FormulaValue | null {
  try {
    return new Reader(text).whole();
  } catch (error) {
    if (error instanceof Unreadable) return null;
    throw error;
  }
}
