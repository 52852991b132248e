import type { SubmissionBody } from '@/schemas/generated/contract';
import orbits from '@/server/demo/orbits.json';

/** What the demo's contributor sends and its curator accepts: published or exact orbits, no two of them the same curve. */
export const demoOrbits: readonly SubmissionBody[] = orbits;
