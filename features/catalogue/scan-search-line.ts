import { EVIDENCE_LEVELS, STABILITIES, type SearchableSystem, type SearchTerm } from '@/features/catalogue/search-term';

/** A term before its place in the line is known. */
type Meaning = SearchTerm extends infer Term ? (Term extends SearchTerm ? Omit<Term, 'start' | 'end'> : never) : never;

interface Rule {
  pattern: RegExp;
  read: (groups: (string | undefined)[], system: SearchableSystem | null) => Meaning | null;
}

const SIZE = String.raw`\d+(?:\.\d*)?(?:e[+-]?\d+)?|\.\d+(?:e[+-]?\d+)?`;
const NUMBER = String.raw`[+\-−]?(?:${SIZE})`;
const TO = String.raw`\s*(?:\.\.|–|\bto\b)\s*`;
const PERIOD = String.raw`(?:(?:period|T)\s*=?\s*)`;
const STABLE = `(?:${STABILITIES.join('|')})`;
const OR = String.raw`(?:\s*,\s*|\s+or\s+|\s+)`;
const END = String.raw`(?=[\s,;)]|$)`;

const rule = (source: string, read: Rule['read']): Rule => ({ pattern: new RegExp(source, 'iyu'), read });

/** Tried in this order at every place of the line where a term may begin. */
const rules: Rule[] = [
  rule(String.raw`"([^"]+)"?`, ([words]) => ({ kind: 'words', value: words!.trim() })),
  rule(String.raw`RTN-?(\d{7})([\dX])${END}`, ([digits, check]) => ({
    kind: 'accession',
    value: `RTN-${digits}${check!.toUpperCase()}`,
  })),
  rule(String.raw`near\s*\(?\s*((?:${NUMBER})(?:[\s,]+(?:${NUMBER}))*)\s*\)?${END}`, readPoint),
  rule(String.raw`\(?\s*((?:${NUMBER})(?:\s*,\s*(?:${NUMBER}))+)\s*\)?${END}`, readPoint),
  rule(String.raw`(\d+)(?:${TO}(\d+))?\s*returns?${END}`, readReturns),
  rule(String.raw`returns?\s*=?\s*(\d+)(?:${TO}(\d+))?${END}`, readReturns),
  rule(String.raw`(\p{L}[\p{L}\d_]*)\s*=?\s*(${NUMBER}|\d+\/\d+)${END}`, readParameter),
  rule(String.raw`(\p{L}[\p{L}\d_]*)\s*=?\s*([+\-−]?\d+\/\d+)${END}`, readParameter),
  rule(String.raw`${PERIOD}?(?:between\s+)?(${SIZE})(?:${TO}|\s+and\s+)(${SIZE})${END}`, ([min, max]) => ({
    kind: 'period-range',
    min: min!,
    max: max!,
  })),
  rule(String.raw`${PERIOD}?(?:from\s+|over\s+|[>≥]=?\s*)(${SIZE})${END}`, ([min]) => ({
    kind: 'period-range',
    min: min!,
    max: null,
  })),
  rule(String.raw`${PERIOD}?(?:up\s+to\s+|under\s+|[<≤]=?\s*)(${SIZE})${END}`, ([max]) => ({
    kind: 'period-range',
    min: null,
    max: max!,
  })),
  rule(String.raw`(?:itinerary\s+)?contains\s*=?\s*([\p{L}\d]+)${END}`, ([value]) => ({
    kind: 'contains',
    value: value!,
  })),
  rule(String.raw`itinerary\s*=?\s*([\p{L}\d]+)${END}`, ([value]) => ({ kind: 'itinerary', value: value! })),
  rule(String.raw`([\p{L}\d]+)${END}`, readItinerary),
  rule(String.raw`${PERIOD}?(${SIZE})${END}`, ([value]) => ({ kind: 'period', value: value! })),
  rule(String.raw`(${STABLE}(?:${OR}${STABLE})*)${END}`, readStability),
  rule(String.raw`(?:at\s+least\s+)?(${EVIDENCE_LEVELS.join('|')})${END}`, ([level]) => ({
    kind: 'evidence',
    value: level!.toLowerCase(),
  })),
];

