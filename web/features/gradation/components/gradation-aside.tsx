import { Link } from 'react-router-dom';
import type { Finding } from '#rules/engine/finding';
import { findingFragment } from '#shared/format/finding-key';
import { marginText } from '#shared/format/margin';
import { Mark } from '../../../components/ui/mark';
import { markOfOutcome } from '../../../components/ui/marks';

/** Sieve by sieve, what the control points make of the job mix; each leads to its finding. */
export function GradationAside({
  findings,
  revisionPath,
}: {
  findings: readonly Finding[];
  revisionPath: string;
}) {
  return (
    <>
      <h2>Control points</h2>
      {findings.length === 0 ? <p className="mute">No rule of this section has control points.</p> : null}
      <ul>
        {findings.map((finding) => (
          <li key={`${finding.rule}${finding.subject}`} className="control-line">
            <Mark name={markOfOutcome[finding.outcome]} alone />
            <Link className="plain" to={`${revisionPath}#${findingFragment(finding)}`}>
              {finding.subject}
            </Link>
            <span className="number">{finding.observed?.text ?? ''}</span>
            <span className="number">{marginText(finding)}</span>
          </li>
        ))}
      </ul>
      <p className="small mute pt-4">
        Fine lines are the sieves of the series; US names stand in the table. A bar is what the rule allows on
        its sieve, a single tick leaves the other side open.
      </p>
    </>
  );
}
