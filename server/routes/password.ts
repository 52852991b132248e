import { Router } from 'express';
import type { PasswordForgot, PasswordReset } from '@/schemas/generated/contract';
import type { AppDependencies } from '@/server/app-dependencies';
import { addressOf, type RateLimits } from '@/server/http/rate-limits';
import { bodyOf, validBody } from '@/server/http/valid-body';
import { requestPasswordReset } from '@/server/services/request-password-reset';
import { resetPassword } from '@/server/services/reset-password';

/** Forgotten passwords. */
export function passwordRoutes({ config, db }: AppDependencies, limits: RateLimits): Router {
  const router = Router();

  router.post('/password/forgot', validBody('password-forgot'), async (req, res) => {
    await limits.mailRequest(addressOf(req));
    await requestPasswordReset(db, config.publicUrl, bodyOf<PasswordForgot>(req).email);
    res.status(202).json({ message: 'If the address has an account, a mail with a link is on its way.' });
  });

  router.post('/password/reset', validBody('password-reset'), async (req, res) => {
    await limits.mailRequest(addressOf(req));
    await resetPassword(db, config.publicUrl, bodyOf<PasswordReset>(req));
    res.json({ message: 'The new password holds. Every sign-in was ended: sign in again.' });
  });

  return router;
}
