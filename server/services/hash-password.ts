import { compare, hash } from 'bcryptjs';
import { Problem } from '@/server/errors';

/** bcrypt reads no further: two passwords that differ only beyond would be the same. */
const MAX_PASSWORD_BYTES = 72;
/** Rounds as a power of two, about 0.2 s; tests sign in hundreds of times and use the least that bcrypt allows. */
const COST = process.env['NODE_ENV'] === 'test' ? 4 : 11;

/** The hash of no password: comparing with it takes as long as with a real one. */
const nobodysHash = hash('nobody has this password', COST);

/**
 * Hash a password for storing.
 *
 * @throws {Problem} `password-too-long` above 72 bytes of UTF-8.
 */
export async function hashPassword(password: string): Promise<string> {
  refuseLongPassword(password);
  return hash(password, COST);
}

/**
 * Whether the password belongs to the hash; false, after the same time, where there is no account and so no hash.
 *
 * @throws {Problem} `password-too-long` above 72 bytes of UTF-8.
 */
export async function matchesPassword(password: string, storedHash: string | null): Promise<boolean> {
  refuseLongPassword(password);
  const matches = await compare(password, storedHash ?? (await nobodysHash));
  return matches && storedHash !== null;
}

function refuseLongPassword(password: string): void {
  const bytes = Buffer.byteLength(password, 'utf8');
  if (bytes <= MAX_PASSWORD_BYTES) return;
  const message = `The password is ${bytes} bytes long in UTF-8; the limit is ${MAX_PASSWORD_BYTES} bytes.`;
  throw new Problem('password-too-long', message, { errors: [{ pointer: '/password', message }] });
}
