import { useState } from 'react';
import { formatDate, formatDayAndMonth } from '#shared/format/dates';
import { countOf } from '#shared/format/numbers';
import { Button, LinkButton } from '../../../components/ui/button';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { paths } from '../../../lib/paths';
import { asProblem } from '../../../lib/problem';
import { useGiveBackRevision } from '../api/take-revision';
import { useLedger } from './ledger-context';
import { SubmittalNotes } from './submittal-notes';
import { WithdrawForm } from './withdraw-form';

/** What the findings come to, the clock, and the one act that is next. */
export function Recommendation() {
  const { check, revision } = useLedger();
  return (
    <aside className="recommend" aria-label="Recommendation">
      <h2>Recommended: {check.summary.recommended}</h2>
      <p className="small mute">{check.recommendation}</p>
      <Clock />
      <Acts />
      {revision.reasonForRevision ? (
        <p className="small mute pt-2">Why this revision: {revision.reasonForRevision}</p>
      ) : null}
      <SubmittalNotes />
    </aside>
  );
}

function Clock() {
  const { revision } = useLedger();
  const { receivedOn, dueOn, workingDaysLeft, returned, state } = revision;
  if (returned) {
    return (
      <p className="recommend-when">
        <b>Returned: {returned.disposition}</b>, {formatDate(returned.at)}, by {returned.by}.
      </p>
    );
  }
  if (state === 'draft') return <p className="recommend-when">Draft. Nothing is sent until you submit.</p>;
  if (state === 'withdrawn') return <p className="recommend-when">Withdrawn by the contractor.</p>;
  return (
    <p className="recommend-when">
      {receivedOn ? `Received ${formatDate(receivedOn)}. ` : null}
      {dueOn ? <b>Due {formatDayAndMonth(dueOn)}</b> : null}
      {workingDaysLeft === null ? null : <>, {daysLeft(workingDaysLeft)}.</>}
      {revision.reviewer ? ` With ${revision.reviewer.name}.` : null}
    </p>
  );
}

function daysLeft(days: number): string {
  if (days < 0) return `${countOf(-days, 'working day')} late`;
  return `${countOf(days, 'working day')} left`;
}

function Acts() {
  const { revision, params, take } = useLedger();
  const { abilities } = revision;
  const giveBack = useGiveBackRevision(params, revision.version);
  const decides = abilities.prepareReturn || abilities.sendReturn;
  const [withdrawing, setWithdrawing] = useState(false);
  const problem = take.error ?? giveBack.error;
  const before = revision.revisions.find((each) => each.number === revision.number - 1);
  return (
    <>
      <div className="acts">
        {decides ? (
          <LinkButton
            kind="primary"
            className="acts-in-foot"
            keyHint="D"
            to={paths.return(params.submittalId, params.number)}
          >
            Decide and return
          </LinkButton>
        ) : null}
        {abilities.take ? (
          <Button
            kind={decides ? 'outlined' : 'primary'}
            className="acts-in-foot"
            isDisabled={take.isPending}
            onPress={() => take.mutate()}
          >
            Take for review
          </Button>
        ) : null}
        {abilities.seeReturn && !decides ? (
          <LinkButton kind="outlined" to={paths.return(params.submittalId, params.number)}>
            See the return
          </LinkButton>
        ) : null}
        {abilities.submit ? (
          <LinkButton kind="outlined" className="acts-in-foot" to={{ hash: 'submit' }}>
            Submit revision {revision.number}
          </LinkButton>
        ) : null}
        {abilities.startRevision ? (
          <LinkButton kind="primary" className="acts-in-foot" to={paths.nextRevision(params.submittalId)}>
            Upload revision {revision.number + 1}
          </LinkButton>
        ) : null}
        {abilities.giveBack ? (
          <Button kind="text" isDisabled={giveBack.isPending} onPress={() => giveBack.mutate()}>
            Give back
          </Button>
        ) : null}
        {abilities.withdraw && !withdrawing ? (
          <Button kind="text" onPress={() => setWithdrawing(true)}>
            Withdraw
          </Button>
        ) : null}
        {before ? (
          <LinkButton kind="text" to={paths.revision(params.submittalId, before.number)}>
            See r{before.number}
          </LinkButton>
        ) : null}
      </div>
      {withdrawing && abilities.withdraw ? <WithdrawForm onLeave={() => setWithdrawing(false)} /> : null}
      {problem ? <ProblemNotice problem={asProblem(problem)} /> : null}
    </>
  );
}
