import { scanJson, type JsonNumber } from '@/server/http/scan-json';

/** Members of a submission's body whose numbers are decimal texts to us. */
const TYPED_MEMBERS = new Set([
  'point',
  'points',
  'period',
  'returnTimes',
  'tolerance',
  'parameters',
  'multipliers',
  'section',
]);

/**
 * Put quotes around the JSON numbers that JSON.parse would not give back digit by digit.
 *
 * `27.0` and `1.55865221071617472` mean more digits than a double keeps or shows; as texts they stay as typed.
 * Only members that take a typed number are touched, so `"returns": 2.0` stays a number.
 */
export function keepTypedDigits(json: string): string {
  const pieces: string[] = [];
  let done = 0;
  scanJson(json, (number) => {
    if (!isTyped(number) || JSON.stringify(JSON.parse(number.text)) === number.text) return;
    pieces.push(json.slice(done, number.start), '"', number.text, '"');
    done = number.end;
  });
  return pieces.length === 0 ? json : pieces.join('') + json.slice(done);
}

function isTyped({ path }: JsonNumber): boolean {
  if (path[0] === 'system') return path[1] === 'parameters' && path[3] === 'value';
  return path[0] !== undefined && TYPED_MEMBERS.has(path[0]);
}
