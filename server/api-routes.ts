import { Router } from 'express';
import type { AppDependencies } from '@/server/app-dependencies';
import { nothingHere } from '@/server/http/problem-response';
import { rateLimits } from '@/server/http/rate-limits';
import { readBody } from '@/server/http/read-body';
import { sameOriginOnly } from '@/server/http/same-origin';
import { signInSessions } from '@/server/http/session';
import { signInStrategy } from '@/server/http/sign-in-strategy';
import { openapiRoutes } from '@/server/routes/openapi';
import { entryRoutes } from '@/server/routes/entries';
import { checkRoutes } from '@/server/routes/checks';
import { orbitRoutes } from '@/server/routes/orbits';
import { passwordRoutes } from '@/server/routes/password';
import { refinementRoutes } from '@/server/routes/refinements';
import { releaseRoutes } from '@/server/routes/releases';
import { sessionRoutes } from '@/server/routes/session';
import { submissionRoutes } from '@/server/routes/submissions';
import { systemRoutes } from '@/server/routes/systems';
import { userRoutes } from '@/server/routes/users';

/** Everything below `/api/v1`. */
export function apiRoutes(dependencies: AppDependencies): Router {
  const api = Router();
  const signIn = signInStrategy();
  const limits = rateLimits(dependencies.pool);
  api.use(sameOriginOnly(dependencies.config.publicUrl), readBody());
  api.use(...signInSessions(dependencies), signIn.restore);
  api.use(sessionRoutes(dependencies, { signIn, limits }));
  api.use(userRoutes(dependencies, limits));
  api.use(passwordRoutes(dependencies, limits));
  api.use(systemRoutes(dependencies));
  api.use(checkRoutes(dependencies));
  api.use(submissionRoutes(dependencies));
  api.use(orbitRoutes(dependencies));
  api.use(entryRoutes(dependencies));
  api.use(refinementRoutes(dependencies));
  api.use(releaseRoutes(dependencies));
  api.use(openapiRoutes(dependencies));
  api.use(nothingHere);
  return api;
}
