import type { SectionChoice } from '@/schemas/generated/contract';
import { changesWith } from '@/server/formulas/check-angles';
import type { CheckedSection, CheckedSystem, ContentError } from '@/server/formulas/checked-system';
import { dependsOnState } from '@/server/formulas/depends-on-state';
import { ErrorList } from '@/server/formulas/error-list';
import { formatFormula } from '@/server/formulas/format-formula';
import { sameExpression } from '@/server/formulas/same-expression';
import type { TypedNumberRead } from '@/server/formulas/typed-number';
import { countSharedNodes, SHARED_NODES_LIMIT } from '@/server/numerics/taylor/prepared-flow';

/** Said of a formula that is the same number everywhere. */
export const NO_SURFACE = 'The section holds no variable: it is not a surface.';

export type SectionResult = { ok: true; section: CheckedSection } | { ok: false; errors: ContentError[] };

/**
 * The section that a body names: one of the system's, a formula, or a plane.
 *
 * A formula equal to a named section's after parsing is that section, with its letters.
 */
export function parseSection(system: CheckedSystem, choice: SectionChoice, base = '/section'): SectionResult {
  const list = new ErrorList(base);
  if (typeof choice === 'string') {
    const named = system.sections.find(({ name }) => name === choice);
    if (named) return { ok: true, section: named };
    const names = system.sections.map(({ name }) => name).join(', ') || 'none';
    list.add('', `The system has no section ${choice}. Its sections: ${names}.`);
    return { ok: false, errors: list.errors };
  }
  const path = 'formula' in choice ? '/formula' : '/plane';
  const text = 'formula' in choice ? choice.formula : planeFormula(system, choice.plane, list);
  const section = text === null ? null : sectionOf(system, text, path, list);
  return section && list.errors.length === 0 ? { ok: true, section } : { ok: false, errors: list.errors };
}

function sectionOf(system: CheckedSystem, text: string, path: string, list: ErrorList): CheckedSection | null {
  const expression = list.formula(path, text, system.names);
  if (expression === null) return null;
  if (!dependsOnState(system, expression)) list.add(path, NO_SURFACE);
  for (const angle of system.variables) {
    if (angle.modulus !== null && changesWith(system, expression, angle)) {
      list.add(
        path,
        `The section changes when the angle ${angle.name} grows by its modulus; write it with sin(${angle.name} - c).`,
      );
    }
  }
  const nodes = countSharedNodes({ ...system, section: expression });
  if (nodes > SHARED_NODES_LIMIT) {
    list.add(
      path,
      `Field and section together have at most ${SHARED_NODES_LIMIT} different subexpressions; here they have ${nodes}.`,
    );
  }
  const named = system.sections.find((section) => sameExpression(section.expression, expression));
  return named ?? { name: null, formula: formatFormula(expression), expression, letters: [] };
}

type Plane = Extract<SectionChoice, { plane: unknown }>['plane'];

/** normal . (x − through) as a formula with the numbers as typed. */
function planeFormula(system: CheckedSystem, { normal, through }: Plane, list: ErrorList): string | null {
  const n = system.variables.length;
  for (const [path, given] of [
    ['/plane/normal', normal],
    ['/plane/through', through],
  ] as const) {
    if (given.length !== n) list.add(path, `The system has ${n} variables; here stand ${given.length} numbers.`);
  }
  const numbers = (path: string, given: Plane['normal']): (TypedNumberRead | null)[] =>
    given.map((typed, index) => list.number(`${path}/${index}`, typed));
  const [along, at] = [numbers('/plane/normal', normal), numbers('/plane/through', through)];
  if (list.errors.length > 0) return null;
  const terms = system.variables.flatMap(({ name }, index) => {
    const [factor, level] = [along[index], at[index]];
    if (!factor || !level || factor.value === 0) return [];
    const difference = level.value === 0 ? name : `(${name} - (${level.text.replace(/^\+/, '')}))`;
    return [factor.value === 1 ? difference : `(${factor.text.replace(/^\+/, '')})*${difference}`];
  });
  if (terms.length > 0) return terms.join(' + ');
  list.add('/plane/normal', 'The normal is zero: no plane.');
  return null;
}
