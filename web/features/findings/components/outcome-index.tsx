import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { Outcome } from '#rules/engine/finding';
import { findingFragment } from '#shared/format/finding-key';
import { Mark } from '../../../components/ui/mark';
import { colourOfMark, type MarkName, markOfOutcome } from '../../../components/ui/marks';
import { lowerFirst } from '../lib/folded-line';
import { isConsistency, type LedgerRow } from '../lib/ledger';

const mostNamed = 9;

/** Outcomes with their clause numbers as links: what to look at, not how it scores. */
export function OutcomeIndex({ rows }: { rows: readonly LedgerRow[] }) {
  const judged = rows.filter((row) => !isConsistency(row));
  const of = (outcome: Outcome) => judged.filter(({ finding }) => finding.outcome === outcome);
  const borderline = of('pass').filter(({ finding }) => finding.borderline);
  const inconsistent = rows.filter((row) => isConsistency(row) && row.finding.outcome === 'fail');
  return (
    <div className="tallies">
      <ul className="tally">
        <Tally outcome="fail" rows={of('fail')}>
          <ClauseLinks rows={of('fail')} />
        </Tally>
        <Tally outcome="not shown" rows={of('not shown')}>
          <ClauseLinks rows={of('not shown')} />
        </Tally>
        <Tally outcome="undecided" rows={of('undecided')}>
          <ClauseLinks rows={of('undecided')} />
        </Tally>
      </ul>
      <ul className="tally">
        <Tally outcome="pass" rows={of('pass')}>
          {borderline.length > 0 ? (
            <>
              {borderline.length} of them borderline: <ClauseLinks rows={borderline} />
            </>
          ) : null}
        </Tally>
        <Tally outcome="not applicable" rows={of('not applicable')}>
          {titlesOf(of('not applicable'))}
        </Tally>
        <TallyLine mark="fail" word="does not add up" count={inconsistent.length}>
          <ClauseLinks rows={inconsistent} />
        </TallyLine>
      </ul>
    </div>
  );
}

function Tally({
  outcome,
  rows,
  children,
}: {
  outcome: Outcome;
  rows: readonly LedgerRow[];
  children: ReactNode;
}) {
  return (
    <TallyLine mark={markOfOutcome[outcome]} word={outcome} count={rows.length}>
      {children}
    </TallyLine>
  );
}

function TallyLine({
  mark,
  word,
  count,
  children,
}: {
  mark: MarkName;
  word: string;
  count: number;
  children: ReactNode;
}) {
  return (
    <li>
      <span className="tally-count">{count}</span>
      <Mark name={mark} />
      <span className={`tally-word ${colourOfMark[mark]}`}>{word}</span>
      <span className="tally-clauses">{children}</span>
    </li>
  );
}

/** One link a clause, to its first finding; a clause with several findings is named once. */
function ClauseLinks({ rows }: { rows: readonly LedgerRow[] }) {
  const named = new Map<string, LedgerRow>();
  for (const row of rows) {
    const name = row.finding.clause ?? `${row.finding.subject}: ${lowerFirst(row.finding.title)}`;
    if (!named.has(name)) named.set(name, row);
  }
  const shown = [...named].slice(0, mostNamed);
  const left = named.size - shown.length;
  return (
    <>
      {shown.map(([name, row], index) => (
        <span key={row.key}>
          {index > 0 ? ', ' : ''}
          <Link className="plain" to={{ hash: findingFragment(row.finding) }}>
            {name}
          </Link>
          {row.waiver && row.finding.outcome === 'fail' ? <em> waived</em> : null}
        </span>
      ))}
      {left > 0 ? ` and ${left} more` : ''}
    </>
  );
}

function titlesOf(rows: readonly LedgerRow[]): string {
  const titles = [...new Set(rows.map(({ finding }) => lowerFirst(finding.title)))];
  const shown = titles.slice(0, 3).join(', ');
  return titles.length > 3 ? `${shown} and ${titles.length - 3} more` : shown;
}
