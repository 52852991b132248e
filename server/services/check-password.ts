import { Problem } from '@/server/errors';
import { User } from '@/server/models/user';
import { matchesPassword } from '@/server/services/hash-password';

/**
 * The account of an address and its password.
 *
 * An unknown address and a wrong password are the same answer after the same work.
 *
 * @throws {Problem} `wrong-credentials`, `password-too-long`, or `not-confirmed` when the password is right.
 */
export async function checkPassword(email: string, password: string): Promise<User> {
  const user = await User.byEmail(email);
  if (!(await matchesPassword(password, user?.passwordHash ?? null)) || !user) {
    throw new Problem(
      'wrong-credentials',
      'No account has this address and password. Look at both, or set a new password.',
    );
  }
  if (user.confirmedAt === null) {
    throw new Problem(
      'not-confirmed',
      'Confirm your address first: the link is in the mail. Register again for a new one.',
    );
  }
  return user;
}
