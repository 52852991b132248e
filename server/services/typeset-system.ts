import type { SystemDocument } from '@/schemas/generated/contract';
import { checkSystem } from '@/server/formulas/check-system';
import type { CheckedSystem } from '@/server/formulas/checked-system';
import { divergenceText } from '@/server/formulas/divergence-text';
import { formatFormula } from '@/server/formulas/format-formula';
import { equationsToMathML, toMathML } from '@/server/formulas/to-mathml';

/** A system's formulas as people read them. */
export interface TypesetSystem {
  mathml: string;
  text: string;
  /** The divergence of the field; null where it is no short polynomial. */
  divergence: string | null;
  /** Formula and MathML of each section, by its name. */
  sections: ReadonlyMap<string, { formula: string; mathml: string }>;
}

/** Typeset systems are kept: versions never change. */
const kept = new Map<string, TypesetSystem>();
const MAX_KEPT = 200;

/**
 * Typeset one version of a system.
 *
 * @throws {Error} when an accepted document does not parse: the database or the parser is broken.
 */
export function typesetSystem({
  slug,
  version,
  document,
}: {
  slug: string;
  version: number;
  document: SystemDocument;
}): TypesetSystem {
  const key = `${slug} ${version}`;
  const known = kept.get(key);
  if (known) return known;
  const result = checkSystem(document);
  if (!result.ok) throw new Error(`version ${version} of ${slug} does not parse: ${result.errors[0]?.message ?? ''}`);
  if (kept.size >= MAX_KEPT) kept.clear();
  const typeset = typesetChecked(result.system);
  kept.set(key, typeset);
  return typeset;
}

function typesetChecked(system: CheckedSystem): TypesetSystem {
  const equations = system.equations.map((expression, i) => ({ variable: system.variables[i]!.name, expression }));
  return {
    mathml: equationsToMathML(equations, system.definitions),
    text: [
      ...equations.map(({ variable, expression }) => `${variable}' = ${formatFormula(expression)}`),
      ...system.definitions.map(({ name, expression }) => `${name} = ${formatFormula(expression)}`),
    ].join('\n'),
    divergence: divergenceText(system),
    sections: new Map(
      system.sections.map(({ name, expression }) => [
        name,
        { formula: formatFormula(expression), mathml: toMathML(expression) },
      ]),
    ),
  };
}
