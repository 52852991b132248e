import { createReadStream } from 'node:fs';
import { availableParallelism } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { createGunzip } from 'node:zlib';
import Piscina from 'piscina';
import type { OrbitErrors } from '@/tests/reference/measure-orbit';

/** Lines that a thread checks at a time, and batches that wait for each thread. */
const BATCH = 200;
const WAITING = 2;
const SHOWN_FAULTS = 20;
const PROGRESS_EVERY = 5000;

type Figure = 'period' | 'multiplier' | 'returnTimes' | 'closure';
const FIGURES: readonly { name: Figure; words: string }[] = [
  { name: 'period', words: 'period, relative' },
  { name: 'multiplier', words: 'unstable multiplier, relative' },
  { name: 'returnTimes', words: 'return times, in periods' },
  { name: 'closure', words: 'closure as typed, in sizes' },
];

/** Counts orbits and keeps the worst of every figure. */
class Summary {
  checked = 0;
  wrong = 0;
  private readonly worst = new Map<Figure, { value: number; label: string }>();

  take(orbits: readonly OrbitErrors[]): void {
    for (const orbit of orbits) {
      this.checked += 1;
      if (this.checked % PROGRESS_EVERY === 0) console.log(`${this.checked} orbits`);
      if (orbit.faults.length > 0) {
        this.wrong += 1;
        if (this.wrong <= SHOWN_FAULTS) console.log(`WRONG ${orbit.label}: ${orbit.faults.join('; ')}`);
      }
      for (const { name } of FIGURES) {
        if (orbit[name] > (this.worst.get(name)?.value ?? -1))
          this.worst.set(name, { value: orbit[name], label: orbit.label });
      }
    }
  }

  print(seconds: number): void {
    console.log(`${this.checked} orbits in ${seconds.toFixed(1)} s, ${this.wrong} wrong. The worst:`);
    for (const { name, words } of FIGURES) {
      const found = this.worst.get(name);
      if (found) console.log(`  ${words}: ${found.value.toExponential(2)} (${found.label})`);
    }
  }
}

/** Check a whole file of orbits in all cores and say how far it and the engine agree. */
async function main(file: string | undefined): Promise<void> {
  if (file === undefined) {
    console.error(
      'Say which file: npm run verify:dataset FILE (.ndjson or .ndjson.gz, a table or an export of the catalogue)',
    );
    process.exitCode = 2;
    return;
  }
  const begun = performance.now();
  const threads = availableParallelism();
  const pool = new Piscina({
    filename: join(__dirname, 'verify-thread.ts'),
    name: 'verifyLines',
    maxThreads: threads,
    execArgv: ['--require', 'tsx/cjs'],
  });
  const summary = new Summary();
  const running = new Set<Promise<void>>();
  const send = async (lines: string[]): Promise<void> => {
    const work: Promise<void> = (pool.run(lines, { name: 'verifyLines' }) as Promise<OrbitErrors[]>).then((orbits) => {
      summary.take(orbits);
      running.delete(work);
    });
    running.add(work);
    if (running.size >= threads * WAITING) await Promise.race(running);
  };
  let batch: string[] = [];
  const stream = createReadStream(file);
  const text = file.endsWith('.gz') ? stream.pipe(createGunzip()) : stream;
  for await (const line of createInterface({ input: text, crlfDelay: Infinity })) {
    if (line === '') continue;
    batch.push(line);
    if (batch.length < BATCH) continue;
    await send(batch);
    batch = [];
  }
  if (batch.length > 0) await send(batch);
  await Promise.all(running);
  await pool.destroy();
  summary.print((performance.now() - begun) / 1000);
  if (summary.wrong > 0 || summary.checked === 0) process.exitCode = 1;
}

main(process.argv[2]).catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
});
