import type { SystemDocument } from '@/schemas/generated/contract';
import type { ReferenceCase } from '@/tests/reference/reference-case';

/** The system of a case as a document of its own, exactly as the case writes it. */
export function caseDocument({ title, system }: ReferenceCase): SystemDocument {
  return {
    name: title,
    variables: system.variables.map((name) => ({ name })),
    parameters: Object.entries(system.parameters).map(([name, value]) => ({ name, value })),
    equations: system.equations,
  };
}
