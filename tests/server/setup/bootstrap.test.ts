import { spawnSync } from 'node:child_process';
import { copyFileSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

let folder: string;
beforeEach(() => void (folder = mkdtempSync(join(tmpdir(), 'ritornel-setup-'))));
afterEach(() => rmSync(folder, { recursive: true }));

/** A checkout that has just the set-up programs, a package.json and an npm that only tells that it was called. */
const checkout = (manifest: object, lock: object, installed?: object) => {
  mkdirSync(join(folder, 'server/setup'), { recursive: true });
  for (const name of ['bootstrap', 'machine', 'packages']) {
    copyFileSync(`server/setup/${name}.mjs`, join(folder, `server/setup/${name}.mjs`));
  }
  writeFileSync(join(folder, 'package.json'), JSON.stringify(manifest));
  writeFileSync(join(folder, 'package-lock.json'), JSON.stringify({ packages: lock }));
  writeFileSync(join(folder, 'npm.js'), "console.log('npm', ...process.argv.slice(2))");
  if (!installed) return;
  mkdirSync(join(folder, 'node_modules'));
  writeFileSync(join(folder, 'node_modules/.package-lock.json'), JSON.stringify({ packages: installed }));
};

/** Run the set-up there, on a machine without any program on its path. */
const bootstrap = (wanted: { chromium: boolean; ownDatabase: boolean }) => {
  const code = `import('./server/setup/bootstrap.mjs').then(({ bootstrap }) => bootstrap(${JSON.stringify(wanted)}))`;
  const { status, stdout, stderr } = spawnSync(process.execPath, ['-e', code], {
    cwd: folder,
    env: { ...process.env, PATH: join(folder, 'empty'), npm_execpath: join(folder, 'npm.js'), CHROMIUM: '' },
    encoding: 'utf8',
  });
  return { status, said: stdout + stderr };
};

const manifest = { engines: { node: '>=20.19' } };
const nothing = { chromium: false, ownDatabase: false };
const locked = { 'node_modules/a': { version: '1.0.0' }, 'node_modules/b': { version: '1.0.0', optional: true } };

describe('bootstrap', () => {
  it('does nothing where everything is as locked, optional packages aside', () => {
    checkout(manifest, locked, { 'node_modules/a': { version: '1.0.0' } });
    expect(bootstrap(nothing)).toEqual({ status: 0, said: '' });
  });

  it.each([
    ['are missing', undefined, /none are here yet/],
    ['are of another version', { 'node_modules/a': { version: '0.9.0' } }, /a is not as in package-lock\.json/],
  ])('installs the npm packages when they %s', (_, installed, reason) => {
    checkout(manifest, locked, installed);
    const { status, said } = bootstrap(nothing);
    expect(status).toBe(0);
    expect(said).toMatch(reason);
    expect(said).toContain('npm ci --include=dev');
  });

  it('ends with the line to run when npm fails', () => {
    checkout(manifest, locked);
    writeFileSync(join(folder, 'npm.js'), 'process.exit(1)');
    const { status, said } = bootstrap(nothing);
    expect(status).toBe(1);
    expect(said).toMatch(/could not be installed[\s\S]*\n {2}npm ci\n$/);
  });

  it('names the version of Node.js that is needed', () => {
    checkout({ engines: { node: '>=999.1' } }, {}, {});
    const { status, said } = bootstrap(nothing);
    expect(status).toBe(1);
    expect(said).toBe(`Node.js >=999.1 is needed; this is ${process.versions.node}.\n`);
  });

  it('says the one line to run where it may not install', () => {
    checkout(manifest, {}, {});
    const { status, said } = bootstrap({ chromium: true, ownDatabase: false });
    expect(status).toBe(1);
    expect(said).toMatch(
      /Debian package chromium[\s\S]*\n {2}sudo apt-get update && sudo apt-get install -y chromium\n$/,
    );
  });
});

describe('package.json', () => {
  const { dependencies, devDependencies } = JSON.parse(readFileSync('package.json', 'utf8'));

  it('pins every package exactly', () => {
    const loose = Object.entries<string>({ ...dependencies, ...devDependencies }).filter(
      ([, version]) => !/^\d+\.\d+\.\d+(-[\w.]+)?$/.test(version),
    );
    expect(loose).toEqual([]);
  });

  it('has a lock file without addresses', () => {
    expect(readFileSync('package-lock.json', 'utf8')).not.toMatch(/"resolved"|https?:\/\/registry/);
  });
});
