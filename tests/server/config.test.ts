import { mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ConfigError, type Environment, readConfig, requireDatabaseUrl } from '@/server/config';

let stateFolder: string;
beforeEach(() => void (stateFolder = mkdtempSync(join(tmpdir(), 'ritornel-config-'))));
afterEach(() => rmSync(stateFolder, { recursive: true }));

const read = (environment: Environment = {}) => readConfig({ STATE_FOLDER: stateFolder, ...environment });

const problemsOf = (environment: Environment): readonly string[] => {
  try {
    read(environment);
  } catch (error) {
    if (error instanceof ConfigError) return error.problems;
    throw error;
  }
  return [];
};

const soundProduction = {
  NODE_ENV: 'production',
  SMTP_URL: 'smtp://mail.example.org',
  SESSION_SECRET: 'k'.repeat(32),
  DATABASE_URL: 'postgres://ritornel@db.example.org/ritornel',
};

describe('readConfig', () => {
  it('needs nothing set for a first start', () => {
    const config = read();
    expect(config).toMatchObject({ port: 4170, portChosen: false, host: '127.0.0.1', production: false, demo: true });
    expect(config).toMatchObject({ publicUrl: 'http://127.0.0.1:4170', databaseUrl: null, smtpUrl: null });
  });

  it('keeps a session secret of its own that only its owner can read', () => {
    const { sessionSecret } = read();
    expect(sessionSecret).toHaveLength(64);
    expect(read().sessionSecret).toBe(sessionSecret);
    const file = join(stateFolder, 'session-secret');
    expect(readFileSync(file, 'utf8').trim()).toBe(sessionSecret);
    expect(statSync(file).mode & 0o777).toBe(0o600);
  });

  it('loads no demo content into a database that someone gave, unless asked', () => {
    const DATABASE_URL = 'postgres://ritornel@127.0.0.1/ritornel';
    expect(read({ DATABASE_URL }).demo).toBe(false);
    expect(read({ DATABASE_URL, DEMO: 'on' })).toMatchObject({ demo: true, demoEntries: true });
    expect(read({ DATABASE_URL, DEMO: 'accounts' })).toMatchObject({ demo: true, demoEntries: false });
  });

  it('takes the one role for both when no owner is given', () => {
    const config = read({ DATABASE_URL: 'postgres://one@127.0.0.1/ritornel' });
    expect(config.databaseOwnerUrl).toBe('postgres://one@127.0.0.1/ritornel');
  });

  it('accepts a complete production environment', () => {
    expect(read(soundProduction)).toMatchObject({ production: true, demo: false, smtpUrl: 'smtp://mail.example.org' });
  });

  it.each([
    ['a port that is no number', { PORT: '80a' }, /^PORT is "80a"/],
    ['a port beyond the last', { PORT: '65536' }, /^PORT is "65536"/],
    ['a port written in exponents', { PORT: '4e3' }, /^PORT is "4e3"/],
    ['an unknown environment', { NODE_ENV: 'staging' }, /^NODE_ENV is "staging"/],
    ['a database of another kind', { DATABASE_URL: 'mysql://a@b/c' }, /^DATABASE_URL .* postgres:\/\//],
    ['a mail server without a protocol', { SMTP_URL: 'mail.example.org' }, /^SMTP_URL .* smtp:\/\//],
    ['a public address that is a path', { PUBLIC_URL: '/here' }, /^PUBLIC_URL/],
    ['no threads', { WORKER_THREADS: '0' }, /^WORKER_THREADS is "0": use a whole number from 1 to 64/],
    ['a short session secret', { SESSION_SECRET: 'short' }, /^SESSION_SECRET has 5 characters: at least 32/],
    ['production without mail', { ...soundProduction, SMTP_URL: '' }, /^SMTP_URL is not set/],
    ['production without a session secret', { ...soundProduction, SESSION_SECRET: undefined }, /^SESSION_SECRET/],
    ['production with demo accounts', { ...soundProduction, DEMO: 'on' }, /^DEMO is on/],
  ])('refuses %s', (_, environment, message) => {
    const problems = problemsOf(environment);
    expect(problems).toHaveLength(1);
    expect(problems[0]).toMatch(message);
  });

  it('lists everything that is wrong at once', () => {
    const problems = problemsOf({ PORT: '0', DEMO: 'maybe', TRUST_PROXY: 'yes' });
    expect(problems.map((problem) => problem.split(' ')[0])).toEqual(['PORT', 'DEMO', 'TRUST_PROXY']);
  });

  it('does not repeat an address in its error, which may hold a password', () => {
    expect(problemsOf({ DATABASE_URL: 'http://someone:hunter2@db' }).join()).not.toContain('hunter2');
  });
});

describe('requireDatabaseUrl', () => {
  it('says how to get one', () => {
    expect(() => requireDatabaseUrl(read())).toThrow(/DATABASE_URL is not set.*npm start/);
  });
});
