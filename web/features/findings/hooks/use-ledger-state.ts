import { useMemo, useState } from 'react';
import { useLocation, useNavigate, useSearchParams } from 'react-router-dom';
import { findingKey } from '#rules/engine/finding';
import type { CheckView } from '#shared/contracts/checks';
import { findByFragment, findingFragment } from '#shared/format/finding-key';
import type { Draft } from '../components/ledger-context';
import { type LedgerOrder, ledgerGroups, ledgerRows } from '../lib/ledger';

/** What is open, unfolded and being written. The order and the row of the address live in the address. */
export function useLedgerState(check: CheckView) {
  const [search] = useSearchParams();
  const { hash } = useLocation();
  const navigate = useNavigate();
  const order: LedgerOrder = search.get('order') === 'what-to-do' ? 'what to do' : 'clause';
  const rows = useMemo(() => ledgerRows(check), [check]);
  const groups = useMemo(
    () => ledgerGroups(rows, order, check.clauseTitles),
    [rows, order, check.clauseTitles],
  );
  const addressed = useMemo(() => findByFragment(check.findings, hash), [check.findings, hash]);
  const [open, setOpen] = useState<ReadonlySet<string>>(
    () => new Set(addressed ? [findingKey(addressed)] : []),
  );
  const [unfolded, setUnfoldedSet] = useState<ReadonlySet<string>>(new Set());
  const [draft, setDraft] = useState<Draft | null>(null);

  const toggle = (key: string) => {
    const opens = !open.has(key);
    setOpen(withOrWithout(open, key, opens));
    const row = rows.find((each) => each.key === key);
    const fragment = opens && row ? `#${findingFragment(row.finding)}` : '';
    void navigate(
      { search: search.toString(), hash: fragment },
      { replace: true, preventScrollReset: true, state: { byHand: true } },
    );
  };
  /** The reader's own note on a row where there is one, else a new one. */
  const editNote = (key: string) => {
    const note = rows.find((row) => row.key === key)?.notes.find((each) => each.abilities.change);
    setDraft(note ? { act: 'change', key, noteId: note.id } : { act: 'note', key });
  };
  return {
    rows,
    groups,
    order,
    addressed,
    open,
    show: (key: string) => setOpen((now) => withOrWithout(now, key, true)),
    toggle,
    unfolded,
    setUnfolded: (groupId: string, isUnfolded: boolean) =>
      setUnfoldedSet((now) => withOrWithout(now, groupId, isUnfolded)),
    draft,
    setDraft,
    editNote,
  };
}

function withOrWithout(set: ReadonlySet<string>, item: string, included: boolean): ReadonlySet<string> {
  const next = new Set(set);
  if (included) next.add(item);
  else next.delete(item);
  return next;
}
