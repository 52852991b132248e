import { Router } from 'express';
import type { AppDependencies } from '@/server/app-dependencies';
import { openapiDocument } from '@/server/openapi/openapi-document';

/** The description of this API. */
export function openapiRoutes({ config }: AppDependencies): Router {
  const router = Router();
  const text = JSON.stringify(openapiDocument(config.publicUrl));
  router.get('/openapi.json', (_req, res) => {
    res.set('Cache-Control', 'public, max-age=300').type('application/json').send(text);
  });
  return router;
}
