import { type CheckReport } from '@/schemas/generated/contract';
import { ClaimCheck } from '@/server/checks/check-claim';
import { type CheckProgress } from '@/server/checks/check-progress';
import { ENGINE_VERSION } from '@/server/checks/engine-version';
import { STEPS_DEFAULT, STEPS_LARGEST } from '@/server/checks/limits';
import { type CatalogueOrbit } from '@/server/checks/match-orbits';
import { readClaim, type ClaimBody } from '@/server/checks/read-claim';
import { refineReport } from '@/server/checks/refine-report';
import { type CheckedSystem } from '@/server/formulas/checked-system';

/** An orbit to be checked. */
export interface CheckOptions {
  system: CheckedSystem;
  claim: ClaimBody & { digits?: number };
  /** Entries of the same system and parameters that it might be. */
  catalogue?: readonly CatalogueOrbit[];
  /** In a submission an orbit that is known already is a blocker, in a trial a note. */
  isSubmission?: boolean;
  limits?: { maxSteps?: number };
  onProgress?: (progress: CheckProgress) => void;
  /** Asked before every step; true ends the check as inconclusive. */
  shouldStop?: () => boolean;
}

/**
 * Check an orbit: integrate it again, say whether it closes, correct it, and measure it.
 *
 * Pure and synchronous; only the time it took makes two reports of one claim differ.
 *
 * @throws {RangeError} when the claim cannot be read: readClaim says why, and is to be asked before.
 */
export function checkOrbit(options: CheckOptions): CheckReport {
  const begun = performance.now();
  const read = readClaim(options.system, options.claim);
  if (!read.ok) throw new RangeError(read.errors.map(({ pointer, message }) => `${pointer}: ${message}`).join(' '));
  const check = new ClaimCheck(read.claim, {
    maxSteps: Math.min(STEPS_LARGEST, options.limits?.maxSteps ?? STEPS_DEFAULT),
    catalogue: options.catalogue ?? [],
    isSubmission: options.isSubmission ?? false,
    shouldStop: options.shouldStop,
    onProgress: options.onProgress,
  });
  const answer = refineReport(check.run(), options);
  const cpuMs = Math.round((performance.now() - begun) * 1000) / 1000;
  return { ...answer, engine: { version: ENGINE_VERSION, steps: check.steps, cpuMs } };
}
