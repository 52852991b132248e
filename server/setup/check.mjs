import { bootstrap } from './bootstrap.mjs';
import { runChecks } from './checks.mjs';
import { say } from './machine.mjs';

bootstrap({ chromium: false, ownDatabase: false });
const failed = runChecks();
say(failed.length === 0 ? 'All checks passed.' : `Failed: ${failed.join(', ')}`);
process.exit(failed.length === 0 ? 0 : 1);
