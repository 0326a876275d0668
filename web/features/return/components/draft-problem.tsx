import { Button } from '../../../components/ui/button';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { asProblem } from '../../../lib/problem';
import type { useReturnDraft } from '../hooks/use-return-draft';

/** Why the draft could not be kept or sent. A draft that changed elsewhere is chosen between, never overwritten. */
export function DraftProblem({
  draft,
  sending,
}: {
  draft: Pick<ReturnType<typeof useReturnDraft>, 'problem' | 'takePresent' | 'keepMine'>;
  sending: Error | null;
}) {
  if (draft.problem?.slug === 'version-stale') {
    return (
      <ProblemNotice problem={draft.problem} unaffected="What you entered is still in the form.">
        <div className="acts pt-2">
          <Button onPress={() => void draft.takePresent()}>Take the present state</Button>
          <Button kind="text" onPress={() => void draft.keepMine()}>
            Keep mine over it
          </Button>
        </div>
      </ProblemNotice>
    );
  }
  if (draft.problem) {
    return <ProblemNotice problem={draft.problem} unaffected="What you entered is still in the form." />;
  }
  return sending ? <ProblemNotice problem={asProblem(sending)} unaffected="The draft is kept." /> : null;
}
