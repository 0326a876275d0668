import { type Finding, findingKey } from '#rules/engine/finding';
import { toPassWords } from '#rules/engine/to-pass';
import { RichText } from '../../../components/ui/rich-text';
import { useLedger } from './ledger-context';

/** Which reading would have to move for a fail to pass, and what would decide what is undecided. */
export function NextStep({ finding }: { finding: Finding }) {
  const { check } = useLedger();
  const ways = toPassWords(check.explanations[findingKey(finding)]?.toPass ?? []);
  return (
    <>
      {ways === '' ? null : (
        <>
          <dt>To pass</dt>
          <dd>
            <RichText>{ways}</RichText>
          </dd>
        </>
      )}
      {finding.wouldDecide === null ? null : (
        <>
          <dt>Would decide it</dt>
          <dd>
            <RichText>{finding.wouldDecide}</RichText>
          </dd>
        </>
      )}
    </>
  );
}
