import { cautions } from '#shared/cautions';
import { formatInstant } from '#shared/format/dates';
import { Button, LinkButton } from '../../../components/ui/button';
import { RunningFoot } from '../../../components/ui/running-foot';
import { paths } from '../../../lib/paths';
import { useProveSeal } from '../api/prove-seal';
import { sealWords, sectionWords } from '../lib/seal-words';
import { useLedger } from './ledger-context';

/** The seal and the edition under the page, then the cautions; on phones the first two acts in their place. */
export function FindingsFoot() {
  const { check, revision, params, timeZone, setDraft } = useLedger();
  const prove = useProveSeal(params);
  const { abilities } = revision;
  const decides = abilities.prepareReturn || abilities.sendReturn;
  const sealed = check.kind === 'pre-check' ? 'Pre-check' : 'Check';
  return (
    <RunningFoot
      texts={[
        <>
          {sealed}{' '}
          <button type="button" className="seal-button" title="Prove the seal" onClick={() => prove.mutate()}>
            {sealWords(check.seal.seal)}
          </button>
          {prove.isPending ? ', being repeated' : proofWords(prove.data?.result, prove.isError)}, sealed{' '}
          {formatInstant(check.madeAt, timeZone)} · {sectionWords(check.section)}
        </>,
        check.startingPoint ? cautions.startingPoint : cautions.findings,
      ]}
      acts={
        decides || abilities.note || abilities.reply ? (
          <>
            {abilities.note || abilities.reply ? (
              <Button onPress={() => setDraft({ act: 'note', key: null })}>Write a note</Button>
            ) : null}
            {decides ? (
              <LinkButton kind="primary" to={paths.return(params.submittalId, params.number)}>
                Decide and return
              </LinkButton>
            ) : null}
            {abilities.submit ? (
              <LinkButton kind="primary" to={{ hash: 'submit' }}>
                Submit revision {revision.number}
              </LinkButton>
            ) : null}
          </>
        ) : undefined
      }
    />
  );
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
