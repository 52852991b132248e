/** A section that is a level of one coordinate. */
export interface PlaneLevel {
  variable: string;
  level: number;
}

const NAME = '[A-Za-z][A-Za-z0-9_]*';
const NUMBER = '\\d+(?:\\.\\d+)?';
const FORMS: readonly [RegExp, (sign: string) => 1 | -1][] = [
  [new RegExp(`^(${NAME})(?:([+-])(${NUMBER}))?$`), (sign) => (sign === '+' ? -1 : 1)],
  [new RegExp(`^-(${NAME})(?:([+-])(${NUMBER}))?$`), (sign) => (sign === '+' ? 1 : -1)],
];

/** The coordinate and level of a section such as `z - 27`, `-y` or `x + 1.5`; null for every other formula. */
export function planeLevel(formula: string, variables: readonly string[]): PlaneLevel | null {
  const compact = formula.replaceAll(/\s+/g, '');
  for (const [form, direction] of FORMS) {
    const [, variable = '', sign = '-', number = '0'] = form.exec(compact) ?? [];
    if (variables.includes(variable)) return { variable, level: direction(sign) * parseFloat(number) + 0 };
  }
  const reversed = new RegExp(`^(${NUMBER})-(${NAME})$`).exec(compact);
  const [, number = '', variable = ''] = reversed ?? [];
  return variables.includes(variable) ? { variable, level: parseFloat(number) } : null;
}
