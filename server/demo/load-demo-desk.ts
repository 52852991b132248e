import type { DraftBody, ReasonCode } from '@/schemas/generated/contract';
import desk from '@/server/demo/desk.json';
import type { DemoRole } from '@/server/demo/demo-scenario';
import type { InstallTools } from '@/server/demo/demo-tools';
import { checked, demoRules, knownBodies } from '@/server/demo/send-demo';
import type { Submission } from '@/server/models/submission';
import type { User } from '@/server/models/user';
import { createSubmission } from '@/server/services/create-submission';
import { decideSubmission } from '@/server/services/decide-submission';

/**
 * Leave work on the desk: a submission that waits for review, one that a blocker holds back, one that was returned, and
 * a draft. What is there already stays as it is.
 */
export async function loadDemoDesk(tools: InstallTools, people: Record<DemoRole, User>): Promise<void> {
  const known = await knownBodies(people.contributor);
  const keep = async (body: DraftBody, send: typeof demoRules | null): Promise<string> =>
    known.get(JSON.stringify(body))?.id ?? createSubmission(tools.desk, people.contributor, { body, send });
  for (const draft of desk.drafts) await keep(draft, null);
  for (const body of [...desk.waiting, ...desk.blocked]) await checked(tools, await keep(body, demoRules));
  for (const { body, reason, comment } of desk.returned) {
    const id = await keep(body, demoRules);
    await checked(tools, id);
    if (isReturned(known.get(JSON.stringify(body)))) continue;
    const decision = { decision: 'return', reason: reason as ReasonCode, comment } as const;
    await decideSubmission({ ...tools.desk, tracer: tools.tracer }, people.curator, { id, seen: 'any', decision });
  }
}

const isReturned = (submission: Submission | undefined): boolean =>
  submission !== undefined && submission.reviewState !== 'submitted' && submission.reviewState !== 'in-review';
