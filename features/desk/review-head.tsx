import type { ReactNode } from 'react';
import { draftOfBody } from '@/features/checking/orbit-draft';
import { checkWords } from '@/features/desk/check-words';
import { ClaimLine } from '@/features/desk/claim-line';
import { ROOM_FOR_QUEUE } from '@/features/desk/room-for-queue';
import { orbitState, stateLook } from '@/features/notation/orbit-state';
import { ParameterList } from '@/features/notation/parameter-list';
import { shownParameters } from '@/features/notation/shown-parameters';
import { StateWord } from '@/features/notation/state-word';
import { Page, Text, useContainerWidth, useLayout } from '@/features/ui';
import type { Submission, System } from '@/schemas/generated/contract';

interface ReviewHeadProps {
  submission: Submission;
  system: System | undefined;
  /** Whoever looks may decide: the claim is theirs to take. */
  decides: boolean;
  children: ReactNode;
}

/** The page of a submission: number, revision, system, sender, claim. */
export function ReviewHead({ submission, system, decides, children }: ReviewHeadProps) {
  const phone = useLayout() === 'phone';
  const width = useContainerWidth();
  const { number, revision, owner } = submission;
  const draft = draftOfBody(submission.body);
  const state = orbitState(submission.reviewState, submission.checkState, submission.verdict);
  const own = system?.document.parameters.map(({ name, value }): [string, string] => [name, String(value)]) ?? [];
  const values = shownParameters({ ...Object.fromEntries(own), ...draft.parameters }, system);
  const checked = checkWords(submission);
  const claimLine = decides ? <ClaimLine submission={submission} /> : null;
  const hasQueue = decides && width >= ROOM_FOR_QUEUE;
  return (
    <Page
      title={`Submission ${number}`}
      state={<StateWord state={state} />}
      subtitle={
        <Text tone="muted">
          revision {revision} · <Text italic>{system?.name ?? draft.system}</Text>
          {Object.keys(values).length > 0 ? ', ' : null}
          <ParameterList values={values} /> · section {draft.section} · sent by {owner.name}
          {checked === stateLook[state].word ? '' : ` · ${checked}`}
        </Text>
      }
      {...(hasQueue ? {} : { back: { href: '/desk', label: decides ? 'Queue' : 'Desk' } })}
      {...(phone ? { aside: claimLine } : { actions: claimLine })}
    >
      {children}
    </Page>
  );
}
