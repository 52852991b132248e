import { checkSystem } from '@/server/formulas/check-system';
import { flowDefinition } from '@/server/formulas/flow-definition';
import { parseSection } from '@/server/formulas/parse-section';
import { createFlow, type Flow } from '@/server/numerics/taylor/flow';

/** The flow of equations given as text; parameters as numbers' text. */
export function flowOf(
  equations: Record<string, string>,
  {
    section = Object.keys(equations)[0] ?? '',
    parameters = {},
  }: { section?: string; parameters?: Record<string, string> } = {},
): Flow {
  const checked = checkSystem({
    name: 'under test',
    variables: Object.keys(equations).map((name) => ({ name })),
    parameters: Object.entries(parameters).map(([name, value]) => ({ name, value })),
    equations,
  });
  if (!checked.ok) throw new Error(JSON.stringify(checked.errors));
  const chosen = parseSection(checked.system, { formula: section });
  if (!chosen.ok) throw new Error(JSON.stringify(chosen.errors));
  return createFlow(
    flowDefinition(checked.system, { parameters: new Map(), section: chosen.section.expression, outputs: [] }),
  );
}
