import { type CheckRequest, type TypedNumber } from '@/schemas/generated/contract';
import { type Claim, type Hold, type NamedOutput, type Symmetry, type TypedValue } from '@/server/checks/claim';
import { RETURNS_LARGEST, TOLERANCE_DEFAULT, TOLERANCE_LARGEST, TOLERANCE_SMALLEST } from '@/server/checks/limits';
import { type CheckedSection, type CheckedSystem, type ContentError } from '@/server/formulas/checked-system';
import { ErrorList, segment } from '@/server/formulas/error-list';
import { flowDefinition } from '@/server/formulas/flow-definition';
import { formatFormula } from '@/server/formulas/format-formula';
import { parseSection } from '@/server/formulas/parse-section';
import { type Expression } from '@/server/numerics/expression/expression';
import { createFlow, type Flow } from '@/server/numerics/taylor/flow';

/** The members of a submission or of a check that state the orbit. */
export type ClaimBody = Pick<
  CheckRequest,
  | 'parameters'
  | 'section'
  | 'point'
  | 'points'
  | 'hold'
  | 'returns'
  | 'period'
  | 'returnTimes'
  | 'itinerary'
  | 'tolerance'
  | 'multipliers'
>;

/** Share of a coordinate over which the slope of a held invariant is taken: its square is what the slope is off by. */
const SLOPE_STEP = 1e-5;

/** A claim that can be checked, or everything in the body that prevents it. */
export type ReadClaim = { ok: true; claim: Claim } | { ok: false; errors: ContentError[] };

/**
 * Read what a body states about an orbit of a system: numbers, names and sizes, and compile the flow.
 *
 * @param system the system that the body names or carries.
 * @param body   of valid shape.
 */
export function readClaim(system: CheckedSystem, body: ClaimBody): ReadClaim {
  return new ClaimReader(system, body).read();
}

class ClaimReader {
  private readonly list = new ErrorList('');

  constructor(
    private readonly system: CheckedSystem,
    private readonly body: ClaimBody,
  ) {}

  read(): ReadClaim {
    const { system, body, list } = this;
    const parameters = this.parameters();
    const parsed = parseSection(system, body.section);
    if (!parsed.ok) list.errors.push(...parsed.errors);
    const point = this.coordinates('/point', body.point);
    const points = this.points();
    const period = this.positive('/period', body.period);
    const returnTimes = body.returnTimes?.map((time, i) => this.positive(`/returnTimes/${i}`, time)) ?? null;
    const multipliers = this.multipliers();
    const tolerance = this.tolerance();
    this.returns();
    this.held();
    if (!parsed.ok || period === null || list.errors.length > 0) return { ok: false, errors: list.errors };
    const stated = claimedSystem(system, parsed.section, parameters);
    return {
      ok: true,
      claim: {
        ...stated,
        point,
        points,
        hold: body.hold === undefined ? null : holdOf(body.hold, stated, point),
        period,
        returns: body.returns ?? null,
        returnTimes: returnTimes?.filter((time) => time !== null) ?? null,
        itinerary: body.itinerary ?? null,
        multipliers,
        tolerance,
      },
    };
  }

  private parameters(): Map<string, number> {
    const known = new Set(this.system.parameters.map(({ name }) => name));
    const values = new Map<string, number>();
    for (const [name, typed] of Object.entries(this.body.parameters ?? {})) {
      const path = `/parameters/${segment(name)}`;
      if (!known.has(name)) this.list.add(path, `The system has no parameter ${name}.`);
      const read = this.list.number(path, typed);
      if (read !== null) values.set(name, read.value);
    }
    return values;
  }

  private coordinates(path: string, point: readonly TypedNumber[]): TypedValue[] {
    const { variables } = this.system;
    if (point.length !== variables.length) {
      const names = variables.map(({ name }) => name).join(', ');
      this.list.add(path, `The point has ${point.length} coordinates; the system has ${variables.length}: ${names}.`);
    }
    return point.flatMap((typed, i) => this.list.number(`${path}/${i}`, typed) ?? []);
  }

  private points(): TypedValue[][] | null {
    const { points, returns, returnTimes } = this.body;
    if (points === undefined || points.length === 0) return null;
    const stated = returns ?? returnTimes?.length;
    if (stated !== undefined && points.length !== stated - 1) {
      this.list.add(
        '/points',
        `${stated} returns have ${stated - 1} section points between the start and the end; ${points.length} are stated.`,
      );
    }
    return points.map((point, k) => this.coordinates(`/points/${k}`, point));
  }

  private held(): void {
    const { hold } = this.body;
    const { variables, invariants } = this.system;
    const names = [...variables, ...invariants].map(({ name }) => name);
    if (hold === undefined || names.includes(hold)) return;
    this.list.add('/hold', `Only a variable or an invariant can be held: ${names.join(', ')}. ${hold} is neither.`);
  }

