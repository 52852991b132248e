import type { Request, RequestHandler } from 'express';
import { invalidBody, Problem } from '@/server/errors';
import { describeSchemaErrors } from '@/server/http/describe-schema-errors';
import { validatorOf } from '@/server/schema-registry';

/** Let a request through whose body satisfies the schema; any other gets 400 with a sentence for each field. */
export function validBody(name: string): RequestHandler {
  const validate = validatorOf(name);
  return (req, _res, next) => {
    const given: unknown = req.body;
    const body: unknown = given === undefined ? {} : given;
    if (!validate(body)) {
      if (given === undefined) throw new Problem('empty-body', 'Send a JSON object: this request came without a body.');
      throw invalidBody(describeSchemaErrors(validate.errors ?? []));
    }
    req.body = body;
    next();
  };
}

/** The body that `validBody` let through. */
// eslint-disable-next-line @typescript-eslint/no-unnecessary-type-parameters -- the schema of the route vouches for T
export const bodyOf = <T>(req: Request): T => req.body as T;
