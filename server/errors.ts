import type { Problem as ProblemBody, Role } from '@/schemas/generated/contract';
import { problemCodes, type ProblemCode } from '@/server/problem-codes';

/** One field of a request and what is wrong with it. */
export interface FieldError {
  /** JSON Pointer into the body (`/point/1`), or `#name` of a query parameter or header. */
  pointer: string;
  message: string;
  /** 1-based character of a formula, where that is known. */
  position?: number | null;
}

export interface ProblemDetails {
  errors?: FieldError[];
  meanwhile?: ProblemBody['meanwhile'];
  headers?: Record<string, string>;
}

/** A request that failed for a reason its sender can understand; one middleware turns it into `application/problem+json`. */
export class Problem extends Error {
  readonly code: ProblemCode;
  readonly errors: FieldError[];
  readonly meanwhile: ProblemBody['meanwhile'];
  readonly headers: Record<string, string>;

  constructor(code: ProblemCode, detail: string, details: ProblemDetails = {}) {
    super(detail);
    this.name = 'Problem';
    this.code = code;
    this.errors = details.errors ?? [];
    this.meanwhile = details.meanwhile ?? null;
    this.headers = details.headers ?? {};
  }

  get status(): number {
    return problemCodes[this.code].status;
  }

  get title(): string {
    return problemCodes[this.code].title;
  }

  get detail(): string {
    return this.message;
  }
}

/** One sentence out of the errors of several fields, for people who see the detail only. */
const firstOf = (errors: FieldError[]): string =>
  errors.length === 1 ? errors[0]!.message : `${errors[0]?.message ?? ''} (and ${errors.length - 1} more)`;

/** 400: the body violates its schema. */
export const invalidBody = (errors: FieldError[]): Problem => new Problem('invalid-body', firstOf(errors), { errors });

/** 400: a query parameter is unknown or malformed. Pointers are `#name`. */
export const invalidQuery = (errors: FieldError[]): Problem =>
  new Problem('invalid-query', firstOf(errors), { errors });

/** 400: a header is malformed. The pointer is `#Name`. */
export const invalidHeader = (name: string, message: string): Problem =>
  new Problem('invalid-header', message, { errors: [{ pointer: `#${name}`, message }] });

/** 422: the body has the right form and yet cannot be right. */
export const invalidContent = (errors: FieldError[]): Problem =>
  new Problem('invalid-content', firstOf(errors), { errors });

/** 422: a body names a system that does not exist. */
export const unknownSystem = (slug: string): Problem => {
  const message = `There is no accepted system called "${slug.slice(0, 40)}".`;
  return new Problem('unknown-system', message, { errors: [{ pointer: '/system', message }] });
};

/** 404: nothing here, or nothing that this person may see. */
export const notFound = (what: string): Problem => new Problem('not-found', `There is no ${what} at this address.`);

/** 401: the call needs an account. */
export const notSignedIn = (): Problem => new Problem('not-signed-in', 'This needs an account: sign in and try again.');

/** 401: the sign-in cookie is no longer good. */
export const sessionExpired = (): Problem =>
  new Problem('session-expired', 'The sign-in has expired or was ended. Nothing was changed: sign in and try again.');

/** 403: the account's role does not suffice. */
export const notAllowed = (role: Role): Problem =>
  new Problem('not-allowed', `This is for accounts with the role ${role} or above.`);

/** 428: a change needs `If-Match`. */
export const preconditionRequired = (): Problem =>
  new Problem(
    'precondition-required',
    'Send the ETag of the version you have seen in If-Match, or "*" for any version.',
  );

/** 412: somebody else changed it; `meanwhile` says how. */
export const preconditionFailed = (meanwhile: ProblemBody['meanwhile'] = null): Problem =>
  new Problem('precondition-failed', 'It has changed since you read it. Nothing was written: look at it again.', {
    meanwhile,
  });

/** 429 with `Retry-After`. */
export const tooMany = (
  code: 'too-many-sign-ins' | 'too-many-requests' | 'too-many-checks' | 'computing-time-used',
  detail: string,
  retryAfterSeconds: number,
): Problem =>
  new Problem(code, detail, { headers: { 'Retry-After': String(Math.max(1, Math.ceil(retryAfterSeconds))) } });
