import type { GraphNode, Operation } from '@/server/numerics/expression/graph-node';

/** Integer powers up to this are multiplied out by repeated squaring, so that they are safe at 0. */
const LARGEST_MULTIPLIED_POWER = 16;

export type Unary = 'exp' | 'log' | 'sin' | 'cos' | 'asin' | 'acos' | 'atan' | 'sqrt';

interface Operands {
  a: number;
  b?: number;
  value?: number;
}

export type BinaryOperation = 'add' | 'subtract' | 'multiply' | 'divide' | 'power';

const binary: Record<BinaryOperation, (x: number, y: number) => number> = {
  add: (x, y) => x + y,
  subtract: (x, y) => x - y,
  multiply: (x, y) => x * y,
  divide: (x, y) => x / y,
  power: (x, y) => x ** y,
};

/**
 * Expressions as a graph in which equal subexpressions are one node (hash-consing).
 *
 * Constants are folded; rewrites follow the recurrences that the nodes will be turned into: products of equal factors are
 * squares, a quotient by a power is a product with the negative power, sine and cosine come in pairs.
 * Ids rise from operands to results, except for the partners of sqrt and power, which follow their node.
 */
export class Graph {
  readonly nodes: GraphNode[] = [];
  /** Names of nodes that people gave: definitions, parameters, variables. */
  readonly labels = new Map<number, string>();
  private readonly known = new Map<string, number>();

  constant(value: number): number {
    return this.add('constant', { a: -1, value }, true);
  }

  parameter(index: number): number {
    return this.add('parameter', { a: -1, value: index }, true);
  }

  state(index: number): number {
    return this.add('state', { a: -1, value: index }, false);
  }

  sum(a: number, b: number): number {
    const [x, y] = [this.constantOf(a), this.constantOf(b)];
    const folded = this.foldedOf('add', x, y);
    if (folded !== null) return this.constant(folded);
    if (x === 0) return b;
    if (y === 0) return a;
    const [m, n] = [this.node(a), this.node(b)];
    if (n.operation === 'negate') return this.difference(a, n.a);
    if (m.operation === 'negate') return this.difference(b, m.a);
    return a <= b ? this.combine('add', a, b) : this.combine('add', b, a);
  }

  difference(a: number, b: number): number {
    const [x, y] = [this.constantOf(a), this.constantOf(b)];
    const folded = this.foldedOf('subtract', x, y);
    if (folded !== null) return this.constant(folded);
    if (y === 0) return a;
    if (x === 0) return this.negative(b);
    const n = this.node(b);
    if (n.operation === 'negate') return this.sum(a, n.a);
    return this.combine('subtract', a, b);
  }

  negative(a: number): number {
    const x = this.constantOf(a);
    if (x !== null) return this.constant(-x);
    const n = this.node(a);
    if (n.operation === 'negate') return n.a;
    if (n.operation === 'subtract') return this.difference(n.b, n.a);
    return this.add('negate', { a }, n.isStatic);
  }

  product(a: number, b: number): number {
    const [x, y] = [this.constantOf(a), this.constantOf(b)];
    const folded = this.foldedOf('multiply', x, y);
    if (folded !== null) return this.constant(folded);
    if (x === 0 || y === 0) return this.constant(0);
    if (x === 1) return b;
    if (y === 1) return a;
    if (x === -1) return this.negative(b);
    if (y === -1) return this.negative(a);
    if (a === b) return this.square(a);
    const [m, n] = [this.node(a), this.node(b)];
    if (m.operation === 'negate') return this.negative(this.product(m.a, b));
    if (n.operation === 'negate') return this.negative(this.product(a, n.a));
    return a <= b ? this.combine('multiply', a, b) : this.combine('multiply', b, a);
  }

  square(a: number): number {
    const x = this.constantOf(a);
    const folded = this.foldedOf('multiply', x, x);
    if (folded !== null) return this.constant(folded);
    const n = this.node(a);
    if (n.operation === 'negate') return this.square(n.a);
    if (n.operation === 'sqrt') return n.a;
    return this.add('square', { a }, n.isStatic);
  }

  quotient(a: number, b: number): number {
    const [x, y] = [this.constantOf(a), this.constantOf(b)];
    const folded = this.foldedOf('divide', x, y);
    if (folded !== null) return this.constant(folded);
    if (y === 1 || x === 0) return a;
    const n = this.node(b);
    if (!n.isStatic && n.operation === 'power') return this.product(a, this.power(n.a, this.negative(n.b)));
    if (!n.isStatic && n.operation === 'sqrt') return this.product(a, this.power(n.a, this.constant(-0.5)));
    return this.combine('divide', a, b);
  }

