import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SectionHead } from '../../../components/ui/section-head';
import { TextAreaField } from '../../../components/ui/text-field';
import { announce } from '../../../lib/announce';
import { paths } from '../../../lib/paths';
import { asProblem } from '../../../lib/problem';
import { useDiscard, usePublish, useSendForReview, useTakeBack } from '../api/review-draft';
import { useDraftInHand } from './draft-layout';

/** From draft to edition: sent by one rule author, published by another. */
export function ReviewActs() {
  const { editing } = useDraftInHand();
  const { draft, unsaved } = editing;
  const send = useSendForReview();
  const takeBack = useTakeBack();
  const { abilities } = draft;
  const seen = { id: draft.id, version: draft.version };
  const error = send.error ?? takeBack.error;
  if (!abilities.change && !abilities.takeBack) return null;
  return (
    <>
      <SectionHead title="Review" about="a second rule author publishes what the first one wrote" />
      {error ? <ProblemNotice problem={asProblem(error)} unaffected="The draft is as it was." /> : null}
      {draft.state === 'draft' ? (
        <div className="acts pt-2">
          <Button
            kind="primary"
            isDisabled={unsaved}
            isPending={send.isPending}
            onPress={() => send.mutate(seen)}
          >
            Send for review
          </Button>
          <DiscardAct />
        </div>
      ) : (
        <>
          {abilities.publish ? (
            <PublishForm />
          ) : (
            <p className="pt-2">You sent it for review; a second rule author publishes it.</p>
          )}
          <div className="acts pt-2">
            <Button isPending={takeBack.isPending} onPress={() => takeBack.mutate(seen)}>
              Take it out of review
            </Button>
          </div>
        </>
      )}
    </>
  );
}

function PublishForm() {
  const { editing, remarks, checked } = useDraftInHand();
  const { draft } = editing;
  const [word, setWord] = useState('');
  const publish = usePublish();
  const navigate = useNavigate();
  const warnings = (remarks ?? []).filter(({ level }) => level === 'warning').length;
  const errors = (remarks ?? []).length - warnings;
  const go = () =>
    publish.mutate(
      { id: draft.id, version: draft.version, word: word.trim() === '' ? null : word },
      {
        onSuccess: async ({ ruleSet, edition }) => {
          announce(`Edition ${edition} is published.`);
          await navigate(paths.ruleSet(ruleSet, edition));
        },
      },
    );
  return (
    <div className="pt-2">
      {publish.error ? (
        <ProblemNotice problem={asProblem(publish.error)} unaffected="Nothing is published." />
      ) : null}
      {warnings > 0 ? (
        <TextAreaField
          label="Why with its warnings"
          rows={2}
          maxLength={limits.reasonCharacters}
          value={word}
          onChange={setWord}
          help={`${warnings} stand; the word is kept with the edition`}
        />
      ) : null}
      <div className="acts pt-2">
        <Button
          kind="primary"
          isDisabled={!checked.ok || remarks === null || errors > 0}
          isPending={publish.isPending}
          onPress={go}
        >
          Publish
        </Button>
        <span className="small mute">
          {errors > 0 || !checked.ok ? 'Publishing waits for the errors above.' : 'An edition never changes.'}
        </span>
      </div>
    </div>
  );
}

/** Asked twice, since nothing brings a draft back. */
function DiscardAct() {
  const { draft } = useDraftInHand().editing;
  const [asked, setAsked] = useState(false);
  const discard = useDiscard();
  const navigate = useNavigate();
  if (!asked) {
    return (
      <Button kind="text" onPress={() => setAsked(true)}>
        Discard the draft
      </Button>
    );
  }
  return (
    <>
      {discard.error ? <ProblemNotice problem={asProblem(discard.error)} /> : null}
      <span>Discard the draft with its comments? Nothing brings it back.</span>
      <Button
        isPending={discard.isPending}
        onPress={() =>
          discard.mutate(
            { id: draft.id, version: draft.version },
            { onSuccess: () => navigate(paths.ruleSets) },
          )
        }
      >
        Discard it
      </Button>
      <Button kind="text" onPress={() => setAsked(false)}>
        Keep it
      </Button>
    </>
  );
}
