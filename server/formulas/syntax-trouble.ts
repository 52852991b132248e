import type { SyntaxError as FormulaSyntaxError } from '@/server/formulas/generated/parser';
import { FormulaTrouble } from '@/server/formulas/formula-trouble';
import { functionNames } from '@/server/numerics/expression/expression';

/** Characters of comparisons, conditionals, remainders and absolute values. */
const UNSMOOTH = /[<>=?:|!&%]/;

/** Characters that people paste from typeset formulas or other languages, and what to type instead. */
const typedAs = new Map([
  ['−', 'The minus sign is typed as -.'],
  ['–', 'The minus sign is typed as -.'],
  ['·', 'A product is typed as *.'],
  ['⋅', 'A product is typed as *.'],
  ['×', 'A product is typed as *.'],
  ['÷', 'A quotient is typed as /.'],
  ['²', 'A power is typed as ^.'],
  ['³', 'A power is typed as ^.'],
  ['π', 'Write pi.'],
]);

/** Say what stands at the place where the parser stopped, what was expected there, and how it is typed. */
export function syntaxTrouble(error: FormulaSyntaxError, text: string): FormulaTrouble {
  const { offset } = error.location.start;
  const found = characterAt(text, offset);
  if (found !== null && UNSMOOTH.test(found)) {
    return new FormulaTrouble(
      `“${found}” is not part of a formula: comparisons, conditionals, remainders and absolute values are refused, since the check's order needs a smooth field.`,
      offset,
    );
  }
  const isOperandMissing = (error.expected ?? []).some(({ description }) => description === 'a number');
  const wanted = isOperandMissing ? 'a number, a name or “(”' : afterOperand(error);
  if (found === null) return new FormulaTrouble(`The formula ends too early: ${wanted} is missing.`, offset);
  const hint =
    typedAs.get(found) ?? (isOperandMissing ? operandHint(found) : operatorHint(found, text.slice(0, offset)));
  return new FormulaTrouble(`Here stands “${found}”; expected was ${wanted}.${hint && ` ${hint}`}`, offset);
}

/** What may follow a number, a name or a closing parenthesis. */
function afterOperand({ expected }: FormulaSyntaxError): string {
  const isInParentheses = (expected ?? []).some(({ text }) => text === ')');
  return isInParentheses ? 'an operator or “)”' : 'an operator or the end';
}

function operandHint(found: string): string {
  if (found === '*') return 'A power is typed as ^.';
  return found === '.' ? 'A digit stands before a decimal point.' : '';
}

function operatorHint(found: string, before: string): string {
  if (found === '.') return 'A digit stands after a decimal point.';
  const [word] = /[A-Za-z][A-Za-z0-9_]*(?=\s+$)/.exec(before) ?? [];
  if (functionNames.some((name) => name === word)) return `The function ${word} needs its argument in parentheses.`;
  return /[A-Za-z0-9(]/.test(found) ? 'A product is typed as *.' : '';
}

/** The whole character at an offset, which may be the first half of a pair; null at the end. */
function characterAt(text: string, offset: number): string | null {
  const code = text.codePointAt(offset);
  return code === undefined ? null : String.fromCodePoint(code).toWellFormed();
}
