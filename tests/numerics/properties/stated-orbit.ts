import type { CheckReport, CheckRequest } from '@/schemas/generated/contract';
import { sectionFormula } from '@/tests/reference/built-in-of';
import { checkBody } from '@/tests/reference/check-body';
import type { ReferenceCase } from '@/tests/reference/reference-case';

/** An orbit with its system, as formulas and doubles, that can be stated in other ways that mean the same. */
export interface OrbitStatement {
  variables: readonly string[];
  parameters: Readonly<Record<string, string>>;
  /** In the order of the variables. */
  equations: readonly string[];
  section: CheckRequest['section'] & object;
  point: readonly number[];
  period: number;
}

/** Share of the period by which a claim is off: its closure is then a figure, and no rounding. */
const OFF = 1e-8;

/** An orbit stated in one way, with the ways to state it otherwise. */
export class StatedOrbit {
  constructor(readonly statement: OrbitStatement) {}

  static of(reference: ReferenceCase): StatedOrbit {
    const { system, point, period } = reference;
    return new StatedOrbit({
      variables: system.variables,
      parameters: system.parameters,
      equations: system.variables.map((name) => system.equations[name]!),
      section: { formula: sectionFormula(reference) },
      point: system.variables.map((name) => Number(point[name])),
      period: Number(period),
    });
  }

  get formula(): string {
    const { section } = this.statement;
    if (!('formula' in section)) throw new TypeError('the section is a plane');
    return section.formula;
  }

  /** The report of its check with a period that is a little too long and a tolerance that lets it be. */
  report(): CheckReport {
    const { variables, parameters, equations, section, point, period } = this.statement;
    const { report, errors } = checkBody({
      system: {
        name: 'restated',
        variables: variables.map((name) => ({ name })),
        parameters: Object.entries(parameters).map(([name, value]) => ({ name, value })),
        equations: Object.fromEntries(equations.map((equation, i) => [variables[i]!, equation])),
      },
      section,
      point: point.map(String),
      period: String(period * (1 + OFF)),
      tolerance: '1e-4',
    });
    if (report === null) throw new Error(errors.map(({ message }) => message).join(' '));
    return report;
  }

  with(change: Partial<OrbitStatement>): StatedOrbit {
    return new StatedOrbit({ ...this.statement, ...change });
  }

  /** The same in units of its own for every coordinate, and for time. */
  inUnits(units: readonly number[], timeUnit: number): StatedOrbit {
    const { variables, equations, point, period } = this.statement;
    const scaled = this.substituted(variables.map((name, i) => `(${units[i]!}*${name})`));
    return this.with({
      equations: equations.map((equation, i) => `(${timeUnit}/${units[i]!})*(${scaled(equation)})`),
      section: { formula: scaled(this.formula) },
      point: point.map((x, i) => x / units[i]!),
      period: period / timeUnit,
    });
  }

  /** The same in axes that are turned by an angle in the plane of two coordinates. */
  turned([i, j]: readonly [number, number], angle: number): StatedOrbit {
    const { variables, equations, point } = this.statement;
    const [c, s] = [Math.cos(angle), Math.sin(angle)];
    const [a, b] = [variables[i]!, variables[j]!];
    const turn = this.substituted(
      variables.with(i, `((${c})*${a} - (${s})*${b})`).with(j, `((${s})*${a} + (${c})*${b})`),
    );
    const [f, g] = [turn(equations[i]!), turn(equations[j]!)];
    return this.with({
      equations: equations.map(turn).with(i, `(${c})*(${f}) + (${s})*(${g})`).with(j, `(${c})*(${g}) - (${s})*(${f})`),
      section: { formula: turn(this.formula) },
      point: point.with(i, c * point[i]! + s * point[j]!).with(j, c * point[j]! - s * point[i]!),
    });
  }

  /** The same with other names, and the variables in another order. */
  renamed(names: readonly string[], order: readonly number[]): StatedOrbit {
    const { variables, parameters, equations, point } = this.statement;
    const parameterNames = Object.keys(parameters);
    const newName = new Map([...variables, ...parameterNames].map((name, i) => [name, names[i]!]));
    const rename = (formula: string): string => replaceNames(formula, newName);
    const reorder = <T>(list: readonly T[]): T[] => order.map((from) => list[from]!);
    return this.with({
      variables: reorder(variables.map(rename)),
      parameters: Object.fromEntries(Object.entries(parameters).map(([name, value]) => [rename(name), value])),
      equations: reorder(equations.map(rename)),
      section: { formula: rename(this.formula) },
      point: reorder(point),
    });
  }

  /** The same curve run through backwards, its section crossed the counted way. */
  reversed(): StatedOrbit {
    return this.with({
      equations: this.statement.equations.map((equation) => `-(${equation})`),
      section: { formula: `-(${this.formula})` },
    });
  }

  private substituted(texts: readonly string[]): (formula: string) => string {
    const meaning = new Map(this.statement.variables.map((name, i) => [name, texts[i]!]));
    return (formula) => replaceNames(formula, meaning);
  }
}

const replaceNames = (formula: string, meaning: ReadonlyMap<string, string>): string =>
  formula.replace(/(?<![\w.])[A-Za-z]\w*/g, (name) => meaning.get(name) ?? name);
