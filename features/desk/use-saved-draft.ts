import { useEffect, useRef, useState } from 'react';
import { ApiError } from '@/features/api/api-error';
import { useChangeSubmission, useSendSubmission } from '@/features/api/submissions';
import { bodyOfDraft, draftOfBody, type OrbitDraft } from '@/features/checking/orbit-draft';
import { keepDraft, keptDraft } from '@/features/desk/kept-draft';
import type { Submission, System } from '@/schemas/generated/contract';

/** A draft is saved when the typing has rested this long. */
const REST_MS = 800;
/** After a failure it is tried again this late, so that nobody has to ask for it. */
const AGAIN_MS = 5000;

/** The form of a draft, saved on the server as one types, one request after the other. */
export function useSavedDraft(submission: Submission, etag: string | null, systems: readonly System[]) {
  const { id } = submission;
  const [kept] = useState(() => keptDraft(id));
  const [draft, setDraft] = useState(() => kept ?? draftOfBody(submission.body));
  const [isDirty, setDirty] = useState(kept !== null);
  const saving = useChangeSubmission();
  const sending = useSendSubmission();
  const latestDraft = useRef(draft);
  const latestEtag = useRef(etag);
  useEffect(() => {
    latestEtag.current = etag;
  }, [etag]);
  const { mutateAsync: save, isPending: isSaving, isError: hasFailed } = saving;

  const saveNow = async (next: OrbitDraft): Promise<string | null> => {
    const names = systems.find(({ slug }) => slug === next.system)?.sections.map(({ name }) => name) ?? [];
    const answer = await save({ id, etag: latestEtag.current, body: bodyOfDraft(next, names) });
    latestEtag.current = answer.etag;
    // What was typed while it was on its way is not saved yet.
    if (latestDraft.current === next) {
      setDirty(false);
      keepDraft(id, null);
    }
    return answer.etag;
  };
  const latestSave = useRef(saveNow);
  useEffect(() => {
    latestSave.current = saveNow;
  });
  useEffect(() => {
    if (!isDirty || isSaving) return undefined;
    const timer = setTimeout(
      () => {
        // What went wrong is shown from the mutation's own state; the typing stays.
        latestSave.current(draft).catch(() => undefined);
      },
      hasFailed ? AGAIN_MS : REST_MS,
    );
    return () => clearTimeout(timer);
  }, [draft, isDirty, isSaving, hasFailed]);

  const send = () => {
    const go = async () => {
      const version = isDirty ? await saveNow(draft) : latestEtag.current;
      await sending.mutateAsync({ id, etag: version });
    };
    // As above: the mutations hold the error.
    go().catch(() => undefined);
  };
  const error = sending.error ?? saving.error;
  return {
    draft,
    change: (next: OrbitDraft) => {
      latestDraft.current = next;
      setDraft(next);
      setDirty(true);
      keepDraft(id, next);
    },
    saved: isSaving ? 'saving…' : !isDirty ? 'saved' : hasFailed ? 'not saved, kept on this device' : 'not saved yet',
    error,
    messageAt: (pointer: string) => (error instanceof ApiError ? error.messageAt(pointer) : null),
    send,
    isSending: sending.isPending,
  };
}
