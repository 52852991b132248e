import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { delimiter, join } from 'node:path';

/** Something is missing that this program can't put there itself: the message says the one line to run. */
export class SetupStop extends Error {}

export const say = (line) => process.stdout.write(`${line}\n`);

/** Run a program with its output shown; its exit code. It gets no input: set-up asks nobody anything. */
export function run(file, args, options = {}) {
  const { status, error } = spawnSync(file, args, { stdio: ['ignore', 'inherit', 'inherit'], ...options });
  if (error) say(`${file}: ${error.message}`);
  return status ?? 1;
}

/** Whether PostgreSQL's server programs are here: in Debian's place or on the PATH. */
export function hasPostgres() {
  const debian = '/usr/lib/postgresql';
  const versions = existsSync(debian) ? readdirSync(debian) : [];
  const folders = [...versions.map((version) => join(debian, version, 'bin')), ...pathFolders()];
  return folders.some((folder) => existsSync(join(folder, 'initdb')) && existsSync(join(folder, 'pg_ctl')));
}

/** Whether a Chromium is on the PATH. */
export const hasChromium = () => pathFolders().some((folder) => existsSync(join(folder, 'chromium')));

const pathFolders = () => (process.env.PATH ?? '').split(delimiter).filter((folder) => folder !== '');

/**
 * Install a Debian package: as root, or where sudo asks for no password.
 *
 * @throws {SetupStop} with the line to run where there is no right to, or the installation fails.
 */
export function installDebianPackage(name, purpose) {
  const byHand = `sudo apt-get update && sudo apt-get install -y ${name}`;
  const prefix = rightToInstall();
  if (!prefix) {
    throw new SetupStop(
      `${purpose} needs the Debian package ${name}, and this account may not install it. Run:\n  ${byHand}`,
    );
  }
  say(`Installing the Debian package ${name} (${purpose})`);
  const environment = ['env', 'DEBIAN_FRONTEND=noninteractive'];
  const apt = (...args) => {
    const [file, ...rest] = [...prefix, ...environment, 'apt-get', ...args];
    return run(file, rest);
  };
  if (apt('update', '-q') !== 0) say('apt-get update failed: trying with the package lists that are here');
  if (apt('install', '-q', '-y', '--no-install-recommends', name) !== 0) {
    throw new SetupStop(`The Debian package ${name} could not be installed (see above). To try by hand:\n  ${byHand}`);
  }
}

/** What to put before a command to run it as root; null when that can't be done without asking. */
function rightToInstall() {
  if (!pathFolders().some((folder) => existsSync(join(folder, 'apt-get')))) return null;
  if (process.getuid?.() === 0) return [];
  return spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' }).status === 0 ? ['sudo', '-n'] : null;
}
