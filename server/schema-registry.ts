import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import Ajv2020, { type ValidateFunction } from 'ajv/dist/2020';
import addFormats from 'ajv-formats';

const FOLDER = join(__dirname, '..', 'schemas');
const SUFFIX = '.schema.json';

export interface SchemaDocument {
  $id: string;
  title: string;
  [member: string]: unknown;
}

/** The contract's schemas by name (`submission-body`), as they are served and as bodies are validated. */
export const schemaDocuments: ReadonlyMap<string, SchemaDocument> = new Map(
  readdirSync(FOLDER)
    .filter((file) => file.endsWith(SUFFIX))
    .sort()
    .map((file) => [
      file.slice(0, -SUFFIX.length),
      JSON.parse(readFileSync(join(FOLDER, file), 'utf8')) as SchemaDocument,
    ]),
);

const ajv = new Ajv2020({ allErrors: true, strict: true, allowUnionTypes: true, verbose: true });
addFormats(ajv);
for (const document of schemaDocuments.values()) ajv.addSchema(document);

/**
 * The compiled validator of one schema.
 *
 * @throws {RangeError} when the contract has no schema of that name: a slip in the code.
 */
export function validatorOf(name: string): ValidateFunction {
  const document = schemaDocuments.get(name);
  const validate = document && ajv.getSchema(document.$id);
  if (!validate) throw new RangeError(`schemas/ holds no ${name}${SUFFIX}`);
  return validate;
}
