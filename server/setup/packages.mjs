import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { run, say, SetupStop } from './machine.mjs';

/** @throws {SetupStop} when this Node.js is older than package.json asks for. */
export function checkNode(root) {
  const { engines } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8'));
  const needed = engines.node.replace('>=', '').split('.').map(Number);
  const found = process.versions.node.split('.').map(Number);
  const step = needed.findIndex((part, index) => part !== found[index]);
  if (step >= 0 && found[step] < needed[step]) {
    throw new SetupStop(`Node.js ${engines.node} is needed; this is ${process.versions.node}.`);
  }
}

/** Install the npm packages where they are missing or not those of the lock file. */
export function ensurePackages(root) {
  const difference = packageDifference(root);
  if (!difference) return;
  say(`Installing the npm packages: ${difference}. This takes some minutes the first time.`);
  const npm = process.env.npm_execpath ? [process.execPath, process.env.npm_execpath] : ['npm'];
  const [file, ...args] = [...npm, 'ci', '--include=dev', '--no-audit', '--no-fund'];
  if (run(file, args, { cwd: root }) !== 0) {
    throw new SetupStop('The npm packages could not be installed (see above). To try by hand:\n  npm ci');
  }
}

/** In what the installed packages differ from the lock file; null when they don't. */
function packageDifference(root) {
  const installedFile = join(root, 'node_modules', '.package-lock.json');
  if (!existsSync(installedFile)) return 'none are here yet';
  const installed = readPackages(installedFile);
  for (const [path, wanted] of Object.entries(readPackages(join(root, 'package-lock.json')))) {
    if (path === '') continue;
    const found = installed[path];
    if (!found && (wanted.optional || wanted.devOptional || wanted.peer)) continue;
    if (found?.version !== wanted.version)
      return `${path.replace(/^.*node_modules\//, '')} is not as in package-lock.json`;
  }
  return null;
}

const readPackages = (file) => JSON.parse(readFileSync(file, 'utf8')).packages;
