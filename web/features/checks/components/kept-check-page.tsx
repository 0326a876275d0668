import { Link } from 'react-router-dom';
import { findingKey } from '#rules/engine/finding';
import { checkCautions } from '#shared/cautions';
import { formatDate, formatInstant } from '#shared/format/dates';
import { sectionWords } from '#shared/format/section-words';
import { shortHash } from '#shared/format/short-hash';
import { MarginPage } from '../../../components/ui/margin-page';
import { OutcomeWord } from '../../../components/ui/outcome-word';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { paths } from '../../../lib/paths';
import { useRevision } from '../../../lib/queries/revision-query';
import { useRevisionParams } from '../../../lib/revision-params';
import { usePageTitle } from '../../../lib/use-page-title';
import { useKeptCheck } from '../api/kept-checks';

/** The findings of one check as they were made; nothing is written on them here. */
export function KeptCheckPage({ number }: { number: number }) {
  const params = useRevisionParams();
  const revision = useRevision(params);
  const check = useKeptCheck(params, number);
  const { timeZone } = revision.agency;
  const made = formatInstant(check.madeAt, timeZone);
  usePageTitle(`Check of ${made}, ${revision.mixDesignation} revision ${revision.number}`);
  return (
    <MarginPage>
      <PageHead
        kicker={
          <Link to={paths.checks(params.submittalId, params.number)}>
            Checks of {revision.mixDesignation} revision {revision.number}
          </Link>
        }
        title={`Check of ${made}`}
        rest={`recommended: ${check.recommended}`}
        lede={`${sectionWords(check)} · judged as submitted on ${formatDate(check.submittedOn)}`}
      />
      <table className="table table-stacked">
        <caption className="hidden-text">Findings</caption>
        <thead>
          <tr>
            <th scope="col">Clause</th>
            <th scope="col">Finding</th>
            <th scope="col">Result</th>
            <th scope="col">Outcome</th>
          </tr>
        </thead>
        <tbody>
          {check.findings.map((finding) => (
            <tr key={findingKey(finding)}>
              <td>{finding.clause}</td>
              <th scope="row">
                {finding.title} <span className="mute font-normal">{finding.requirement}</span>
              </th>
              <td>{[finding.sentence, finding.reason].filter((part) => part !== '').join(' ')}</td>
              <td>
                <OutcomeWord
                  outcome={finding.outcome}
                  qualifiers={finding.borderline ? ['borderline'] : []}
                />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <RunningFoot
        texts={[
          `Seal ${shortHash(check.seal)}, engine ${check.engineVersion}, made ${made}`,
          ...checkCautions(check.startingPoint),
        ]}
      />
    </MarginPage>
  );
}
