import { createRequire } from 'node:module';
import { bootstrap } from './bootstrap.mjs';

bootstrap({ chromium: false, ownDatabase: !process.env.DATABASE_URL?.trim() });

// Only now are the packages sure to be here. One process from here on, so that signals need no forwarding.
const require = createRequire(import.meta.url);
require('tsx/cjs');
require('../start.ts');