  /** a to the power b, for any b; an exponent that varies becomes exp(b log a). */
  power(a: number, b: number): number {
    const exponent = this.constantOf(b);
    if (exponent !== null) return this.constantPower(a, exponent);
    const [m, n] = [this.node(a), this.node(b)];
    if (!n.isStatic) return this.unary('exp', this.product(b, this.unary('log', a)));
    if (m.isStatic) return this.combine('power', a, b);
    return this.realPower(a, b);
  }

  unary(operation: Unary, a: number): number {
    const x = this.constantOf(a);
    const folded = x === null ? null : this.foldUnary(operation, x);
    if (folded !== null) return this.constant(folded);
    const { isStatic } = this.node(a);
    if (isStatic) return this.add(operation, { a }, true);
    switch (operation) {
      case 'sin':
      case 'cos':
        return this.sineOrCosine(operation, a);
      case 'sqrt':
        return this.withLaterPartner('sqrt', a, -1, (c) => this.combine('divide', this.constant(0.5), c));
      case 'exp':
        return this.withLaterPartner('exp', a, -1, (c) => c);
      case 'log':
        return this.withPartner('log', a, this.quotient(this.constant(1), a));
      case 'atan':
        return this.withPartner('atan', a, this.quotient(this.constant(1), this.sum(this.constant(1), this.square(a))));
      case 'asin':
      case 'acos': {
        const slope = this.power(this.difference(this.constant(1), this.square(a)), this.constant(-0.5));
        return this.withPartner(operation, a, operation === 'asin' ? slope : this.negative(slope));
      }
    }
  }

  node(id: number): GraphNode {
    const node = this.nodes[id];
    if (!node) throw new RangeError(`the graph has no node ${id}`);
    return node;
  }

  /** What an operation on two constants is folded to; null where it stays an operation. */
  protected fold(operation: BinaryOperation, x: number, y: number): number | null {
    return binary[operation](x, y);
  }

  protected foldUnary(operation: Unary, x: number): number | null {
    return Math[operation](x);
  }

  private foldedOf(operation: BinaryOperation, x: number | null, y: number | null): number | null {
    return x === null || y === null ? null : this.fold(operation, x, y);
  }

  private constantPower(a: number, exponent: number): number {
    const folded = this.foldedOf('power', this.constantOf(a), exponent);
    if (folded !== null) return this.constant(folded);
    if (exponent === 0) return this.constant(1);
    const n = this.node(a);
    // The power of a root is one power of what stands under it: each force law becomes a single series.
    if (n.operation === 'sqrt' && !n.isStatic && exponent !== 1) return this.constantPower(n.a, exponent / 2);
    if (Number.isInteger(exponent) && Math.abs(exponent) <= LARGEST_MULTIPLIED_POWER) {
      const positive = this.multipliedPower(a, Math.abs(exponent));
      return exponent > 0 ? positive : this.quotient(this.constant(1), positive);
    }
    if (n.isStatic) return this.combine('power', a, this.constant(exponent));
    if (exponent === 0.5) return this.unary('sqrt', a);
    return this.realPower(a, this.constant(exponent));
  }

  private multipliedPower(a: number, exponent: number): number {
    if (exponent === 1) return a;
    const half = this.square(this.multipliedPower(a, Math.floor(exponent / 2)));
    return exponent % 2 === 0 ? half : this.product(half, a);
  }

  /** a^b with a static exponent; its partner is b c / a. */
  private realPower(a: number, b: number): number {
    return this.withLaterPartner('power', a, b, (c) => this.combine('divide', this.product(b, c), a));
  }

  private sineOrCosine(operation: 'sin' | 'cos', a: number): number {
    const sine = this.add('sin', { a }, false);
    const cosine = this.add('cos', { a }, false);
    this.node(sine).partner = cosine;
    this.node(cosine).partner = sine;
    return operation === 'sin' ? sine : cosine;
  }

  private withPartner(operation: Operation, a: number, partner: number): number {
    const id = this.add(operation, { a }, false);
    this.node(id).partner = partner;
    return id;
  }

  private withLaterPartner(operation: Operation, a: number, b: number, make: (id: number) => number): number {
    const id = this.add(operation, { a, b }, false);
    const node = this.node(id);
    if (node.partner < 0) node.partner = make(id);
    return id;
  }

  private combine(operation: Operation, a: number, b: number): number {
    return this.add(operation, { a, b }, this.node(a).isStatic && this.node(b).isStatic);
  }

  private add(operation: Operation, { a, b = -1, value = 0 }: Operands, isStatic: boolean): number {
    // -0 and 0 are different constants: 1/x tells them apart.
    const key = `${operation}|${a}|${b}|${Object.is(value, -0) ? '-0' : value}`;
    const found = this.known.get(key);
    if (found !== undefined) return found;
    const id = this.nodes.push({ operation, a, b, value, isStatic, partner: -1 }) - 1;
    this.known.set(key, id);
    return id;
  }

  private constantOf(id: number): number | null {
    const node = this.node(id);
    return node.operation === 'constant' ? node.value : null;
  }
}
