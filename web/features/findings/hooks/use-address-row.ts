import { useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';
import { findingKey } from '#rules/engine/finding';
import type { useLedgerState } from './use-ledger-state';

/** Follows the fragment of the address: opens its row, unfolds its group, brings it into sight and focus. */
export function useAddressRow(state: ReturnType<typeof useLedgerState>): void {
  const location = useLocation();
  const latest = useRef(state);
  latest.current = state;
  // biome-ignore lint/correctness/useExhaustiveDependencies: only a new address moves the reader, never a changed ledger.
  useEffect(() => {
    const { addressed, groups, show, setUnfolded, editNote } = latest.current;
    const arrival: unknown = location.state;
    if (!addressed || says(arrival, 'byHand')) return;
    const key = findingKey(addressed);
    const group = groups.find((each) => each.folded.some((row) => row.key === key));
    if (group) setUnfolded(group.id, true);
    show(key);
    if (says(arrival, 'editNote')) editNote(key);
    else requestAnimationFrame(() => focusRow(key));
  }, [location.key, location.hash]);
}

export function focusRow(key: string): void {
  const button = document.querySelector<HTMLElement>(`[data-row="${CSS.escape(key)}"]`);
  button?.focus({ preventScroll: true });
  button?.closest('.ledger-entry')?.scrollIntoView({ block: 'center' });
}

/** After something was written in the margin: back to its row, without moving the page. */
export function returnToRow(key: string | null): void {
  if (key === null) return;
  requestAnimationFrame(() => {
    document.querySelector<HTMLElement>(`[data-row="${CSS.escape(key)}"]`)?.focus({ preventScroll: true });
  });
}

function says(state: unknown, what: 'byHand' | 'editNote'): boolean {
  return typeof state === 'object' && state !== null && what in state;
}
