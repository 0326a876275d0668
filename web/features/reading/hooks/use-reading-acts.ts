import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { ReadingView } from '#shared/contracts/readings';
import { announce } from '../../../lib/announce';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { readingQuery } from '../api/get-reading';
import { useKeepAct } from '../api/keep-act';
import { doubtsLeftWords } from '../lib/doubt-answers';
import { inverseOf, type ReadingAct } from '../lib/reading-act';

interface Step {
  act: ReadingAct;
  /** "Trials C2 is answered" */
  label: string;
}

export interface ReadingActs {
  /** Keeps an act; what it put in place of what can be undone while the page is open. */
  keep: (act: ReadingAct, label: string, onKept?: (kept: ReadingView) => void) => void;
  undo: () => void;
  redo: () => void;
  /** What undo and redo would do, in words; null where there is nothing. */
  undoes: string | null;
  redoes: string | null;
  isPending: boolean;
  error: unknown;
}

/** Every act has an inverse that is itself an act, so undo and redo are the same thing done in turn. */
export function useReadingActs(params: RevisionParams): ReadingActs {
  const client = useQueryClient();
  const change = useKeepAct(params);
  const [done, setDone] = useState<Step[]>([]);
  const [undone, setUndone] = useState<Step[]>([]);
  const run = ({ act, label }: Step, onKept: (inverse: Step, kept: ReadingView) => void) => {
    const before = client.getQueryData(readingQuery(params).queryKey);
    change.mutate(act, {
      onSuccess: (kept) => {
        if (before) onKept({ act: inverseOf(act, before, kept), label }, kept);
        announce(doubtsLeftWords(kept.doubts));
      },
    });
  };
  const keep: ReadingActs['keep'] = (act, label, onKept) =>
    run({ act, label }, (inverse, kept) => {
      setDone((steps) => [...steps, inverse]);
      setUndone([]);
      onKept?.(kept);
    });
  const last = done.at(-1);
  const next = undone.at(-1);
  const undo = () => {
    if (!last || change.isPending) return;
    run(last, (inverse) => {
      setDone((steps) => steps.slice(0, -1));
      setUndone((steps) => [...steps, inverse]);
      announce(`Undone: ${last.label}.`);
    });
  };
  const redo = () => {
    if (!next || change.isPending) return;
    run(next, (inverse) => {
      setUndone((steps) => steps.slice(0, -1));
      setDone((steps) => [...steps, inverse]);
      announce(`Done again: ${next.label}.`);
    });
  };
  return {
    keep,
    undo,
    redo,
    undoes: last?.label ?? null,
    redoes: next?.label ?? null,
    isPending: change.isPending,
    error: change.error,
  };
}
