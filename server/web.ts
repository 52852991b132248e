import { createServer } from 'node:http';
import { Pool } from 'pg';
import { Sequelize } from 'sequelize';
import { buildApp } from '@/server/app';
import { readConfig, requireDatabaseUrl } from '@/server/config';
import { createLog } from '@/server/log';
import { defineModels } from '@/server/models';
import { createCheckWatch } from '@/server/services/check-watch';
import { createTracer } from '@/server/services/tracer';
import { threadPool } from '@/server/thread-pool';

/** Connections to the database for the models, and as many again for sessions, limits and exports. */
const CONNECTIONS = 10;
/** Threads that follow orbits for drawing; checks are the workers'. */
const DRAWING_THREADS = 1;
/** How long answers under way may take after the order to stop. */
const STOP_PATIENCE_MS = 10_000;

const config = readConfig();
const log = createLog(config, 'web');
const databaseUrl = requireDatabaseUrl(config);
const db = new Sequelize(databaseUrl, { dialect: 'postgres', logging: false, pool: { max: CONNECTIONS } });
defineModels(db);
const pool = new Pool({ connectionString: databaseUrl, max: CONNECTIONS });
pool.on('error', (error) => log.warn({ err: error }, 'an idle connection to the database was lost'));

const checks = createCheckWatch(databaseUrl, log);
const tracer = createTracer(() => threadPool(DRAWING_THREADS));

const server = createServer(buildApp({ config, db, pool, log, checks, tracer }));
server.listen(config.port, config.host, () => log.info(`listening on ${config.host}:${config.port}`));
server.on('error', (error) => {
  log.fatal({ err: error }, 'the web server cannot listen');
  process.exit(1);
});

let stopping = false;
function stop(): void {
  if (stopping) return;
  stopping = true;
  log.info('stopping');
  const cut = setTimeout(() => server.closeAllConnections(), STOP_PATIENCE_MS);
  server.close(() => {
    clearTimeout(cut);
    Promise.all([db.close(), pool.end(), checks.close(), tracer.close()]).then(
      () => process.exit(0),
      (error: unknown) => {
        log.error({ err: error }, 'stopping');
        process.exit(1);
      },
    );
  });
  server.closeIdleConnections();
}
for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, stop);
