import { memo } from 'react';
import { Link } from 'react-router-dom';
import { type Finding, findingKey, type Outcome } from '#rules/engine/finding';
import type { CheckView } from '#shared/contracts/checks';
import { findingFragment } from '#shared/format/finding-key';
import { countInFigures } from '#shared/format/numbers';
import { Mark } from '../../../components/ui/mark';
import { colourOfMark, markOfOutcome, wordOfOutcome } from '../../../components/ui/marks';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';

const shownOutcomes: readonly Outcome[] = ['fail', 'not shown', 'undecided'];
const mostNamed = 8;

/** What the check says of the reading as it stands, beside the sheet: it follows every answer. */
export const FindingsBeside = memo(function FindingsBeside({
  params,
  check,
}: {
  params: RevisionParams;
  check: CheckView;
}) {
  const { findings, summary } = check;
  const lines = shownOutcomes
    .map((outcome) => ({ outcome, findings: findings.filter((finding) => finding.outcome === outcome) }))
    .filter((line) => line.findings.length > 0);
  return (
    <section aria-labelledby="findings-beside">
      <div className="side-head">
        <h2 id="findings-beside">Findings so far</h2>
        <span>{countInFigures(summary.pass, 'pass', 'pass')}</span>
      </div>
      <ul>
        {lines.map(({ outcome, findings: of }) => (
          <li key={outcome} className="beside-line">
            <span className="number">{of.length}</span>
            <span className={`outcome ${colourOfMark[markOfOutcome[outcome]]}`}>
              <Mark name={markOfOutcome[outcome]} />
              <b>{wordOfOutcome[outcome]}</b>
            </span>
            <span>
              <ClauseLinks params={params} findings={of} />
            </span>
          </li>
        ))}
      </ul>
      {lines.length === 0 ? <p className="small mute py-1">Nothing fails, nothing is open.</p> : null}
    </section>
  );
});

function ClauseLinks({ params, findings }: { params: RevisionParams; findings: readonly Finding[] }) {
  const named = new Map<string, Finding>();
  for (const finding of findings) {
    const name = finding.clause ?? finding.title;
    if (!named.has(name)) named.set(name, finding);
  }
  const shown = [...named].slice(0, mostNamed);
  const left = named.size - shown.length;
  return (
    <>
      {shown.map(([name, finding], index) => (
        <span key={findingKey(finding)}>
          {index > 0 ? ', ' : ''}
          <Link
            className="plain"
            to={{
              pathname: paths.revision(params.submittalId, params.number),
              hash: findingFragment(finding),
            }}
          >
            {name}
          </Link>
        </span>
      ))}
      {left > 0 ? ` and ${left} more` : ''}
    </>
  );
}
