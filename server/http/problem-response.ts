import type { ErrorRequestHandler, Request, RequestHandler, Response } from 'express';
import type { Problem as ProblemBody } from '@/schemas/generated/contract';
import { Problem } from '@/server/errors';
import { requestIdOf } from '@/server/http/request-id';
import type { Log } from '@/server/log';

/** The PostgreSQL error of a statement that ran into its time limit. */
const STATEMENT_TIMEOUT = '57014';

/** A problem as RFC 9457 `application/problem+json`. */
function sendProblem(req: Request, res: Response, problem: Problem): void {
  const body: ProblemBody = {
    type: `/api/v1/openapi.json#/x-problems/${problem.code}`,
    title: problem.title,
    status: problem.status,
    detail: problem.detail,
    code: problem.code,
    instance: requestIdOf(req),
    errors: problem.errors.map(({ pointer, message, position }) => ({ pointer, message, position: position ?? null })),
    meanwhile: problem.meanwhile,
  };
  res
    .status(problem.status)
    .set({ 'Cache-Control': 'no-store', ...problem.headers })
    .type('application/problem+json')
    .send(JSON.stringify(body));
}

/** The last route: nothing is mounted here. */
export const nothingHere: RequestHandler = (req) => {
  throw new Problem('not-found', `There is nothing at ${req.method} ${req.path.slice(0, 200)}.`);
};

/** Answer every error: problems as they are, anything else as a plain 500 with a log line under the request id. */
export function problemResponses(log: Log): ErrorRequestHandler {
  return (error: unknown, req, res, next) => {
    const problem = asProblem(error);
    if (problem.status >= 500)
      log.error({ err: error, requestId: requestIdOf(req) }, `${req.method} ${req.path} failed`);
    if (res.headersSent) next(error);
    else sendProblem(req, res, problem);
  };
}

function asProblem(error: unknown): Problem {
  if (error instanceof Problem) return error;
  if (isTimeout(error))
    return new Problem('search-too-slow', 'This search takes too long. Narrow it: name a system, or fewer words.');
  if (error instanceof URIError) return new Problem('invalid-address', 'The address holds a broken percent sign.');
  return new Problem(
    'internal-error',
    'Something broke on our side; it was logged under the request id. Nothing you sent is at fault.',
  );
}

const isTimeout = (error: unknown): boolean => {
  const { code, original } = (error ?? {}) as { code?: unknown; original?: { code?: unknown } };
  return code === STATEMENT_TIMEOUT || original?.code === STATEMENT_TIMEOUT;
};
