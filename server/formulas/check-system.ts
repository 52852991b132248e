import type { SystemDocument } from '@/schemas/generated/contract';
import { checkAngles } from '@/server/formulas/check-angles';
import type { CheckedSection, CheckedSystem, ContentError } from '@/server/formulas/checked-system';
import { dependsOnState } from '@/server/formulas/depends-on-state';
import { ErrorList, segment } from '@/server/formulas/error-list';
import { evaluate } from '@/server/formulas/evaluate';
import { formatFormula } from '@/server/formulas/format-formula';
import {
  DEFINITIONS_LIMIT,
  NAME_CHARACTERS_LIMIT,
  PARAMETERS_LIMIT,
  SYSTEM_CHARACTERS_LIMIT,
  VARIABLES_LIMIT,
} from '@/server/formulas/limits';
import { NO_SURFACE } from '@/server/formulas/parse-section';
import { isReservedName } from '@/server/formulas/to-expression';
import type { Expression } from '@/server/numerics/expression/expression';
import { countSharedNodes, SHARED_NODES_LIMIT } from '@/server/numerics/taylor/prepared-flow';

export type SystemResult = { ok: true; system: CheckedSystem } | { ok: false; errors: ContentError[] };

/**
 * Parse every formula of a system document and look up every name.
 *
 * @param base JSON Pointer of the document in the body that holds it; empty when it is the body.
 * @returns the system, or everything that is wrong with it.
 */
export function checkSystem(document: SystemDocument, base = ''): SystemResult {
  const reader = new SystemReader(document, new ErrorList(base));
  return reader.read();
}

class SystemReader {
  private readonly names = new Set<string>();

  constructor(
    private readonly document: SystemDocument,
    private readonly list: ErrorList,
  ) {}

  read(): SystemResult {
    if (this.isTooLarge()) return this.refused();
    const variables = this.variables();
    const parameters = this.parameters();
    const definitions = this.definitions();
    const equations = this.equations();
    const invariants = this.invariants();
    const symmetries = this.symmetries();
    const sections = this.sections();
    if (this.list.errors.length > 0) return this.refused();
    const { document, names } = this;
    const system = { document, variables, parameters, definitions, equations, invariants, symmetries, sections, names };
    this.checkNodes(system);
    this.checkSurfaces(system);
    for (const error of checkAngles(system)) this.list.add(error.path, error.message);
    return this.list.errors.length > 0 ? this.refused() : { ok: true, system };
  }

  private refused(): SystemResult {
    return { ok: false, errors: this.list.errors };
  }

  private isTooLarge(): boolean {
    const { variables, parameters, definitions = [] } = this.document;
    const count = (path: string, what: string, items: readonly unknown[], limit: number): void => {
      if (items.length > limit)
        this.list.add(path, `A system has at most ${limit} ${what}; this one has ${items.length}.`);
    };
    count('/variables', 'variables', variables, VARIABLES_LIMIT);
    count('/parameters', 'parameters', parameters, PARAMETERS_LIMIT);
    count('/definitions', 'definitions', definitions, DEFINITIONS_LIMIT);
    const characters = JSON.stringify(this.document).length;
    if (characters > SYSTEM_CHARACTERS_LIMIT) {
      this.list.add('', `A system has at most ${SYSTEM_CHARACTERS_LIMIT} characters; this one has ${characters}.`);
    }
    return this.list.errors.length > 0;
  }

  /** Take a new name, or say why it can't be one. */
  private take(path: string, name: string): void {
    if (isReservedName(name)) this.list.add(path, `${name} is the name of a function or constant.`);
    else if (this.names.has(name)) this.list.add(path, `The name ${name} stands for two things.`);
    else if (name.length > NAME_CHARACTERS_LIMIT || !/^[A-Za-z][A-Za-z0-9_]*$/.test(name)) {
      this.list.add(
        path,
        `A name begins with a letter and has at most ${NAME_CHARACTERS_LIMIT} letters, digits and underscores.`,
      );
    } else this.names.add(name);
  }

  private variables(): CheckedSystem['variables'] {
    return this.document.variables.map(({ name, modulus }, index) => {
      this.take(`/variables/${index}/name`, name);
      return { name, modulus: modulus === undefined ? null : this.modulus(`/variables/${index}/modulus`, modulus) };
    });
  }

