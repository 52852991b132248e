import { createHash } from 'node:crypto';
import type { CheckRequest } from '@/schemas/generated/contract';
import type { CheckedSystem } from '@/server/formulas/checked-system';
import { readTypedNumber, type TypedNumberRead } from '@/server/formulas/typed-number';

/** All parameters of an orbit. */
export interface OrbitParameters {
  /** As typed, or as the system has them, in the system's order. */
  texts: Record<string, string>;
  /** The same as doubles. */
  values: Record<string, number>;
  /** Equal for orbits of the very same flow, however their parameters were typed. */
  hash: string;
}

/** The parameters of an orbit whose body has been validated: those typed, and the system's for the others. */
export function parametersOf(system: CheckedSystem, typed: CheckRequest['parameters']): OrbitParameters {
  const given = new Map(Object.entries(typed ?? {}));
  const all = system.parameters.map(({ name, read }): [string, TypedNumberRead] => {
    const own = given.get(name);
    return [name, own === undefined ? read : numberOf(own)];
  });
  const values = all.map(([name, { value }]): [string, number] => [name, value]);
  const sorted = [...values].sort(([a], [b]) => (a < b ? -1 : 1));
  return {
    texts: Object.fromEntries(all.map(([name, { text }]) => [name, text])),
    values: Object.fromEntries(values),
    hash: createHash('sha256').update(JSON.stringify(sorted)).digest('hex'),
  };
}

/**
 * A typed number that has been validated.
 *
 * @throws {RangeError} when it has not.
 */
export function numberOf(typed: string | number): TypedNumberRead {
  const read = readTypedNumber(typed);
  if (!read.ok) throw new RangeError(read.message);
  return read.number;
}
