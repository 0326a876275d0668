import { useRef } from 'react';
import { useNotePlacement } from '../hooks/use-note-placement';
import type { LedgerGroup as Group } from '../lib/ledger';
import { LedgerGroup } from './ledger-group';

/** The findings as a table that hangs from its clause numbers; notes stand in its margin. */
export function Ledger({ groups }: { groups: readonly Group[] }) {
  const frame = useRef<HTMLTableElement>(null);
  useNotePlacement(frame);
  return (
    <table className="ledger" ref={frame} data-ledger>
      <caption className="hidden-text">Findings</caption>
      <thead>
        <tr className="ledger-head">
          <th scope="col">Clause</th>
          <th scope="col">Requirement</th>
          <th scope="col" className="head-observed">
            Observed
          </th>
          <th scope="col">Limits, observed, precision</th>
          <th scope="col" className="head-margin">
            Margin
          </th>
          <th scope="col">Outcome</th>
          <th scope="col">Notes in the margin</th>
        </tr>
      </thead>
      {groups.map((group) => (
        <LedgerGroup key={group.id} group={group} />
      ))}
    </table>
  );
}
