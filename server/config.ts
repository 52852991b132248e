import { randomBytes } from 'node:crypto';
import { resolve } from 'node:path';
import { keptSecret } from '@/server/kept-secret';

/** What the environment says, read once at the start of a process. */
export interface Config {
  production: boolean;
  host: string;
  port: number;
  /** Whether PORT was set; when not, a taken port is replaced by a free one. */
  portChosen: boolean;
  /** Address that links in mails begin with, without a closing slash. */
  publicUrl: string;
  /** Where the application reads and writes; null only before `npm start` has its private cluster. */
  databaseUrl: string | null;
  /** The role that owns the tables and runs migrations; the same as `databaseUrl` when not given. */
  databaseOwnerUrl: string | null;
  /** Mail server; null means the local sink. */
  smtpUrl: string | null;
  mailFrom: string;
  metricsToken: string | null;
  sessionSecret: string;
  trustProxy: number;
  workerThreads: number;
  /** Demo accounts are wanted. */
  demo: boolean;
  /** The demo's entries too. */
  demoEntries: boolean;
  logLevel: string;
  /** Folder of what this checkout keeps: cluster settings, demo accounts, keys. */
  stateFolder: string;
  /** Folder with initdb and pg_ctl, where they are not in one of the usual places. */
  postgresBin: string | null;
}

export type Environment = Readonly<Record<string, string | undefined>>;

const DEFAULT_PORT = 4170;
const DEFAULT_THREADS = 2;
const MAX_THREADS = 64;
const MAX_PROXIES = 16;
/** Half of a SHA-256 key in hexadecimal: anything shorter is guessable or a slip. */
const MIN_SECRET_LENGTH = 32;
const SECRET_BYTES = 32;
const LOG_LEVELS = ['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent'];

/** Every wrong variable at once, so that a person corrects the environment in one go. */
export class ConfigError extends Error {
  constructor(readonly problems: readonly string[]) {
    super(
      `The configuration has ${problems.length === 1 ? 'an error' : `${problems.length} errors`}:\n  ${problems.join('\n  ')}`,
    );
    this.name = 'ConfigError';
  }
}

/**
 * Read and validate the configuration.
 *
 * @throws {ConfigError} naming every variable that is wrong or missing.
 */
export function readConfig(environment: Environment = process.env): Config {
  const read = new Reader(environment);
  const production = read.choice('NODE_ENV', ['development', 'test', 'production'], 'development') === 'production';
  const host = read.text('HOST') ?? '127.0.0.1';
  const port = read.whole('PORT', { from: 1, to: 65_535, otherwise: DEFAULT_PORT });
  const databaseUrl = read.url('DATABASE_URL', ['postgres:', 'postgresql:']);
  const stateFolder = resolve(read.text('STATE_FOLDER') ?? '.data');
  const demo = read.choice('DEMO', ['on', 'accounts', 'off'], !production && databaseUrl === null ? 'on' : 'off');
  const config: Omit<Config, 'sessionSecret'> = {
    production,
    host,
    port,
    portChosen: read.text('PORT') !== null,
    publicUrl: (read.url('PUBLIC_URL', ['http:', 'https:']) ?? `http://${host}:${port}`).replace(/\/+$/, ''),
    databaseUrl,
    databaseOwnerUrl: read.url('DATABASE_OWNER_URL', ['postgres:', 'postgresql:']) ?? databaseUrl,
    smtpUrl: read.url('SMTP_URL', ['smtp:', 'smtps:']),
    mailFrom: read.text('MAIL_FROM') ?? 'Ritornel <ritornel@localhost>',
    metricsToken: read.text('METRICS_TOKEN'),
    trustProxy: read.whole('TRUST_PROXY', { from: 0, to: MAX_PROXIES, otherwise: 0 }),
    workerThreads: read.whole('WORKER_THREADS', { from: 1, to: MAX_THREADS, otherwise: DEFAULT_THREADS }),
    demo: demo !== 'off',
    demoEntries: demo === 'on',
    logLevel: read.choice('LOG_LEVEL', LOG_LEVELS, 'info'),
    stateFolder,
    postgresBin: read.text('POSTGRES_BIN'),
  };
  const secret = read.text('SESSION_SECRET');
  if (secret !== null && secret.length < MIN_SECRET_LENGTH) {
    read.problem(`SESSION_SECRET has ${secret.length} characters: at least ${MIN_SECRET_LENGTH} are needed`);
  }
  if (production) checkProduction(config, secret, read);
  if (read.problems.length > 0) throw new ConfigError(read.problems);
  return { ...config, sessionSecret: secret ?? ownSecret(stateFolder) };
}

/** The address of the database, for processes that can do nothing without one. */
export function requireDatabaseUrl(config: Config): string {
  if (config.databaseUrl === null) {
    throw new ConfigError(['DATABASE_URL is not set: this process needs a database (npm start makes a private one)']);
  }
  return config.databaseUrl;
}

function checkProduction(config: Omit<Config, 'sessionSecret'>, secret: string | null, read: Reader): void {
  if (config.smtpUrl === null) read.problem('SMTP_URL is not set: production sends real mail and has no local sink');
  if (secret === null) read.problem('SESSION_SECRET is not set: production needs one, the same for every process');
  if (config.demo) read.problem('DEMO is on: production has no demo accounts');
}

function ownSecret(stateFolder: string): string {
  return keptSecret(stateFolder, 'session-secret', () => randomBytes(SECRET_BYTES).toString('hex'));
}

/** Reads single variables and remembers what was wrong with them. */
class Reader {
  readonly problems: string[] = [];

  constructor(private readonly environment: Environment) {}

  problem(text: string): void {
    this.problems.push(text);
  }

  /** The variable without surrounding blanks; null when unset or empty. */
  text(name: string): string | null {
    const value = this.environment[name]?.trim();
    return value ? value : null;
  }

  choice(name: string, allowed: readonly string[], otherwise: string): string {
    const value = this.text(name) ?? otherwise;
    if (!allowed.includes(value)) this.problem(`${name} is "${value}": use one of ${allowed.join(', ')}`);
    return value;
  }

  whole(name: string, range: { from: number; to: number; otherwise: number }): number {
    const value = this.text(name);
    if (value === null) return range.otherwise;
    const number = Number(value);
    if (/^\d+$/.test(value) && number >= range.from && number <= range.to) return number;
    this.problem(`${name} is "${value}": use a whole number from ${range.from} to ${range.to}`);
    return range.otherwise;
  }

  /** An address with one of the protocols. A wrong one is not repeated in the message: it may hold a password. */
  url(name: string, protocols: readonly string[]): string | null {
    const value = this.text(name);
    if (value === null) return null;
    if (URL.canParse(value) && protocols.includes(new URL(value).protocol)) return value;
    this.problem(
      `${name} is not an address that begins with ${protocols.map((protocol) => `${protocol}//`).join(' or ')}`,
    );
    return null;
  }
}
