import { spawn } from 'node:child_process';
import type { Account } from '@/server/cluster/database-account';

export interface ProgramResult {
  code: number;
  output: string;
}

/** Run a program of PostgreSQL under the database's account and collect what it says. */
export function runProgram(file: string, args: readonly string[], account: Account | null): Promise<ProgramResult> {
  return new Promise((resolve, reject) => {
    const child = spawn(file, args, {
      cwd: '/',
      stdio: ['ignore', 'pipe', 'pipe'],
      // Messages in English whatever the machine speaks, and no PG… variable that could point elsewhere.
      env: { ...withoutPostgresVariables(), LC_ALL: 'C' },
      ...(account && { uid: account.uid, gid: account.gid }),
    });
    let output = '';
    const collect = (chunk: Buffer): void => void (output += chunk.toString());
    child.stdout.on('data', collect);
    child.stderr.on('data', collect);
    child.on('error', reject);
    child.on('close', (code) => resolve({ code: code ?? -1, output: output.trim() }));
  });
}

function withoutPostgresVariables(): NodeJS.ProcessEnv {
  const kept = { ...process.env };
  for (const name of Object.keys(kept)) if (name.startsWith('PG')) Reflect.deleteProperty(kept, name);
  return kept;
}
