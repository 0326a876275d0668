import { Link } from 'react-router-dom';
import { findingKey } from '#rules/engine/finding';
import { resolvedLimitWords } from '#rules/rule-sets/limit-words';
import type { Home } from '#shared/contracts/home';
import { findingFragment } from '#shared/format/finding-key';
import { marginText } from '#shared/format/margin';
import { unitWord } from '#shared/format/units';
import { LinkButton } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { Gauge } from '../../../components/ui/gauge';
import { Mark } from '../../../components/ui/mark';
import { OutcomeWord } from '../../../components/ui/outcome-word';
import { SectionHead } from '../../../components/ui/section-head';
import { paths } from '../../../lib/paths';

type Current = NonNullable<Home['current']>;
type CurrentFinding = Current['findings'][number];

export function submitAddress({ submittalId, revision }: Pick<Current, 'submittalId' | 'revision'>): string {
  return `${paths.revision(submittalId, revision)}#submit`;
}

/** The draft nearest to being sent, or the newest revision: the findings that ask for a look. */
export function CurrentRevision({ current }: { current: Current }) {
  const address = paths.revision(current.submittalId, current.revision);
  return (
    <section>
      <SectionHead
        title={<Link className="plain" to={address}>{`${current.mixDesignation} ${current.heading}`}</Link>}
        about={current.changes}
        acts={
          current.canSubmit ? (
            <LinkButton kind="primary" className="acts-in-foot" to={submitAddress(current)}>
              Submit revision {current.revision}
            </LinkButton>
          ) : null
        }
      />
      {current.findings.length === 0 ? (
        <EmptyState title="Nothing is left to do.">
          Every finding passes clear of its limit. <Link to={address}>See all findings</Link>
        </EmptyState>
      ) : (
        <ol className="look-list">
          {current.findings.map((entry) => (
            <LookRow key={findingKey(entry.finding)} entry={entry} address={address} />
          ))}
        </ol>
      )}
    </section>
  );
}

function LookRow({ entry, address }: { entry: CurrentFinding; address: string }) {
  const { finding } = entry;
  const hasValue = finding.observed !== null && finding.outcome !== 'not shown';
  return (
    <li className="look-row">
      <span className="look-clause">{finding.clause ?? ''}</span>
      <span className="look-title">
        <Link className="plain" to={`${address}#${findingFragment(finding)}`}>
          <b>{finding.title}</b>
        </Link>{' '}
        {limitOf(entry)}
        <span className="look-was">{wasText(entry)}</span>
      </span>
      <b className="look-value number" title={finding.observed?.text}>
        {hasValue ? finding.observed?.text : ''}
      </b>
      <span className="look-gauge">
        <Gauge finding={finding} widthPx={132} />
      </span>
      <span className="look-margin number">
        {marginText(finding)}
        {finding.borderline ? <Mark name="borderline" alone /> : <span className="mark" aria-hidden="true" />}
      </span>
      <span className="look-outcome">
        <OutcomeWord outcome={finding.outcome} />
      </span>
    </li>
  );
}

function limitOf({ finding }: CurrentFinding): string {
  if (!finding.limit) return '';
  const unit = unitWord(finding.limit.unit);
  const words = resolvedLimitWords(finding.limit);
  return words === '' || unit === '' ? words : `${words} ${unit}`;
}

/** What it was in the revision before, else why it stands as it does. */
function wasText({ finding, previousText, previousOutcome }: CurrentFinding): string {
  if (previousText) return `was ${previousText}`;
  if (previousOutcome)
    return previousOutcome === finding.outcome ? `still ${previousOutcome}` : `was ${previousOutcome}`;
  return finding.outcome === 'pass' ? '' : finding.reason;
}
