import { Router } from 'express';
import type { Confirmation, Registration, UserChange } from '@/schemas/generated/contract';
import type { AppDependencies } from '@/server/app-dependencies';
import { decodeCursor, encodeCursor } from '@/server/http/cursor';
import { idParameter } from '@/server/http/id-parameter';
import { idempotent } from '@/server/http/idempotency';
import { linkNext } from '@/server/http/page-link';
import { readPage } from '@/server/http/read-page';
import { addressOf, type RateLimits } from '@/server/http/rate-limits';
import { requireRole } from '@/server/http/require-role';
import { bodyOf, validBody } from '@/server/http/valid-body';
import { presentUser } from '@/server/presenters/user';
import { changeRole } from '@/server/services/change-role';
import { confirmUser } from '@/server/services/confirm-user';
import { listUsers, type UserPlace } from '@/server/services/list-users';
import { registerUser } from '@/server/services/register-user';

/** What cursors of the list of accounts belong to. */
const LIST = 'users';

/** Registration for everybody, administration of accounts for administrators. */
export function userRoutes({ config, db }: AppDependencies, limits: RateLimits): Router {
  const router = Router();

  router.post('/users', validBody('registration'), idempotent(db), async (req, res) => {
    await limits.mailRequest(addressOf(req));
    await registerUser(db, config.publicUrl, bodyOf<Registration>(req));
    res.status(202).json({ message: 'A mail is on its way to you. Its link confirms the address.' });
  });

  router.post('/users/confirm', validBody('confirmation'), async (req, res) => {
    await limits.mailRequest(addressOf(req));
    await confirmUser(db, bodyOf<Confirmation>(req).token);
    res.json({ message: 'The address is confirmed. Sign in to submit orbits.' });
  });

  router.get('/users', requireRole('administrator'), async (req, res) => {
    const { limit, after } = readPage(req.query);
    const place = after === null ? null : (decodeCursor(LIST, after, 2) as UserPlace);
    const { items, last, total } = await listUsers(db, { limit, after: place });
    const next = last && encodeCursor(LIST, last);
    linkNext(req, res, next);
    res
      .set('Cache-Control', 'no-store')
      .json({ items: items.map(presentUser), next, total: { value: total, relation: 'exact' } });
  });

  router.patch('/users/:id', requireRole('administrator'), validBody('user-change'), async (req, res) => {
    const user = await changeRole(db, idParameter(req, 'account'), bodyOf<UserChange>(req).role);
    res.json(presentUser(user));
  });

  return router;
}
