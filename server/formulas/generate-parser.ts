import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import peggy from 'peggy';

const banner =
  '// Written by server/formulas/generate-parser.ts from grammar.peggy: change that and run `npm run parser`.\n';

/** Turn the grammar into the committed parser. */
function main(): void {
  const grammar = readFileSync(join(__dirname, 'grammar.peggy'), 'utf8');
  const source = peggy.generate(grammar, { output: 'source', format: 'commonjs' });
  writeFileSync(join(__dirname, 'generated', 'parser.js'), banner + source);
}

main();
