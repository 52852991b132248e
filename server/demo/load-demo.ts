import type { SubmissionBody } from '@/schemas/generated/contract';
import { demoOrbits } from '@/server/demo/demo-orbits';
import { type DemoRole, demoScenario } from '@/server/demo/demo-scenario';
import type { InstallTools } from '@/server/demo/demo-tools';
import { loadDemoDesk } from '@/server/demo/load-demo-desk';
import { checked, demoRules, knownBodies } from '@/server/demo/send-demo';
import type { Submission } from '@/server/models/submission';
import type { User } from '@/server/models/user';
import { createSubmission } from '@/server/services/create-submission';
import { decideSubmission } from '@/server/services/decide-submission';
import { recheckSubmission } from '@/server/services/recheck-submission';

/** Orbits on their way at once: enough to keep every thread busy while others are accepted. */
const AT_ONCE = 4;
/** An acceptance may need a second check, when an orbit of the same period came in between. */
const CHECKS = 3;

/**
 * Fill the catalogue with the demo orbits, the way everybody's come in: sent by the contributor, checked by the worker,
 * accepted by the curator. Then leave some work on the desk.
 *
 * An orbit is recognised by its body, so a second run goes on where the first one ended.
 *
 * @throws when a demo orbit is not accepted: the demo is made of orbits that are right.
 */
export async function loadDemo(tools: InstallTools, people: Record<DemoRole, User>): Promise<void> {
  const known = await knownBodies(people.contributor);
  const waiting = demoOrbits.map((body) => ({ body, known: known.get(JSON.stringify(body)) ?? null }));
  const missing = waiting.filter((orbit) => orbit.known?.reviewState !== 'accepted');
  if (missing.length > 0) tools.log.info(`loading ${missing.length} demo orbits`);
  let next = 0;
  const load = async (): Promise<void> => {
    for (let orbit = missing[next++]; orbit && !tools.signal.aborted; orbit = missing[next++]) {
      await loadOrbit(tools, people, orbit);
    }
  };
  await Promise.all(Array.from({ length: AT_ONCE }, load));
  if (tools.signal.aborted) return;
  await loadDemoDesk(tools, people);
  if (missing.length > 0) tools.log.info('the demo is complete');
}

interface DemoOrbit {
  body: SubmissionBody;
  known: Submission | null;
}

async function loadOrbit(
  tools: InstallTools,
  { contributor, curator }: Record<DemoRole, User>,
  { body, known }: DemoOrbit,
): Promise<void> {
  const { desk, tracer, signal } = tools;
  const id = known?.id ?? (await createSubmission(desk, contributor, { body: { ...body }, send: demoRules }));
  for (let round = 1; ; round += 1) {
    await checked(tools, id);
    if (signal.aborted) return;
    const decision = { decision: 'accept', comment: demoScenario.acceptance } as const;
    const accepted = await decideSubmission({ ...desk, tracer }, curator, { id, seen: 'any', decision }).then(
      () => null,
      (error: unknown) => error,
    );
    if (accepted === null) return;
    const isStale = (accepted as { code?: unknown }).code === 'stale-check';
    if (!isStale || round === CHECKS)
      throw new Error(`demo orbit ${title(body)} was not accepted`, { cause: accepted });
    await recheckSubmission(desk, curator, id);
  }
}

const title = ({ system, itinerary, period }: SubmissionBody): string => `${system} ${itinerary ?? ''} T = ${period}`;
