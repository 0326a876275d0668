import { useRef } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Revision } from '#shared/contracts/submittals';
import { announce } from '../../../lib/announce';
import { paths } from '../../../lib/paths';
import { type Shortcut, useShortcuts } from '../../../lib/shortcuts';
import { whyNotWaived } from '../lib/waivable';
import type { useLedgerState } from './use-ledger-state';

/** J and K walk the rows, Enter opens the one in focus, N, E and W write beside it, D decides. */
export function useLedgerKeys(state: ReturnType<typeof useLedgerState>, revision: Revision): void {
  const cursor = useRef<string | null>(null);
  const navigate = useNavigate();
  const { abilities } = revision;
  const rowAtHand = () => {
    const key = focusedRow() ?? cursor.current;
    return state.rows.find((each) => each.key === key);
  };
  const waive = () => {
    const row = rowAtHand();
    const whyNot = row ? whyNotWaived(row, abilities) : 'Go to the row of a fail first.';
    if (whyNot !== null) announce(whyNot);
    else if (row) state.setDraft({ act: 'waive', key: row.key });
  };
  const edit = () => {
    const row = rowAtHand();
    if (row) state.editNote(row.key);
    else announce('Go to a row first.');
  };
  const walk = (step: 1 | -1) => {
    cursor.current = walkRows(step, focusedRow() ?? cursor.current);
  };
  const keys: (Shortcut | false)[] = [
    { key: 'j', label: 'next', run: () => walk(1), foot: true },
    { key: 'k', label: 'previous', run: () => walk(-1), foot: true },
    { key: 'Enter', label: 'open', run: () => undefined, foot: true, listedOnly: true },
    (abilities.note || abilities.reply) && {
      key: 'n',
      label: 'note',
      run: () => state.setDraft({ act: 'note', key: rowAtHand()?.key ?? null }),
      foot: true,
    },
    (abilities.note || abilities.reply) && { key: 'e', label: 'edit the note', run: edit },
    (abilities.waiveAdvisory || abilities.waiveRequired) && {
      key: 'w',
      label: 'waive',
      run: waive,
      foot: true,
    },
    (abilities.prepareReturn || abilities.sendReturn) && {
      key: 'd',
      label: 'decide',
      run: () => void navigate(paths.return(revision.submittalId, revision.number)),
      foot: true,
    },
  ];
  useShortcuts(keys.filter((key) => key !== false));
}

function focusedRow(): string | null {
  const entry = document.activeElement?.closest('.ledger-entry');
  return entry?.querySelector<HTMLElement>('[data-row]')?.dataset.row ?? null;
}

/** Moves the focus one row on; answers with the row that has it now. */
function walkRows(step: 1 | -1, from: string | null): string | null {
  const buttons = [...document.querySelectorAll<HTMLElement>('[data-ledger] [data-row]')];
  const at = buttons.findIndex((button) => button.dataset.row === from);
  const next = at === -1 ? (step === 1 ? 0 : buttons.length - 1) : at + step;
  const button = buttons[Math.min(Math.max(next, 0), buttons.length - 1)];
  if (!button) return null;
  button.focus({ preventScroll: true });
  button.closest('.ledger-row')?.scrollIntoView({ block: 'nearest' });
  return button.dataset.row ?? null;
}
