import { randomBytes } from 'node:crypto';
import { keptSecret } from '@/server/kept-secret';
import { type DemoRole, demoScenario } from '@/server/demo/demo-scenario';
import { User } from '@/server/models/user';
import { hashPassword, matchesPassword } from '@/server/services/hash-password';

/** As they are kept in `demo-accounts.json`. */
type DemoAccounts = Record<DemoRole, { email: string; password: string }>;

const PASSWORD_BYTES = 12;
const ROLES: readonly DemoRole[] = ['contributor', 'curator', 'administrator'];

/**
 * Make the demo accounts, with random passwords kept in a file that only its owner can read.
 *
 * An account whose password is not the kept one, because the file is new, gets it: the file is what people are told.
 */
export async function installDemoAccounts(stateFolder: string): Promise<Record<DemoRole, User>> {
  const kept = JSON.parse(keptSecret(stateFolder, 'demo-accounts.json', newAccounts)) as DemoAccounts;
  const users: Partial<Record<DemoRole, User>> = {};
  for (const role of ROLES) users[role] = await installAccount(role, kept[role].password);
  return users as Record<DemoRole, User>;
}

function newAccounts(): string {
  const accounts = ROLES.map((role) => {
    const password = randomBytes(PASSWORD_BYTES).toString('base64url');
    return [role, { email: demoScenario.people[role].email, password }];
  });
  return JSON.stringify(Object.fromEntries(accounts), null, 2);
}

async function installAccount(role: DemoRole, password: string): Promise<User> {
  const { name, email } = demoScenario.people[role];
  const known = await User.byEmail(email);
  if (known && (await matchesPassword(password, known.passwordHash))) return known;
  const passwordHash = await hashPassword(password);
  if (known) return known.update({ passwordHash });
  return User.create({ name, email, orcid: null, role, passwordHash, confirmedAt: new Date() });
}
