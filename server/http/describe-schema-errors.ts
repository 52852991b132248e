import type { ErrorObject } from 'ajv';
import type { FieldError } from '@/server/errors';
import { childPointer } from '@/server/http/json-pointer';
import { schemaSentence } from '@/server/http/schema-sentence';

/**
 * Ajv's errors as one clear sentence a field.
 *
 * Ajv reports every branch of an `anyOf`; people meant one of them, so only the branch that fits best is told.
 */
export function describeSchemaErrors(errors: readonly ErrorObject[]): FieldError[] {
  const told = new Map<string, FieldError>();
  for (const error of withoutHopelessBranches(errors)) {
    const pointer = pointerOf(error);
    if (!told.has(pointer)) told.set(pointer, { pointer, message: schemaSentence(error, pointer) });
  }
  return [...told.values()];
}

/** The field an error is about: for a missing or unknown member that member, not its parent. */
function pointerOf(error: ErrorObject): string {
  const { missingProperty, additionalProperty, propertyName } = error.params as Record<string, string | undefined>;
  const member = missingProperty ?? additionalProperty ?? propertyName;
  return member === undefined ? error.instancePath : childPointer(error.instancePath, member);
}

function withoutHopelessBranches(errors: readonly ErrorObject[]): ErrorObject[] {
  const kept: ErrorObject[] = [];
  for (const error of errors) {
    if (error.keyword === 'anyOf') {
      // The errors of the branches come right before the error of their anyOf.
      let first = kept.length;
      while (first > 0 && isInside(kept[first - 1]!, error)) first -= 1;
      kept.push(...bestBranch(kept.splice(first), error));
    } else {
      kept.push(error);
    }
  }
  return kept;
}

const isInside = (inner: ErrorObject, outer: ErrorObject): boolean =>
  inner.instancePath === outer.instancePath || inner.instancePath.startsWith(`${outer.instancePath}/`);

/** Errors of the branch whose type fits and that misses least; the anyOf itself when no branch has the right type. */
function bestBranch(inside: ErrorObject[], anyOf: ErrorObject): ErrorObject[] {
  const branches = new Map<string, ErrorObject[]>();
  for (const error of inside) {
    const key = branchOf(error, anyOf);
    branches.set(key, [...(branches.get(key) ?? []), error]);
  }
  const isHere = (error: ErrorObject): boolean => error.instancePath === anyOf.instancePath;
  const fitting = [...branches.values()].filter(
    (branch) => !branch.some((error) => isHere(error) && (error.keyword === 'type' || error.keyword === 'anyOf')),
  );
  const misses = (branch: ErrorObject[]): number =>
    branch.filter((error) => isHere(error) && error.keyword === 'required').length * inside.length + branch.length;
  fitting.sort((a, b) => misses(a) - misses(b));
  return fitting[0] ?? [anyOf];
}

/** Which branch an error belongs to: its number, or for one behind a reference the schema it is in. */
function branchOf(error: ErrorObject, anyOf: ErrorObject): string {
  const below = error.schemaPath.startsWith(`${anyOf.schemaPath}/`)
    ? error.schemaPath.slice(anyOf.schemaPath.length + 1)
    : error.schemaPath;
  return below.split('/')[0] === '' ? below : below.split('/')[0]!;
}
