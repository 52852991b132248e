import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import Ajv2020 from 'ajv/dist/2020';
import addFormats from 'ajv-formats';
import { entryAAB, entryAB, lorenzSystem, pageOf, rosslerSystem, traceAB } from '../support/lorenz-fixtures';

const FOLDER = join(__dirname, '../../schemas');
const ajv = new Ajv2020({ allErrors: true, strict: true, allowUnionTypes: true });
addFormats(ajv);
for (const file of readdirSync(FOLDER).filter((name) => name.endsWith('.schema.json'))) {
  ajv.addSchema(JSON.parse(readFileSync(join(FOLDER, file), 'utf8')));
}

describe('what the tests of the screens are fed', () => {
  it.each([
    ['entry', entryAB],
    ['entry', entryAAB],
    ['system', lorenzSystem],
    ['system', rosslerSystem],
    ['orbit-page', pageOf(entryAB, entryAAB)],
    ['trace', traceAB],
  ])('is what the archive sends: %s', (name, value) => {
    const validate = ajv.getSchema(`/schemas/${name}.schema.json`);
    expect(validate?.(value) === true ? [] : validate?.errors).toEqual([]);
  });
});