  private modulus(path: string, formula: string): number | null {
    const expression = this.list.formula(path, formula, new Set());
    if (expression === null) return null;
    const value = evaluate(expression, new Map());
    if (value > 0 && Number.isFinite(value)) return value;
    this.list.add(path, 'A modulus is a positive number, such as 2*pi.');
    return null;
  }

  private parameters(): CheckedSystem['parameters'] {
    return this.document.parameters.flatMap(({ name, value }, index) => {
      this.take(`/parameters/${index}/name`, name);
      const read = this.list.number(`/parameters/${index}/value`, value);
      return read ? [{ name, read }] : [];
    });
  }

  private definitions(): CheckedSystem['definitions'] {
    return (this.document.definitions ?? []).flatMap(({ name, formula }, index) => {
      const expression = this.list.formula(`/definitions/${index}/formula`, formula, this.names);
      this.take(`/definitions/${index}/name`, name);
      return expression ? [{ name, expression }] : [];
    });
  }

  private equations(): Expression[] {
    return this.mapOf('/equations', this.document.equations, (name) => `The equation of ${name} is missing.`);
  }

  /** One expression a variable, from a map by variable. */
  private mapOf(path: string, map: Record<string, string>, missing: (name: string) => string): Expression[] {
    const given = new Map(Object.entries(map));
    const known = new Set(this.document.variables.map(({ name }) => name));
    for (const name of given.keys()) {
      if (!known.has(name)) this.list.add(`${path}/${segment(name)}`, `${name} is not a variable of the system.`);
    }
    return this.document.variables.flatMap(({ name }) => {
      const text = given.get(name);
      if (text === undefined) {
        this.list.add(path, missing(name));
        return [];
      }
      const expression = this.list.formula(`${path}/${segment(name)}`, text, this.names);
      return expression ? [expression] : [];
    });
  }

  private invariants(): CheckedSystem['invariants'] {
    return (this.document.invariants ?? []).flatMap(({ name, formula }, index) => {
      const expression = this.list.formula(`/invariants/${index}/formula`, formula, this.names);
      return expression ? [{ name, expression }] : [];
    });
  }

  private symmetries(): CheckedSystem['symmetries'] {
    return (this.document.symmetries ?? []).map(({ name, map, reversesTime }, index) => ({
      name,
      reversesTime,
      map: this.mapOf(`/symmetries/${index}/map`, map, (missing) => `The image of ${missing} is missing.`),
    }));
  }

  private sections(): CheckedSystem['sections'] {
    const seen = new Set<string>();
    return (this.document.sections ?? []).flatMap((section, index) => {
      const path = `/sections/${index}`;
      if (seen.has(section.name)) this.list.add(`${path}/name`, `Two sections are named ${section.name}.`);
      seen.add(section.name);
      const expression = this.list.formula(`${path}/formula`, section.formula, this.names);
      this.incipit(path, section.incipit?.coordinate);
      const letters: CheckedSection['letters'] = (section.letters ?? []).flatMap(({ letter, where }, place) => {
        const condition = this.list.formula(`${path}/letters/${place}/where`, where, this.names);
        return condition ? [{ letter, expression: condition }] : [];
      });
      return expression ? [{ name: section.name, formula: formatFormula(expression), expression, letters }] : [];
    });
  }

  private incipit(path: string, coordinate: string | undefined): void {
    if (coordinate === undefined || this.document.variables.some(({ name }) => name === coordinate)) return;
    this.list.add(`${path}/incipit/coordinate`, `${coordinate} is not a variable of the system.`);
  }

  private checkSurfaces(system: CheckedSystem): void {
    system.sections.forEach(({ expression }, index) => {
      if (!dependsOnState(system, expression)) this.list.add(`/sections/${index}/formula`, NO_SURFACE);
    });
  }

  private checkNodes(system: CheckedSystem): void {
    const largest = Math.max(
      countSharedNodes(system),
      ...system.sections.map(({ expression }) => countSharedNodes({ ...system, section: expression })),
    );
    if (largest > SHARED_NODES_LIMIT) {
      const limit = `at most ${SHARED_NODES_LIMIT} different subexpressions`;
      this.list.add('/equations', `Field and section together have ${limit}; here they have ${largest}.`);
    }
  }
}
