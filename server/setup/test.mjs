import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { bootstrap, root } from './bootstrap.mjs';
import { runChecks } from './checks.mjs';
import { run, say } from './machine.mjs';

/** What computes or draws takes every core; jest alone would leave one free, of two half. */
const ALL_CORES = ['--maxWorkers=100%'];

/**
 * The server's tests wait for one another's databases and watch clocks: they get what jest gives them. The end-to-end
 * project comes last and one file at a time: each of its files runs the whole product.
 */
const RUNS = [
  { name: 'numerics', args: ALL_CORES },
  { name: 'contract', args: [] },
  { name: 'features', args: ALL_CORES },
  { name: 'server', args: [] },
  { name: 'e2e', args: ['--runInBand'] },
];

/** A project that has not ended after this never will. */
const PATIENCE_MS = 3_600_000;

bootstrap({ chromium: true, ownDatabase: true });

const reports = mkdtempSync(join(tmpdir(), 'ritornel-results-'));
const total = { passed: 0, failed: runChecks().length };
for (const { name, args } of RUNS) {
  say(`Testing ${name}`);
  const { passed, failed } = testProject(name, args);
  total.passed += passed;
  total.failed += failed;
}
rmSync(reports, { recursive: true });
say(`${total.passed} passed, ${total.failed} failed`);
process.exit(total.failed === 0 ? 0 : 1);

/** Run one project of jest and count. A file that can't even run counts as one failure, a run without a result too. */
function testProject(name, more) {
  const report = join(reports, `${name}.json`);
  const jest = join(root, 'node_modules', 'jest', 'bin', 'jest.js');
  const args = [jest, `--selectProjects=${name}`, '--ci', '--json', `--outputFile=${report}`, ...more];
  // The report goes to its file; on standard output it would only be in the way.
  const code = run(process.execPath, args, { cwd: root, stdio: ['ignore', 'ignore', 'inherit'], timeout: PATIENCE_MS });
  if (!existsSync(report)) return { passed: 0, failed: 1 };
  const { numPassedTests, numFailedTests, numRuntimeErrorTestSuites } = JSON.parse(readFileSync(report, 'utf8'));
  const failed = numFailedTests + numRuntimeErrorTestSuites;
  return { passed: numPassedTests, failed: code !== 0 && failed === 0 ? 1 : failed };
}
