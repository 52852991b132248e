import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { compile, type JSONSchema } from 'json-schema-to-typescript';
import { format, resolveConfig } from 'prettier';

const folder = __dirname;
const target = join(folder, 'generated', 'contract.ts');
const banner = '// Written by schemas/generate.ts from schemas/*.schema.json: change those and run `npm run schemas`.';

/** Every contract of the folder as one schema, so that a type used by several contracts is declared once. */
function wholeContract(): JSONSchema {
  const files = readdirSync(folder)
    .filter((file) => file.endsWith('.schema.json'))
    .sort();
  const properties = Object.fromEntries(
    files.map((file) => {
      const { title } = JSON.parse(readFileSync(join(folder, file), 'utf8')) as { title: string };
      return [title, { $ref: file }];
    }),
  );
  return {
    title: 'Contract',
    type: 'object',
    additionalProperties: false,
    required: Object.keys(properties),
    properties,
  };
}

async function main(): Promise<void> {
  const types = await compile(wholeContract(), 'Contract', {
    cwd: `${folder}/`,
    bannerComment: banner,
    ignoreMinAndMaxItems: true,
    format: false,
  });
  const style = await resolveConfig(target);
  writeFileSync(target, await format(types, { ...style, parser: 'typescript' }));
}

void main();
