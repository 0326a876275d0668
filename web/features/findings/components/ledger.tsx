import { useRef } from 'react';
import { useNotePlacement } from '../hooks/use-note-placement';
import type { LedgerGroup as Group } from '../lib/ledger';
import { LedgerGroup } from './ledger-group';

/** The findings as a table that hangs from its clause numbers; notes stand in its margin. */
export function Ledger({ groups }: { groups: readonly Group[] }) {
  const frame = useRef<HTMLDivElement>(null);
  useNotePlacement(frame);
  return (
    // biome-ignore lint/a11y/useSemanticElements: rows are grids with an opened part under them, which a table element cannot hold.
    <div className="ledger" role="table" aria-label="Findings" ref={frame} data-ledger>
      <div role="rowgroup">
        <div className="ledger-head" role="row">
          <div role="columnheader">Clause</div>
          <div role="columnheader">Requirement</div>
          <div role="columnheader" className="head-observed">
            Observed
          </div>
          <div role="columnheader">Limits, observed, precision</div>
          <div role="columnheader" className="head-margin">
            Margin
          </div>
          <div role="columnheader">Outcome</div>
          <div role="columnheader">Notes in the margin</div>
        </div>
      </div>
      {groups.map((group) => (
        <LedgerGroup key={group.id} group={group} />
      ))}
    </div>
  );
}
