import { Router } from 'express';
import type { RefinementRequest } from '@/schemas/generated/contract';
import type { AppDependencies } from '@/server/app-dependencies';
import { idParameter } from '@/server/http/id-parameter';
import { idempotent } from '@/server/http/idempotency';
import { requireSignedIn, signedInUser } from '@/server/http/require-role';
import { bodyOf, validBody } from '@/server/http/valid-body';
import { presentRefinement } from '@/server/presenters/refinement';
import { findRefinements } from '@/server/services/find-refinement';
import { requestRefinement } from '@/server/services/request-refinement';

/** Entries computed to many digits. */
export function refinementRoutes(dependencies: AppDependencies): Router {
  const { db, pool } = dependencies;
  const router = Router();
  const address = '/orbits/:accession/refinements';

  router.post(address, requireSignedIn, validBody('refinement-request'), idempotent(db), async (req, res) => {
    const accession = String(req.params['accession']);
    const { digits } = bodyOf<RefinementRequest>(req);
    const refinement = await requestRefinement(dependencies, { accession, digits, accountId: signedInUser(req).id });
    const shown = presentRefinement(refinement, (await findRefinements(pool, accession)).accession);
    res
      .status(refinement.state === 'done' ? 200 : 202)
      .location(shown.links.self)
      .json(shown);
  });

  router.get(address, async (req, res) => {
    const { accession, refinements } = await findRefinements(pool, req.params.accession);
    const items = refinements.map((refinement) => presentRefinement(refinement, accession));
    res.set('Cache-Control', 'no-store').json({ items });
  });

  router.get(`${address}/:id`, async (req, res) => {
    const id = idParameter(req, 'refinement');
    const { accession, refinements } = await findRefinements(pool, req.params['accession'], id);
    res.set('Cache-Control', 'no-store').json(presentRefinement(refinements[0]!, accession));
  });

  return router;
}
