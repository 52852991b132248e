import type { CheckedSystem } from '@/server/formulas/checked-system';
import type { Expression } from '@/server/numerics/expression/expression';
import type { FlowDefinition } from '@/server/numerics/taylor/flow';

/**
 * What the engine needs of a system: its field with one set of parameters, a section, and what is evaluated at points.
 *
 * @param parameters values by name; those left out take the system's defaults.
 */
export const flowDefinition = (
  system: CheckedSystem,
  choice: { parameters: ReadonlyMap<string, number>; section: Expression; outputs: readonly Expression[] },
): FlowDefinition => ({
  variables: system.variables,
  parameters: system.parameters.map(({ name, read }) => ({ name, value: choice.parameters.get(name) ?? read.value })),
  definitions: system.definitions,
  equations: system.equations,
  section: choice.section,
  outputs: choice.outputs,
});
