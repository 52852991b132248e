import { createConfig, lintFromString } from '@redocly/openapi-core';
import { openapiDocument } from '@/server/openapi/openapi-document';

/** What the recommended rules ask for and this API has its reasons against. */
const EXCEPTIONS = {
  // The last line of an NDJSON stream has a schema of its own, and no media type to hang it on.
  'no-unused-components': 'off',
  // Calls without parameters refuse nothing; every call describes its refusals under "default".
  'operation-4xx-response': 'off',
} as const;

/** Hold the description of the API to the rules of OpenAPI 3.1 and of good descriptions. */
async function main(): Promise<void> {
  const config = await createConfig({ extends: ['recommended-strict'], rules: EXCEPTIONS });
  const source = JSON.stringify(openapiDocument('https://orbits.example'));
  const problems = await lintFromString({ source, config });
  for (const { ruleId, message, location } of problems) {
    console.error(`${ruleId}: ${message} ${location[0]?.pointer ?? ''}`);
  }
  if (problems.length > 0) process.exitCode = 1;
}

void main();
