import { Button } from '../../../components/ui/button';
import { Mark } from '../../../components/ui/mark';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { asProblem } from '../../../lib/problem';
import { useCheckAgain } from '../api/check-again';
import { useLedger } from './ledger-context';

/** The check no longer stands on what is in force; a new one is made, the old one kept. */
export function StaleLine({ reason }: { reason: string }) {
  const { params, revision } = useLedger();
  const again = useCheckAgain(params, revision.version);
  return (
    <>
      <div className="stale-line" role="status">
        <Mark name="undecided" />
        <span>{reason}</span>
        {revision.abilities.checkAgain ? (
          <Button kind="text" isDisabled={again.isPending} onPress={() => again.mutate()}>
            {again.isPending ? 'Checking' : 'Check again'}
          </Button>
        ) : null}
      </div>
      {again.isError ? (
        <ProblemNotice problem={asProblem(again.error)} unaffected="The earlier check still stands below." />
      ) : null}
    </>
  );
}
