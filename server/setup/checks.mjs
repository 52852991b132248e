import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './bootstrap.mjs';
import { run, say } from './machine.mjs';

/** Code that a program writes from another source, and the program. */
const GENERATED = [
  { folder: 'schemas/generated', program: 'schemas/generate.ts' },
  { folder: 'server/formulas/generated', program: 'server/formulas/generate-parser.ts' },
];

/** The quick ones first, so that a slip is told soon. */
const STEPS = [
  { name: 'import directions', check: () => runBin('depcruise', depcruise) },
  { name: 'format', check: () => runBin('prettier', ['--check', '--log-level', 'warn', '.']) },
  { name: 'types', check: () => runBin('tsc', ['--noEmit', '-p', 'tsconfig.json']) },
  { name: 'generated code', check: generatedIsCurrent },
  { name: 'the description of the API', check: () => runTsx('server/setup/lint-openapi.ts') },
  { name: 'unused code', check: () => runBin('knip', []) },
  { name: 'lint', check: () => runBin('eslint', ['--max-warnings', '0', '.']) },
];

const depcruise = ['--config', '.dependency-cruiser.cjs', 'app', 'features', 'server', 'migrations', 'schemas'];

/** Run every check, also after one fails; the names of those that failed. */
export function runChecks() {
  return STEPS.filter(({ name, check }) => {
    say(`Checking ${name}`);
    const passed = check();
    if (!passed) say(`FAILED: ${name}`);
    return !passed;
  }).map(({ name }) => name);
}

const runBin = (name, args) => run(join(root, 'node_modules', '.bin', name), args, { cwd: root }) === 0;

const runTsx = (program) => run(process.execPath, ['--import', 'tsx', program], { cwd: root }) === 0;

/** Write the generated code again: what is in the repository must be what its source says. */
function generatedIsCurrent() {
  let current = true;
  for (const { folder, program } of GENERATED) {
    const before = contents(folder);
    if (!runTsx(program)) current = false;
    const after = contents(folder);
    if (before !== after) {
      say(`${folder} was not what ${program} writes. It is now: look at the difference and commit it.`);
      current = false;
    }
  }
  return current;
}

function contents(folder) {
  const path = join(root, folder);
  if (!existsSync(path)) return '';
  const files = readdirSync(path).sort();
  return JSON.stringify(files.map((file) => [file, readFileSync(join(path, file), 'utf8')]));
}
