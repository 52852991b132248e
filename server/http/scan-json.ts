/** A number of a JSON text: where it stands and the members that lead to it. */
export interface JsonNumber {
  text: string;
  start: number;
  end: number;
  path: readonly string[];
}

/** The part of a scan that says what may come next. */
type Expected = 'value' | 'value-or-end' | 'member' | 'member-or-end' | 'colon' | 'comma-or-end' | 'nothing';

interface Level {
  list: boolean;
  member: string;
  index: number;
}

const TOKEN =
  /([{}[\],:])|("(?:[^"\\\u0000-\u001f]+|\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4}))*")|(-?(?:0|[1-9][0-9]*)(?:\.[0-9]+)?(?:[eE][+-]?[0-9]+)?)|(true|false|null)/y;
const BLANK = /[ \t\r\n]*/y;

/**
 * Walk through a JSON text (RFC 8259) without building it, telling every number.
 *
 * @returns null when the text is valid, else the 0-based position of the first character that cannot stand there.
 */
export function scanJson(text: string, onNumber: (number: JsonNumber) => void = () => undefined): number | null {
  const levels: Level[] = [];
  let expected: Expected = 'value';
  let at = 0;
  for (;;) {
    BLANK.lastIndex = at;
    BLANK.exec(text);
    at = BLANK.lastIndex;
    if (at >= text.length) return expected === 'nothing' ? null : at;
    TOKEN.lastIndex = at;
    const token = TOKEN.exec(text);
    if (!token) return at;
    const next = step(expected, token, levels);
    if (next === null) return at;
    if (token[3] !== undefined) {
      onNumber({ text: token[3], start: at, end: TOKEN.lastIndex, path: levels.map(memberOf) });
    }
    expected = next;
    at = TOKEN.lastIndex;
  }
}

const memberOf = (level: Level): string => (level.list ? String(level.index) : level.member);

/** What may follow the token; null when the token may not stand here. Opens and closes levels. */
function step(expected: Expected, token: RegExpExecArray, levels: Level[]): Expected | null {
  const [whole, mark, text] = token;
  const level = levels.at(-1);
  if (mark === undefined) {
    if (text !== undefined && (expected === 'member' || expected === 'member-or-end')) {
      level!.member = JSON.parse(text) as string;
      return 'colon';
    }
    return expected === 'value' || expected === 'value-or-end' ? afterValue(levels) : null;
  }
  if (whole === '{' || whole === '[') return open(expected, whole === '[', levels);
  if (whole === '}' || whole === ']') return close(expected, whole === ']', levels);
  if (whole === ':') return expected === 'colon' ? 'value' : null;
  if (expected !== 'comma-or-end' || !level) return null;
  level.index += 1;
  return level.list ? 'value' : 'member';
}

function open(expected: Expected, list: boolean, levels: Level[]): Expected | null {
  if (expected !== 'value' && expected !== 'value-or-end') return null;
  levels.push({ list, member: '', index: 0 });
  return list ? 'value-or-end' : 'member-or-end';
}

function close(expected: Expected, list: boolean, levels: Level[]): Expected | null {
  if (levels.at(-1)?.list !== list) return null;
  if (expected !== 'comma-or-end' && expected !== (list ? 'value-or-end' : 'member-or-end')) return null;
  levels.pop();
  return afterValue(levels);
}

const afterValue = (levels: Level[]): Expected => (levels.length === 0 ? 'nothing' : 'comma-or-end');
