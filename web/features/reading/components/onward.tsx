import type { ReadingView } from '#shared/contracts/readings';
import { LinkButton } from '../../../components/ui/button';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { doubtsLeftWords } from '../lib/doubt-answers';
import { learnedWords } from '../lib/learned-words';

/** What comes next, how many doubts are left, and where what was said is kept. */
export function Onward({
  params,
  reading,
  laboratory,
}: {
  params: RevisionParams;
  reading: ReadingView;
  laboratory: string;
}) {
  return (
    <div className="onward">
      <LinkButton kind="primary" keyHint="Enter" to={paths.revision(params.submittalId, params.number)}>
        See the findings
      </LinkButton>
      <span className="small mute">
        {doubtsLeftWords(reading.doubts)} {learnedWords(reading, laboratory)}
      </span>
    </div>
  );
}
