import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { formatInstant } from '#shared/format/dates';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { TextAreaField } from '../../../components/ui/text-field';
import { asProblem } from '../../../lib/problem';
import { useSession } from '../../../lib/queries/session-query';
import { useRemoveComment, useWriteComment } from '../api/comment-on-draft';
import { draftCommentsQuery } from '../api/get-draft';

/** Comments on the draft, or on one of its rules; kept with the draft, never in the edition. */
export function DraftComments({
  draftId,
  rule,
  mayWrite,
}: {
  draftId: string;
  rule: string | null;
  mayWrite: boolean;
}) {
  const { timeZone } = useSession();
  const { comments } = useSuspenseQuery(draftCommentsQuery(draftId)).data;
  const remove = useRemoveComment(draftId);
  const shown = comments.filter((comment) => comment.rule === rule);
  return (
    <>
      <h2>Comments</h2>
      {shown.map((comment) => (
        <div key={comment.id} className="draft-comment">
          <p>{comment.text}</p>
          <p className="small mute">
            {comment.by.name}, {formatInstant(comment.at, timeZone)}{' '}
            {comment.mine ? (
              <Button kind="inline" onPress={() => remove.mutate(comment)}>
                Remove
              </Button>
            ) : null}
          </p>
        </div>
      ))}
      {shown.length === 0 ? <p className="small mute">None yet. They stay with the draft.</p> : null}
      {remove.error ? <ProblemNotice problem={asProblem(remove.error)} /> : null}
      {mayWrite ? <CommentForm key={rule} draftId={draftId} rule={rule} /> : null}
    </>
  );
}

function CommentForm({ draftId, rule }: { draftId: string; rule: string | null }) {
  const [text, setText] = useState('');
  const write = useWriteComment(draftId);
  return (
    <div className="pt-2">
      {write.error ? <ProblemNotice problem={asProblem(write.error)} /> : null}
      <TextAreaField
        label={rule === null ? 'Comment on the draft' : 'Comment on this rule'}
        hideLabel
        rows={2}
        maxLength={limits.noteCharacters}
        placeholder={rule === null ? 'On the draft' : 'On this rule'}
        value={text}
        onChange={setText}
      />
      <Button
        kind="text"
        isDisabled={text.trim() === ''}
        isPending={write.isPending}
        onPress={() => write.mutate({ rule, text }, { onSuccess: () => setText('') })}
      >
        Keep the comment
      </Button>
    </div>
  );
}
