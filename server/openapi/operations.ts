import { accountOperations } from '@/server/openapi/account-operations';
import { checkOperations } from '@/server/openapi/check-operations';
import type { Operation } from '@/server/openapi/operation';
import { orbitOperations } from '@/server/openapi/orbit-operations';
import { refinementOperations } from '@/server/openapi/refinement-operations';
import { releaseOperations } from '@/server/openapi/release-operations';
import { submissionOperations } from '@/server/openapi/submission-operations';

/** Every call of the API. A test holds this list against the routes that are mounted. */
export const operations: readonly Operation[] = [
  ...accountOperations,
  ...orbitOperations,
  ...refinementOperations,
  ...checkOperations,
  ...submissionOperations,
  ...releaseOperations,
  {
    id: 'readDescription',
    method: 'get',
    path: '/openapi.json',
    summary: 'This description',
    answers: [{ status: 200, description: 'OpenAPI 3.1.', media: ['application/json'] }],
    problems: [],
  },
];
