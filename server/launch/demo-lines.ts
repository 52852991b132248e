import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Config } from '@/server/config';

type DemoAccounts = Record<string, { email: string; password: string }>;

/** What a person needs to know to try the demo: the accounts, and where mail that is sent can be read. */
export function demoLines(config: Config, address: string): string[] {
  return [...accounts(config), ...outbox(config, address)];
}

function accounts({ demo, stateFolder }: Config): string[] {
  const file = join(stateFolder, 'demo-accounts.json');
  if (!demo || !existsSync(file)) return [];
  const found = JSON.parse(readFileSync(file, 'utf8')) as DemoAccounts;
  const lines = Object.entries(found).map(([role, { email, password }]) => `  ${role}: ${email}  ${password}`);
  return [`Demo accounts (also in ${file}):`, ...lines];
}

function outbox({ smtpUrl, stateFolder }: Config, address: string): string[] {
  const file = join(stateFolder, 'outbox-key');
  if (smtpUrl !== null || !existsSync(file)) return [];
  return [`Mail is kept here instead of sent: ${address}/outbox?key=${readFileSync(file, 'utf8').trim()}`];
}
