import { Link } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import { getReturnWorkbook, type ReturnView } from '#shared/contracts/returns';
import type { Revision } from '#shared/contracts/submittals';
import { dateOfInstant, formatDate, formatInstant } from '#shared/format/dates';
import { LinkButton } from '../../../components/ui/button';
import { Mark } from '../../../components/ui/mark';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { SectionHead } from '../../../components/ui/section-head';
import { TwoHalves } from '../../../components/ui/two-halves';
import { hrefOf } from '../../../lib/api';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useSession } from '../../../lib/queries/session-query';
import { letterHref } from '../api/get-letter';
import { LetterInSight } from './letter-in-sight';
import { ReturnedNotes } from './returned-notes';

type Sent = NonNullable<ReturnView['sent']>;

export function SentPage({
  params,
  view,
  revision,
}: {
  params: RevisionParams;
  view: ReturnView;
  revision: Revision;
}) {
  const { active } = useSession();
  const { timeZone } = revision.agency;
  const { sent } = view;
  if (!sent) return null;
  const next = revision.number + 1;
  const startNext = revision.abilities.startRevision ? (
    <LinkButton kind="primary" to={paths.nextRevision(params.submittalId)}>
      Upload revision {next}
    </LinkButton>
  ) : null;
  return (
    <TwoHalves
      work={
        <>
          <PageHead
            kicker={
              <>
                <Link to={paths.revision(params.submittalId, params.number)}>
                  {revision.mixDesignation} revision {revision.number}
                </Link>{' '}
                · {revision.project.number} {revision.project.title}
              </>
            }
            title="Return"
            rest={view.disposition}
            lede={`Sent ${formatDate(dateOfInstant(sent.at, timeZone))} by ${sent.by}, ${revision.agency.name}.`}
          />
          {view.reason ? <p className="prose pb-2">{view.reason}</p> : null}
          <p className="acts pb-2">
            <a href={letterHref(params)} target="_blank" rel="noreferrer">
              Letter, PDF
            </a>
            {sent.workbookSha256 ? (
              <a href={hrefOf(getReturnWorkbook, { params })} download>
                Findings workbook
              </a>
            ) : null}
            <Link to={paths.revision(params.submittalId, params.number)}>Findings</Link>
          </p>
          {startNext ? <div className="acts pb-2">{startNext}</div> : null}
          <ReturnedNotes params={params} />
          {active?.kind === 'agency' ? <MailStates sent={sent} timeZone={timeZone} /> : null}
        </>
      }
      sight={
        <>
          <LetterInSight params={params} version={view.version} title="The letter as it was sent" />
          <RunningFoot
            texts={[`SHA-256 of the letter ${sent.letterSha256.slice(0, 8)} …`, cautions.findings]}
            acts={startNext}
          />
        </>
      }
    />
  );
}

function MailStates({ sent, timeZone }: { sent: Sent; timeZone: string }) {
  return (
    <section>
      <SectionHead title="Mail" about={`handed over ${formatInstant(sent.at, timeZone)}`} />
      <table className="table table-stacked">
        <thead>
          <tr>
            <th scope="col">To</th>
            <th scope="col">State</th>
            <th scope="col" className="number">
              Attempts
            </th>
            <th scope="col">Last problem</th>
          </tr>
        </thead>
        <tbody>
          {sent.mail.map((mail) => (
            <tr key={mail.to}>
              <th scope="row">{mail.to}</th>
              <td>
                {mail.state === 'failed' ? <Mark name="fail" /> : null} {mail.state}
              </td>
              <td className="number">{mail.attempts}</td>
              <td>{mail.lastProblem ?? ''}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