const SEPARATORS = /[\s,;]+/y;
const WORD = /[^\s,;"]+|"/y;

/**
 * Split a search line into terms, each with its place; what nothing else fits is a term of one plain word.
 *
 * @param system decides which names are parameters and which letters make an itinerary.
 */
export function scanSearchLine(text: string, system: SearchableSystem | null): SearchTerm[] {
  const terms: SearchTerm[] = [];
  let at = 0;
  while (at < text.length) {
    const gap = matchAt(SEPARATORS, text, at);
    if (gap) {
      at += gap[0].length;
      continue;
    }
    const term = readTerm(text, at, system) ?? readWord(text, at);
    terms.push(term);
    at = term.end;
  }
  return terms;
}

function readTerm(text: string, at: number, system: SearchableSystem | null): SearchTerm | null {
  for (const { pattern, read } of rules) {
    const match = matchAt(pattern, text, at);
    const meaning = match && read(match.slice(1), system);
    if (meaning) return { ...meaning, start: at, end: at + match[0].trimEnd().length };
  }
  return null;
}

function readWord(text: string, at: number): SearchTerm {
  const word = matchAt(WORD, text, at)?.[0] ?? text.charAt(at);
  return { kind: 'words', value: word, start: at, end: at + word.length };
}

function matchAt(pattern: RegExp, text: string, at: number): RegExpExecArray | null {
  pattern.lastIndex = at;
  return pattern.exec(text);
}

const plainMinus = (number: string): string => number.replace('−', '-');

function readPoint([list]: (string | undefined)[]): Meaning {
  return {
    kind: 'near',
    point: list!
      .split(/[\s,]+/)
      .filter(Boolean)
      .map(plainMinus),
  };
}

function readParameter([typed, value]: (string | undefined)[], system: SearchableSystem | null): Meaning | null {
  const name = latinName(typed!);
  if (!system?.parameters.includes(name)) return null;
  return { kind: 'parameter', name, value: plainMinus(value!) };
}

/**
 * A run of capital letters, all of the alphabet, is an itinerary; a run of digits only where the system's
 * letters are digits and the first is a zero, since it would be a number otherwise.
 */
function readItinerary([run]: (string | undefined)[], system: SearchableSystem | null): Meaning | null {
  const letters = system ? system.letters : ['A', 'B'];
  const fits = Array.from(run!).every((letter) => letters.includes(letter));
  if (!fits || (/^\d+$/.test(run!) && !/^0\d/.test(run!))) return null;
  return { kind: 'itinerary', value: run! };
}

function readReturns([min, max]: (string | undefined)[]): Meaning {
  return { kind: 'returns', min: min!, max: max ?? min! };
}

function readStability([words]: (string | undefined)[]): Meaning {
  const typed = words!.toLowerCase().split(/[\s,]+/);
  return { kind: 'stability', values: STABILITIES.filter((one) => typed.includes(one)) };
}

const GREEK: Record<string, string> = {
  α: 'alpha',
  β: 'beta',
  γ: 'gamma',
  δ: 'delta',
  ε: 'epsilon',
  ζ: 'zeta',
  η: 'eta',
  θ: 'theta',
  κ: 'kappa',
  λ: 'lambda',
  μ: 'mu',
  ν: 'nu',
  ξ: 'xi',
  ρ: 'rho',
  σ: 'sigma',
  τ: 'tau',
  φ: 'phi',
  χ: 'chi',
  ψ: 'psi',
  ω: 'omega',
};

/** A parameter's name as the system writes it: Greek letters are spelled out. */
const latinName = (name: string): string => GREEK[name] ?? name;
