import { useEffect, useRef, useState } from 'react';
import { ApiError } from '@/features/api/api-error';
import { useChangeSubmission, useSendSubmission } from '@/features/api/submissions';
import { bodyOfDraft, draftOfBody, type OrbitDraft } from '@/features/checking/orbit-draft';
import type { Submission, System } from '@/schemas/generated/contract';

/** A draft is saved when the typing has rested this long. */
const REST_MS = 800;

/** The form of a draft, saved on the server as one types, one request after the other. */
export function useSavedDraft(submission: Submission, etag: string | null, systems: readonly System[]) {
  const [draft, setDraft] = useState(() => draftOfBody(submission.body));
  const [isDirty, setDirty] = useState(false);
  const saving = useChangeSubmission();
  const sending = useSendSubmission();
  const { id } = submission;
  const latestEtag = useRef(etag);
  useEffect(() => {
    latestEtag.current = etag;
  }, [etag]);
  const { mutateAsync: save, isPending: isSaving } = saving;

  const saveNow = async (next: OrbitDraft): Promise<string | null> => {
    const names = systems.find(({ slug }) => slug === next.system)?.sections.map(({ name }) => name) ?? [];
    const answer = await save({ id, etag: latestEtag.current, body: bodyOfDraft(next, names) });
    latestEtag.current = answer.etag;
    setDirty(false);
    return answer.etag;
  };
  const latestSave = useRef(saveNow);
  useEffect(() => {
    latestSave.current = saveNow;
  });
  useEffect(() => {
    if (!isDirty || isSaving) return undefined;
    const timer = setTimeout(() => {
      // What went wrong is shown from the mutation's own state; the typing stays.
      latestSave.current(draft).catch(() => undefined);
    }, REST_MS);
    return () => clearTimeout(timer);
  }, [draft, isDirty, isSaving]);

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
      setDraft(next);
      setDirty(true);
    },
    saved: isSaving ? 'saving…' : isDirty ? 'not saved yet' : 'saved',
    error,
    messageAt: (pointer: string) => (error instanceof ApiError ? error.messageAt(pointer) : null),
    send,
    isSending: sending.isPending,
  };
}
