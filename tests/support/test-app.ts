import type { Express } from 'express';
import { randomUUID } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Pool } from 'pg';
import { Sequelize } from 'sequelize';
import request from 'supertest';
import type { Role } from '@/schemas/generated/contract';
import { buildApp } from '@/server/app';
import type { AppDependencies } from '@/server/app-dependencies';
import { type Config, readConfig } from '@/server/config';
import { createLog } from '@/server/log';
import { defineModels } from '@/server/models';
import { User } from '@/server/models/user';
import { createCheckWatch } from '@/server/services/check-watch';
import { hashPassword } from '@/server/services/hash-password';
import { createTracer } from '@/server/services/tracer';
import { threadPool } from '@/server/thread-pool';
import { freshDatabase, type TestDatabase } from './database';

/** The application on a database of its own, without a port. */
export interface TestApp {
  app: Express;
  dependencies: AppDependencies;
  database: TestDatabase;
  close(): Promise<void>;
}

export const PASSWORD = 'a long enough password';

/** Build the application; `change` replaces parts of its configuration. */
export async function testApp(change: Partial<Config> = {}): Promise<TestApp> {
  const database = await freshDatabase();
  const stateFolder = mkdtempSync(join(tmpdir(), 'ritornel-app-'));
  const config: Config = {
    ...readConfig({ LOG_LEVEL: 'silent', STATE_FOLDER: stateFolder, DATABASE_URL: database.url, DEMO: 'off' }),
    ...change,
  };
  const db = new Sequelize(database.url, { dialect: 'postgres', logging: false });
  defineModels(db);
  const pool = new Pool({ connectionString: database.url, max: 4 });
  pool.on('error', () => undefined);
  const log = createLog(config, 'test');
  const checks = createCheckWatch(database.url, log);
  const tracer = createTracer(() => threadPool(1));
  const dependencies: AppDependencies = { config, db, pool, log, checks, tracer };
  return {
    app: buildApp(dependencies),
    dependencies,
    database,
    close: async () => {
      await Promise.all([db.close(), pool.end(), checks.close(), tracer.close()]);
      await database.drop();
      rmSync(stateFolder, { recursive: true, force: true });
    },
  };
}

/** A confirmed account with `PASSWORD`. */
export async function anAccount(
  role: Role = 'contributor',
  change: { email?: string; name?: string } = {},
): Promise<User> {
  return User.create({
    name: `A ${role}`,
    email: `${role}-${randomUUID()}@orbits.example`,
    orcid: null,
    role,
    passwordHash: await hashPassword(PASSWORD),
    confirmedAt: new Date(),
    ...change,
  });
}

/** An HTTP client that is signed in and keeps its cookie. */
export async function signedIn(app: Express, user: User): Promise<ReturnType<typeof request.agent>> {
  const agent = request.agent(app);
  await agent.post('/api/v1/session').send({ email: user.email, password: PASSWORD }).expect(200);
  return agent;
}
