import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { hasChromium, hasPostgres, installDebianPackage, say, SetupStop } from './machine.mjs';
import { checkNode, ensurePackages } from './packages.mjs';

export const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

/** Whoever names a folder or program has one: when it isn't there, installing another would not help. */
const isSet = (variable) => Boolean(process.env[variable]?.trim());

/** Bring this machine and checkout to where the product can run. Says what is missing and ends the process if it can't. */
export function bootstrap({ chromium, ownDatabase }) {
  process.chdir(root);
  try {
    checkNode(root);
    ensurePackages(root);
    if (ownDatabase && !isSet('POSTGRES_BIN') && !hasPostgres())
      installDebianPackage('postgresql', 'The private database');
    if (chromium && !isSet('CHROMIUM') && !hasChromium()) installDebianPackage('chromium', 'The end-to-end test');
  } catch (error) {
    if (!(error instanceof SetupStop)) throw error;
    say(error.message);
    process.exit(1);
  }
}
