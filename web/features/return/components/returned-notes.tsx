import { useState } from 'react';
import { writeNote } from '#shared/contracts/notes';
import { formatInstantShort } from '#shared/format/dates';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { FormText } from '../../../components/ui/form-fields';
import { Note } from '../../../components/ui/note';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SectionHead } from '../../../components/ui/section-head';
import { announce } from '../../../lib/announce';
import { useContractForm } from '../../../lib/form';
import { type RevisionParams, useRevision } from '../../../lib/queries/revision-query';
import { useReturnedNotes } from '../api/list-returned-notes';
import { useWriteReply } from '../api/write-reply';

type Entry = ReturnType<typeof useReturnedNotes>['notes'][number];

/** What the agency wrote, note by note, each with what was answered. */
export function ReturnedNotes({ params }: { params: RevisionParams }) {
  const { notes } = useReturnedNotes(params);
  const answered = notes.filter((entry) => entry.replies.length > 0).length;
  return (
    <section>
      <SectionHead
        title="Notes of the agency"
        about={notes.length === 0 ? undefined : `${notes.length} in all, ${answered} answered`}
      />
      {notes.length === 0 ? (
        <EmptyState title="The letter came without notes.">What it asks stands in its groups.</EmptyState>
      ) : (
        <ol>
          {notes.map((entry) => (
            <ReturnedNote key={entry.note.id} params={params} entry={entry} />
          ))}
        </ol>
      )}
    </section>
  );
}

function ReturnedNote({ params, entry }: { params: RevisionParams; entry: Entry }) {
  const { timeZone } = useRevision(params).agency;
  const [isWriting, setIsWriting] = useState(false);
  const { note, replies } = entry;
  const about = entry.clause ?? entry.findingTitle ?? 'the submittal';
  return (
    <li className="returned-note">
      <p>
        <b>{entry.clause}</b> {entry.findingTitle ?? (entry.clause ? null : 'On the submittal')}
      </p>
      <Note text={note.text} by={note.by} on={formatInstantShort(note.at, timeZone)} state="returned" />
      {replies.map((reply) => (
        <div key={reply.id} className="reply">
          <Note text={reply.text} by={reply.by} on={formatInstantShort(reply.at, timeZone)} state="reply" />
        </div>
      ))}
      {note.abilities.reply ? (
        isWriting ? (
          <ReplyForm params={params} entry={entry} about={about} onDone={() => setIsWriting(false)} />
        ) : (
          <Button kind="text" onPress={() => setIsWriting(true)} aria-label={`Reply on ${about}`}>
            {replies.length === 0 ? 'Reply' : 'Reply again'}
          </Button>
        )
      ) : null}
    </li>
  );
}

function ReplyForm({
  params,
  entry,
  about,
  onDone,
}: {
  params: RevisionParams;
  entry: Entry;
  about: string;
  onDone: () => void;
}) {
  const reply = useWriteReply(params);
  const { form, problem, onSubmit } = useContractForm({
    schema: writeNote.body!.pick({ text: true }),
    defaultValues: { text: '' },
    submit: async ({ text }) => {
      await reply(entry.note, text);
      announce('The reply is kept.');
      onDone();
    },
  });
  return (
    <form onSubmit={onSubmit} noValidate>
      {problem ? <ProblemNotice problem={problem} unaffected="What you wrote is kept." /> : null}
      <FormText
        control={form.control}
        name="text"
        label={`Reply on ${about}`}
        rows={3}
        maxLength={limits.noteCharacters}
        autoFocus
      />
      <p className="small faint">
        The agency sees it with your next submission, or at once while it holds the mix.
      </p>
      <div className="acts">
        <Button type="submit" isPending={form.formState.isSubmitting}>
          Keep the reply
        </Button>
        <Button kind="text" onPress={onDone}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
