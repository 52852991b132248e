import type { Pool } from 'pg';
import type { Sequelize } from 'sequelize';
import type { Config } from '@/server/config';
import type { Log } from '@/server/log';
import type { CheckWatch } from '@/server/services/check-watch';
import type { Tracer } from '@/server/services/tracer';

/** Everything a web application needs from the outside; tests build it with a database of their own. */
export interface AppDependencies {
  config: Config;
  /** Models are defined on it (`defineModels`). */
  db: Sequelize;
  /** For what wants plain connections: sessions, rate limits, database cursors of exports. */
  pool: Pool;
  log: Log;
  /** Hears when a check gets on. */
  checks: CheckWatch;
  /** Draws orbits on threads of its own. */
  tracer: Tracer;
}
