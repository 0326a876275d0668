import { checkCautions } from '#shared/cautions';
import { formatDate, formatInstant } from '#shared/format/dates';
import { sectionWords } from '#shared/format/section-words';
import { shortHash } from '#shared/format/short-hash';
import { Button, LinkButton } from '../../../components/ui/button';
import { RunningFoot } from '../../../components/ui/running-foot';
import { paths } from '../../../lib/paths';
import { useProveSeal } from '../api/prove-seal';
import { useLedger } from './ledger-context';

/** The seal and the edition under the page, then the cautions; on phones the first two acts in their place. */
export function FindingsFoot() {
  const { check, params, timeZone } = useLedger();
  const prove = useProveSeal(params);
  const isPreCheck = check.kind === 'pre-check';
  return (
    <RunningFoot
      texts={[
        <>
          {isPreCheck ? 'Pre-check' : 'Check'}{' '}
          <button type="button" className="seal-button" title="Prove the seal" onClick={() => prove.mutate()}>
            {shortHash(check.seal.seal)}
          </button>
          {prove.isPending ? ', being repeated' : proofWords(prove.data?.result, prove.isError)}
          {isPreCheck ? `, judged as if submitted on ${formatDate(check.submittedOn)}` : null}, sealed{' '}
          {formatInstant(check.madeAt, timeZone)} · {sectionWords(check.section)}
          {check.section.state === 'in force' ? null : `, ${check.section.state}`}
        </>,
        ...checkCautions(check.startingPoint),
      ]}
      acts={useFootActs()}
    />
  );
}

/** The second act and the primary one, as the revision's abilities leave at most one of those that move it on. */
function useFootActs() {
  const { revision, params, setDraft, take } = useLedger();
  const { abilities } = revision;
  const primary = primaryAct();
  const second =
    abilities.note || abilities.reply ? (
      <Button onPress={() => setDraft({ act: 'note', key: null })}>Write a note</Button>
    ) : null;
  return primary || second ? (
    <>
      {second}
      {primary}
    </>
  ) : undefined;

  function primaryAct() {
    if (abilities.prepareReturn || abilities.sendReturn) {
      return (
        <LinkButton kind="primary" to={paths.return(params.submittalId, params.number)}>
          Decide and return
        </LinkButton>
      );
    }
    if (abilities.take) {
      return (
        <Button
          kind="primary"
          isDisabled={take.isPending}
          onPress={() => take.mutate(undefined, { onError })}
        >
          Take for review
        </Button>
      );
    }
    if (abilities.submit) {
      return (
        <LinkButton kind="primary" to={{ hash: 'submit' }}>
          Submit revision {revision.number}
        </LinkButton>
      );
    }
    if (abilities.startRevision) {
      return (
        <LinkButton kind="primary" to={paths.nextRevision(params.submittalId)}>
          Upload revision {revision.number + 1}
        </LinkButton>
      );
    }
    return null;
  }
}

/** The refusal stands beside the same act at the head of the page, out of sight of the foot. */
function onError(): void {
  document.querySelector('.recommend')?.scrollIntoView({ block: 'start' });
}

function proofWords(
  result: 'same' | 'other engine version' | 'different' | undefined,
  failed: boolean,
): string {
  if (failed) return ', could not be repeated';
  if (result === undefined) return '';
  if (result === 'same') return ', repeated and the same';
  return result === 'different' ? ', repeated and different' : ', made by another engine version';
}
