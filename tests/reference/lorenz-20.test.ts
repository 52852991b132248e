import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { soundSystem } from '@/tests/reference/check-body';
import { readDatasetLine } from '@/tests/reference/dataset-line';
import { measureOrbit } from '@/tests/reference/measure-orbit';

const FILE = join(__dirname, 'lorenz-20-every-100th.ndjson');
const system = soundSystem(builtInSystems.find(({ slug }) => slug === 'lorenz')!);
const orbits = readFileSync(FILE, 'utf8')
  .trimEnd()
  .split('\n')
  .map((line) => readDatasetLine(line)!);

/** What the command prints, and its status. */
const verify = (...args: string[]) =>
  spawnSync(process.execPath, ['--import', 'tsx', join(__dirname, 'verify-dataset.ts'), ...args], {
    encoding: 'utf8',
    cwd: join(__dirname, '..', '..'),
  });

describe('every hundredth Lorenz orbit of up to 20 returns', () => {
  it('is one of 1,111', () => {
    expect(orbits).toHaveLength(1111);
  });

  it('has verdict, period, multiplier, returns and itinerary of the table, by the command for whole files', () => {
    const { status, stdout } = verify(FILE);
    expect(stdout).toContain('1111 orbits in ');
    expect(stdout).toContain(' 0 wrong.');
    expect(status).toBe(0);
    const worst = (words: string) => Number(new RegExp(`${words}: (\\S+) \\(`).exec(stdout)?.[1]);
    expect(worst('period, relative')).toBeLessThan(1e-12);
    expect(worst('unstable multiplier, relative')).toBeLessThan(1e-8);
  }, 240_000);
});

describe('the command for whole files', () => {
  it('says which orbit is wrong, and ends with a status that says so', () => {
    const folder = mkdtempSync(join(tmpdir(), 'ritornel-dataset-'));
    const file = join(folder, 'wrong.ndjson.gz');
    const line = '{"code":"AB","n":2,"period":1.6,"point":[-13.763610682134201,-19.578751942451795]}';
    writeFileSync(file, gzipSync(`${line}\nnonsense\n`));
    const { status, stdout } = verify(file);
    rmSync(folder, { recursive: true });
    expect(stdout).toMatch(/WRONG AB: verdict does-not-close/);
    expect(stdout).toMatch(/WRONG nonsense: /);
    expect(stdout).toMatch(/2 orbits in .* 2 wrong/);
    expect(status).toBe(1);
  });

  it('asks for a file, and says when it is not there', () => {
    expect(verify()).toMatchObject({ status: 2, stderr: expect.stringContaining('Say which file') });
    expect(verify('/nowhere/orbits.ndjson')).toMatchObject({ status: 1, stderr: expect.stringContaining('ENOENT') });
  });
});

describe('measuring an orbit against a data set', () => {
  const AB = orbits.find(({ label }) => label === 'AB')!;

  it.each([
    ['a period in its twelfth digit', { body: { ...AB.body, period: '1.55865221072' } }, /period off/],
    ['a multiplier in its eighth digit', { logMultiplier: 1.55031348 }, /multiplier off/],
    ['an itinerary', { body: { ...AB.body, itinerary: 'AA' } }, /itinerary AB/],
    ['the number of returns', { body: { ...AB.body, returns: 3 } }, /2 returns, not 3/],
    ['the orbit', { body: { ...AB.body, period: '1.7' } }, /does-not-close/],
  ])('sees that it has %s wrong', (_, change, fault) => {
    expect(measureOrbit(system, { ...AB, ...change }).faults.join('; ')).toMatch(fault);
  });
});

describe('a line of a data set', () => {
  it('may be one of the tables, one of an export, or the end of an export', () => {
    const exported = {
      accession: 'RTN-0000001X',
      submitted: { system: 'lorenz', period: '1.5' },
      multipliers: [{ re: '-3', im: '4' }],
    };
    expect(readDatasetLine(JSON.stringify(exported))).toMatchObject({
      label: 'RTN-0000001X',
      body: { period: '1.5' },
      logMultiplier: Math.log(5),
    });
    expect(readDatasetLine('{"code":"01","n":2,"period":1.50,"point":[1,-2.0]}')).toMatchObject({
      body: { system: 'rossler', point: ['1', '0', '-2.0'], period: '1.50', returns: 2 },
    });
    expect(readDatasetLine('{"end":true,"count":1,"sha256":""}')).toBeNull();
  });

  it.each(['{"x":1}', '{"code":"AB","n":2,"period":1}', 'AB'])('is refused when it is %s', (line) => {
    expect(() => readDatasetLine(line)).toThrow(SyntaxError);
  });
});
