import type { NamedMigration } from '@/server/migrate';
import * as createAccounts from './20261201T0600-create-accounts';
import * as createRequestTables from './20261201T0601-create-request-tables';
import * as createExtensions from './20261201T0610-create-extensions';
import * as createSystems from './20261201T0611-create-systems';
import * as createSubmissions from './20261201T0612-create-submissions';
import * as createChecks from './20261201T0613-create-checks';
import * as createEvents from './20261201T0614-create-events';
import * as createOrbits from './20261201T0615-create-orbits';
import * as indexOrbits from './20261201T0616-index-orbits';
import * as createOrbitRevisions from './20261201T0617-create-orbit-revisions';
import * as forbidRewriting from './20261201T0618-forbid-rewriting';
import * as guardPeople from './20261201T0619-guard-people';
import * as createWorkers from './20261201T0620-create-workers';
import * as createReleases from './20261201T1210-create-releases';
import * as createOrbitImages from './20261201T1230-create-orbit-images';
import * as addDigests from './20261201T1240-add-digests';
import * as createRefinements from './20261201T1250-create-refinements';

/** Every migration in order; the names are what the database remembers. */
export const migrations: readonly NamedMigration[] = [
  { name: '20261201T0600-create-accounts', ...createAccounts },
  { name: '20261201T0601-create-request-tables', ...createRequestTables },
  { name: '20261201T0610-create-extensions', ...createExtensions },
  { name: '20261201T0611-create-systems', ...createSystems },
  { name: '20261201T0612-create-submissions', ...createSubmissions },
  { name: '20261201T0613-create-checks', ...createChecks },
  { name: '20261201T0614-create-events', ...createEvents },
  { name: '20261201T0615-create-orbits', ...createOrbits },
  { name: '20261201T0616-index-orbits', ...indexOrbits },
  { name: '20261201T0617-create-orbit-revisions', ...createOrbitRevisions },
  { name: '20261201T0618-forbid-rewriting', ...forbidRewriting },
  { name: '20261201T0619-guard-people', ...guardPeople },
  { name: '20261201T0620-create-workers', ...createWorkers },
  { name: '20261201T1210-create-releases', ...createReleases },
  { name: '20261201T1230-create-orbit-images', ...createOrbitImages },
  { name: '20261201T1240-add-digests', ...addDigests },
  { name: '20261201T1250-create-refinements', ...createRefinements },
];