  private positive(path: string, typed: TypedNumber): TypedValue | null {
    const read = this.list.number(path, typed);
    if (read === null || read.value > 0) return read;
    this.list.add(path, `A time is larger than 0; this is ${read.text}.`);
    return null;
  }

  private multipliers(): Claim['multipliers'] {
    const { multipliers } = this.body;
    if (multipliers === undefined) return null;
    const n = this.system.variables.length;
    if (multipliers.length > n) {
      this.list.add('/multipliers', `There are at most ${n} multipliers; ${multipliers.length} are stated.`);
    }
    return multipliers.flatMap((stated, i) => {
      const parts = typeof stated === 'object' ? stated : { re: stated, im: '0' };
      const re = this.list.number(`/multipliers/${i}`, parts.re);
      const im = this.list.number(`/multipliers/${i}`, parts.im);
      return re === null || im === null ? [] : [{ re, im }];
    });
  }

  private tolerance(): number {
    const { tolerance } = this.body;
    if (tolerance === undefined) return TOLERANCE_DEFAULT;
    const value = this.list.number('/tolerance', tolerance)?.value ?? TOLERANCE_DEFAULT;
    if (value < TOLERANCE_SMALLEST || value > TOLERANCE_LARGEST) {
      this.list.add('/tolerance', `The tolerance lies between ${TOLERANCE_SMALLEST} and ${TOLERANCE_LARGEST}.`);
    }
    return value;
  }

  private returns(): void {
    const { returns } = this.body;
    if (returns === undefined || (Number.isInteger(returns) && returns >= 1 && returns <= RETURNS_LARGEST)) return;
    this.list.add('/returns', `The number of returns is a whole number from 1 to ${RETURNS_LARGEST}.`);
  }
}

type SystemPart = Pick<
  Claim,
  'variables' | 'moduli' | 'flow' | 'flowOn' | 'section' | 'negatedSection' | 'letters' | 'invariants' | 'symmetries'
>;

function claimedSystem(
  system: CheckedSystem,
  section: CheckedSection,
  parameters: ReadonlyMap<string, number>,
): SystemPart {
  const outputs: Expression[] = [];
  const place = (name: string, expression: Expression): NamedOutput => ({ name, output: outputs.push(expression) - 1 });
  const letters = section.letters.map(({ letter, expression }) => place(letter, expression));
  const invariants = system.invariants.map(({ name, expression }) => place(name, expression));
  const symmetries: Symmetry[] = system.symmetries.map(({ name, reversesTime, map }) => ({
    name,
    reversesTime,
    outputs: map.map((expression) => place(name, expression).output),
  }));
  const flowWith = (u: Expression, evaluated: readonly Expression[]): Flow =>
    createFlow(flowDefinition(system, { parameters, section: u, outputs: evaluated }));
  return {
    variables: system.variables.map(({ name }) => name),
    moduli: system.variables.map(({ modulus }) => modulus),
    flow: flowWith(section.expression, outputs),
    flowOn: (formula) => {
      const other = parseSection(system, { formula });
      return other.ok ? flowWith(other.section.expression, []) : null;
    },
    section: section.formula,
    negatedSection: formatFormula(negated(section.expression)),
    ...{ letters, invariants, symmetries },
  };
}

/** What is to be held, a variable before an invariant of the same name. */
function holdOf(name: string, { variables, flow, invariants }: SystemPart, point: readonly TypedValue[]): Hold {
  const start = Float64Array.from(point, ({ value }) => value);
  const index = variables.indexOf(name);
  if (index >= 0) {
    const axis = start.map((_, i) => (i === index ? 1 : 0));
    return { name, target: start[index]!, at: (x) => x[index]!, gradientAt: () => axis };
  }
  const { output } = invariants.find((invariant) => invariant.name === name)!;
  const at = (x: Float64Array): number => flow.outputs(x)[output]!;
  return { name, target: at(start), at, gradientAt: (x) => slopesOf(at, x) };
}

/** Central differences: Newton, which uses them, needs a few digits, and reaches the value whatever they are. */
function slopesOf(at: (x: Float64Array) => number, x: Float64Array): Float64Array {
  return x.map((value, i) => {
    const step = SLOPE_STEP * Math.max(1, Math.abs(value));
    const beside = (distance: number): number => at(x.map((entry, j) => (j === i ? entry + distance : entry)));
    return (beside(step) - beside(-step)) / (2 * step);
  });
}

function negated(u: Expression): Expression {
  return u.kind === 'negate' ? u.argument : { kind: 'negate', argument: u };
}
