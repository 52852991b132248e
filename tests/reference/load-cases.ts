import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { ReferenceCase } from '@/tests/reference/reference-case';

/** All cases of cases.json: orbits to accept, submissions to refuse, orbits to flag. */
export function loadCases(): ReferenceCase[] {
  const file = JSON.parse(readFileSync(join(__dirname, 'cases.json'), 'utf8')) as { cases: ReferenceCase[] };
  return file.cases;
}
