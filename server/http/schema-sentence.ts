import type { ErrorObject } from 'ajv';
import { pointerLabel } from '@/server/http/json-pointer';
import { schemaDocuments } from '@/server/schema-registry';

/** Longest piece of what somebody typed that an error repeats. */
const MAX_QUOTED = 60;
/** Most members or choices that an error lists. */
const MAX_LISTED = 24;

const typedNumber = schemaDocuments.get('typed-number') as unknown as { anyOf: { pattern?: string }[] };

/** What the patterns of the contract mean, in words. */
const patternSentences = new Map<string, string>([
  [
    typedNumber.anyOf[0]?.pattern ?? '',
    'is not a number: write digits with an optional point and exponent, such as 27, -13.7636 or 1e-9, or a fraction such as 8/3',
  ],
  ['^[A-Za-z0-9]+$', 'may hold letters and digits only, one for each return'],
  ['^[A-Za-z][A-Za-z0-9_]*$', 'is not a name: a letter, then letters, digits or underscores'],
  ['^[a-z][a-z0-9-]{1,39}$', 'is not a slug: 2 to 40 lower-case letters, digits and hyphens, a letter first'],
  ['^[0-9]{4}-[0-9]{4}-[0-9]{4}-[0-9]{3}[0-9X]$', 'is not an ORCID iD such as 0000-0002-1825-0097'],
]);

const typeNames: Record<string, string> = {
  string: 'text',
  number: 'a number',
  integer: 'a whole number',
  boolean: 'true or false',
  object: 'an object',
  array: 'a list',
  null: 'null',
};

type Params = Record<string, string | number | string[] | undefined>;
type Sentence = (error: ErrorObject, params: Params) => string;

const sentences: Record<string, Sentence> = {
  required: () => 'is missing',
  additionalProperties: (error) => `is not known here; known are ${listed(Object.keys(membersOf(error)))}`,
  type: (error, { type }) => `must be ${[type].flat().map(typeName).join(' or ')}, not ${kindOf(error.data)}`,
  anyOf: (error) => `must be ${alternatives(error).join(' or ')}, not ${kindOf(error.data)}`,
  enum: (error) => `is ${quoted(error.data)}; it can be ${listed(error.schema as unknown[])}`,
  pattern: (error, { pattern }) =>
    `${patternSentences.get(String(pattern)) ?? 'does not have the expected form'} (typed: ${quoted(error.data)})`,
  format: (error, { format }) =>
    format === 'email'
      ? 'is not an e-mail address'
      : `${quoted(error.data)} does not have the form of a ${String(format)}`,
  minLength: (error, { limit }) =>
    error.data === '' ? 'is empty' : `has ${lengthOf(error.data)} characters; at least ${String(limit)} are needed`,
  maxLength: (error, { limit }) => `has ${lengthOf(error.data)} characters; at most ${String(limit)} are allowed`,
  minItems: (error, { limit }) => `has ${lengthOf(error.data)} items; at least ${String(limit)} are needed`,
  maxItems: (error, { limit }) => `has ${lengthOf(error.data)} items; at most ${String(limit)} are allowed`,
  maxProperties: (error, { limit }) =>
    `has ${Object.keys(error.data as object).length} members; at most ${String(limit)} are allowed`,
  minimum: (error, { limit }) => `is ${String(error.data)}; the smallest allowed is ${String(limit)}`,
  maximum: (error, { limit }) => `is ${String(error.data)}; the largest allowed is ${String(limit)}`,
  propertyNames: () => 'is too long a name; at most 32 characters are allowed',
};

/** What is wrong with one field, as a sentence. */
export function schemaSentence(error: ErrorObject, pointer: string): string {
  const sentence = sentences[error.keyword];
  const said = sentence ? sentence(error, error.params as Params) : (error.message ?? 'is not allowed');
  return `${pointerLabel(pointer)} ${said}.`;
}

const typeName = (type: string | number | undefined): string => typeNames[String(type)] ?? String(type);

const membersOf = (error: ErrorObject): object => (error.parentSchema?.properties as object | undefined) ?? {};

const listed = (values: readonly unknown[]): string =>
  values.slice(0, MAX_LISTED).map(String).join(', ') + (values.length > MAX_LISTED ? ' …' : '');

const lengthOf = (data: unknown): number =>
  typeof data === 'string' ? Array.from(data).length : (data as unknown[]).length;

function alternatives(error: ErrorObject): string[] {
  const names = (error.schema as { type?: string; $ref?: string }[]).map((branch) => {
    if (branch.$ref?.startsWith('typed-number')) return 'a number or its text';
    return typeName(branch.type ?? 'object');
  });
  return [...new Set(names)];
}

function kindOf(data: unknown): string {
  if (data === null) return 'null';
  if (Array.isArray(data)) return 'a list';
  return typeNames[typeof data] ?? typeof data;
}

function quoted(data: unknown): string {
  const text = typeof data === 'string' ? data : JSON.stringify(data);
  return `"${text.length > MAX_QUOTED ? `${text.slice(0, MAX_QUOTED)}…` : text}"`;
}
