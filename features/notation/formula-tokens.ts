import { mathName } from './math-name';

/** A piece of a formula as text. */
export interface FormulaToken {
  text: string;
  italic: boolean;
}

const FUNCTIONS = new Set('sqrt exp log sin cos tan asin acos atan sinh cosh tanh'.split(' '));
const TOKEN = /\s+|\d+(?:\.\d*)?(?:[eE][+-]?\d+)?|[A-Za-z][A-Za-z0-9_]*|\p{L}[\u0300-\u036f]?|./gu;
const SPACED: Record<string, string> = { '+': ' + ', '-': ' − ', '−': ' − ', '=': ' = ', '<': ' < ', '>': ' > ' };
const SUPERSCRIPTS = ['⁰', '¹', '²', '³', '⁴', '⁵', '⁶', '⁷', '⁸', '⁹'];

/** Whether an operator in this place stands between two things, not before one. */
const isBinary = (previous: string | undefined): boolean => previous !== undefined && !/^[(+\-*/^=,<>]$/.test(previous);

/** What stands for a product: nothing between single letters, a dot before a number, else a thin space. */
function product(previous = '', next = ''): string {
  if (/^\d/.test(next)) return '·';
  const isShort = (raw: string) => raw === 'pi' || /^(?:[\d.]+|[()]|\p{L}[₀-₉]*)$/u.test(mathName(raw));
  return isShort(previous) && isShort(next) ? '' : '\u2009';
}

function tokenOf(raw: string, previous: string | undefined, next: string | undefined): FormulaToken {
  if (/^[A-Za-z\p{L}]/u.test(raw)) {
    if (FUNCTIONS.has(raw)) return { text: `${raw} `, italic: false };
    return raw === 'pi' ? { text: 'π', italic: false } : { text: mathName(raw), italic: true };
  }
  if (raw === '-' && !isBinary(previous)) return { text: '−', italic: false };
  if (raw === '*') return { text: product(previous, next), italic: false };
  if (raw === ',') return { text: ', ', italic: false };
  return { text: SPACED[raw] ?? raw, italic: false };
}

/** A formula as typed, in pieces for text: variables italic, products without a sign, small powers raised. */
export function formulaTokens(formula: string): FormulaToken[] {
  const raws = [...formula.matchAll(TOKEN)].map(([raw]) => raw).filter((raw) => raw.trim() !== '');
  const tokens: FormulaToken[] = [];
  for (let i = 0; i < raws.length; i += 1) {
    const raw = raws[i] ?? '';
    const power = raw === '^' ? SUPERSCRIPTS[parseInt(raws[i + 1] ?? '', 10)] : undefined;
    if (power !== undefined && /^\d$/.test(raws[i + 1] ?? '')) {
      tokens.push({ text: power, italic: false });
      i += 1;
    } else {
      const before = tokens.at(-1);
      if (raw === '(' && before && /^[a-z]+ $/.test(before.text)) before.text = before.text.trimEnd();
      tokens.push(tokenOf(raw, raws[i - 1], raws[i + 1]));
    }
  }
  return tokens;
}
