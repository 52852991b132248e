import type { FieldError } from '@/server/errors';
import { describeSchemaErrors } from '@/server/http/describe-schema-errors';
import { validatorOf } from '@/server/schema-registry';

/** What a schema of the contract says against a value, a sentence for each field. */
export function formErrors(schema: string, value: unknown): FieldError[] {
  const validate = validatorOf(schema);
  return validate(value) ? [] : describeSchemaErrors(validate.errors ?? []);
}
