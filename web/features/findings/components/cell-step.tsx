import type { Finding } from '#rules/engine/finding';
import { formatPlain } from '#shared/format/numbers';
import { withUnit } from '#shared/format/units';
import { type Tie, tieOf } from '../lib/ties';
import { TieButton } from './tie-button';

/** What the workbook itself holds: the cell read, or what it reports against what follows from its own inputs. */
export function CellStep({
  finding,
  ties,
  onShow,
}: {
  finding: Finding;
  ties: readonly Tie[];
  onShow: (tie: Tie) => void;
}) {
  const [judged] = finding.evidence;
  if (!judged) return null;
  const { reported } = judged;
  const tie = tieOf(ties, reported ? reported.source : judged.source);
  if (!tie) return null;
  const place = tie.sheet === '' ? tie.cell : `${tie.sheet} ${tie.cell}`;
  return (
    <>
      <dt>Cell</dt>
      <dd>
        {reported ? (
          <>
            {place} reports {withUnit(reported.text, judged.unit)} <TieButton tie={tie} onShow={onShow} />
            {judged.value === null
              ? '.'
              : `; recomputed from its own readings it is ${withUnit(formatPlain(judged.value), judged.unit)}.`}
          </>
        ) : (
          <>
            {place} holds {tie.text} <TieButton tie={tie} onShow={onShow} />.
          </>
        )}
      </dd>
    </>
  );
}
