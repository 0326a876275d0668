import { createContext, useContext } from 'react';
import type { CheckView } from '#shared/contracts/checks';
import type { Revision } from '#shared/contracts/submittals';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import type { useTakeRevision } from '../api/take-revision';

/** What is being written in the margin, and on what. */
export type Draft =
  | { act: 'note'; key: string | null }
  | { act: 'reply'; key: string | null; answers: string }
  | { act: 'change'; key: string | null; noteId: string }
  | { act: 'waive'; key: string };

export interface LedgerState {
  params: RevisionParams;
  revision: Revision;
  check: CheckView;
  timeZone: string;
  open: ReadonlySet<string>;
  toggle: (key: string) => void;
  unfolded: ReadonlySet<string>;
  setUnfolded: (groupId: string, unfolded: boolean) => void;
  draft: Draft | null;
  setDraft: (draft: Draft | null) => void;
  /** One act in two places: at the head of the page and, on phones, in its foot. */
  take: ReturnType<typeof useTakeRevision>;
}

export const LedgerContext = createContext<LedgerState | null>(null);

export function useLedger(): LedgerState {
  const state = useContext(LedgerContext);
  if (!state) throw new Error('A part of the ledger stands outside of it.');
  return state;
}
