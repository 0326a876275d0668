import { useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { useEffect, useMemo, useReducer, useState } from 'react';
import { z } from 'zod';
import type { DraftDocument } from '#rules/authoring/document-parts';
import { changeDraft, type Draft, draftConflictSchema } from '#shared/contracts/drafts';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { asProblem, type Problem } from '../../../lib/problem';
import { draftQuery } from '../api/get-draft';
import { keepChanges, keptChanges } from '../lib/kept-changes';
import {
  type Conflict,
  documentOf,
  type Edit,
  edit,
  keptBy,
  openCopy,
  redo,
  refreshed,
  refusedBy,
  sendingFailed,
  settle,
  startSending,
  undo,
  type WorkingCopy,
} from '../lib/working-copy';

/** How long typing may pause before it is saved. */
const saveAfterMs = 700;
const tryAgainAfterMs = 5000;

export interface DraftEditing {
  draft: Draft;
  document: DraftDocument;
  change(edits: readonly Edit[]): void;
  undo: (() => void) | null;
  redo: (() => void) | null;
  conflicts: readonly Conflict[];
  settle(part: string, choice: 'mine' | 'theirs'): void;
  /** True while something is not kept by the server yet. */
  unsaved: boolean;
  /** Why it is not kept; null while saving goes well. */
  problem: Problem | null;
  savedAt: string;
}

type Change = (copy: WorkingCopy) => WorkingCopy;

/** A draft as its author works on it: shown at once, saved by itself, never overwritten and never overwriting. */
export function useWorkingCopy(draftId: string): DraftEditing {
  const { data: draft } = useSuspenseQuery(draftQuery(draftId));
  const [copy, apply] = useReducer(
    (state: WorkingCopy, change: Change) => change(state),
    draft,
    ({ document, version }) => openCopy({ document, version }, keptChanges(draftId)),
  );
  const problem = useSaving(draftId, copy, apply);
  useEffect(() => {
    apply((state) => refreshed(state, { document: draft.document, version: draft.version }));
  }, [draft]);
  useEffect(() => {
    keepChanges(draftId, [...copy.sending, ...copy.waiting]);
  }, [draftId, copy.sending, copy.waiting]);
  const document = useMemo(() => documentOf(copy), [copy]);
  return {
    draft,
    document,
    change: (edits) => apply((state) => edit(state, edits)),
    undo: copy.done.length > 0 ? () => apply(undo) : null,
    redo: copy.undone.length > 0 ? () => apply(redo) : null,
    conflicts: copy.conflicts,
    settle: (part, choice) => apply((state) => settle(state, part, choice)),
    unsaved: copy.sending.length + copy.waiting.length > 0,
    problem,
    savedAt: draft.updatedAt,
  };
}

/** Sends what waits when typing pauses; what fails for want of a connection is tried again. */
function useSaving(draftId: string, copy: WorkingCopy, apply: (change: Change) => void): Problem | null {
  const client = useQueryClient();
  const { keyFor, done } = useActKey();
  const [problem, setProblem] = useState<Problem | null>(null);
  const [attempt, setAttempt] = useState(0);
  const { waiting } = copy;
  const idle = copy.sending.length === 0 && waiting.length > 0;

  // biome-ignore lint/correctness/useExhaustiveDependencies: another attempt starts the wait anew.
  useEffect(() => {
    if (!idle) return;
    const timer = setTimeout(() => apply(startSending), attempt > 0 ? tryAgainAfterMs : saveAfterMs);
    return () => clearTimeout(timer);
  }, [idle, waiting, apply, attempt]);

  const { sending } = copy;
  // biome-ignore lint/correctness/useExhaustiveDependencies: what is on its way is sent once.
  useEffect(() => {
    if (sending.length === 0) return;
    const changes = sending.map(({ part, before, after, position }) => ({
      part,
      before,
      after,
      ...(position === undefined ? {} : { position }),
    }));
    call(changeDraft, { params: { draftId }, body: { changes }, idempotencyKey: keyFor(changes) }).then(
      (answer) => {
        done();
        setProblem(null);
        setAttempt(0);
        apply((state) => keptBy(state, answer));
        client.setQueryData<Draft>(
          ['drafts', draftId],
          (old) => old && { ...old, version: answer.version, updatedAt: answer.updatedAt },
        );
      },
      (error: unknown) => {
        const refused = asProblem(error);
        const conflicts = z.array(draftConflictSchema).safeParse(refused.present);
        if (refused.slug === 'draft-conflict' && conflicts.success) {
          apply((state) => refusedBy(state, conflicts.data));
          void client.invalidateQueries({ queryKey: ['drafts', draftId], exact: true });
          return;
        }
        setProblem(refused);
        setAttempt((count) => count + 1);
        apply(sendingFailed);
      },
    );
  }, [sending, draftId, apply, client]);
  return problem;
}
