import { useState } from 'react';
import { ApiError } from '@/features/api/api-error';
import { isOver, useCheck, useStartCheck } from '@/features/api/checks';
import { newIdempotencyKey } from '@/features/api/client';
import { keepDraft } from '@/features/bench/kept-drafts';
import { bodyOfDraft, type OrbitDraft } from '@/features/checking/orbit-draft';
import { useAnnounce } from '@/features/ui';
import type { Check, System } from '@/schemas/generated/contract';

/** One check of this visit, with the form as it was. */
export interface Tried {
  id: string;
  draft: OrbitDraft;
}

/** What the Bench holds: the form, the check under way, and those before it. */
export function useBench(systems: readonly System[], start: OrbitDraft) {
  const [draft, setDraft] = useState(start);
  const [tried, setTried] = useState<readonly Tried[]>([]);
  const [undo, setUndo] = useState<OrbitDraft | null>(null);
  const starting = useStartCheck();
  const announce = useAnnounce();
  const current = tried[0] ?? null;
  const check = useCheck(current?.id ?? null);
  const bodyOf = (one: OrbitDraft) => bodyOfDraft(one, sectionNames(systems, one.system));

  const change = (next: OrbitDraft) => {
    setDraft(next);
    keepDraft(next);
  };
  const run = (next: OrbitDraft) => {
    starting.mutate(
      { body: bodyOf(next), key: newIdempotencyKey() },
      {
        onSuccess: ({ id }: Check) => {
          setTried((before) => [{ id, draft: next }, ...before]);
          announce('Checking');
        },
      },
    );
  };
  return {
    draft,
    change,
    tried,
    current,
    check,
    isChecking: starting.isPending || (check.data !== undefined && !isOver(check.data)),
    error: starting.error,
    messageAt: (pointer: string) => (starting.error instanceof ApiError ? starting.error.messageAt(pointer) : null),
    bodyOf,
    run: () => run(draft),
    /** Change one field as the engine suggests and check again. */
    follow: (next: OrbitDraft) => {
      setUndo(draft);
      change(next);
      run(next);
    },
    undo: undo
      ? () => {
          change(undo);
          setUndo(null);
        }
      : null,
    edit: () => setTried([]),
  };
}

const sectionNames = (systems: readonly System[], slug: string): string[] =>
  systems.find((system) => system.slug === slug)?.sections.map(({ name }) => name) ?? [];
