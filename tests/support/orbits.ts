import type { CheckRequest, SubmissionBody, SystemDocument } from '@/schemas/generated/contract';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { lorenzBody } from '@/tests/reference/orbit-body';

/** A Lorenz orbit of the published table, as a contributor states it. */
export function lorenzOrbit(code = 'AB', change: Partial<SubmissionBody> = {}): SubmissionBody {
  const orbit = loadLorenzOrbits().find((line) => line.code === code);
  if (!orbit) throw new RangeError(`the table has no ${code}`);
  return { ...lorenzBody(orbit), ...change };
}

/** The pendulum without its constants: x'' = -sin x. */
export const pendulumDocument: SystemDocument = {
  name: 'A pendulum',
  variables: [{ name: 'x' }, { name: 'v' }],
  parameters: [],
  equations: { x: 'v', v: '-sin(x)' },
};

const PAIRS = 8;

/** Eight coupled pendulums: every step of theirs takes long, and a long time has many. */
export function slowOrbit(change: Partial<CheckRequest> = {}): CheckRequest {
  const pairs = Array.from({ length: PAIRS }, (_, i) => i);
  const pull = (i: number): string =>
    pairs.map((j) => `sin(q${j} - ${i + 2}*q${i})*cos(q${j} + ${j + 1}*p${i})`).join(' + ');
  const equations = pairs.flatMap((i) => [
    [`q${i}`, `p${i}`],
    [`p${i}`, `-q${i} + 0.001*(${pull(i)})`],
  ]);
  return {
    system: {
      name: 'Coupled pendulums',
      variables: pairs.flatMap((i) => [{ name: `q${i}` }, { name: `p${i}` }]),
      parameters: [],
      equations: Object.fromEntries(equations),
    },
    section: { formula: 'q0' },
    point: pairs.flatMap(() => ['0', '1']),
    period: '100000',
    ...change,
  };
}
