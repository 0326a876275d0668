import type { Note as NoteRecord } from '#shared/contracts/notes';
import { formatInstantShort } from '#shared/format/dates';
import { Button } from '../../../components/ui/button';
import { Note } from '../../../components/ui/note';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { asProblem } from '../../../lib/problem';
import { useRemoveNote } from '../api/change-note';
import { useLedger } from './ledger-context';
import { NoteForm } from './note-form';

/** A kept note; what its reader may do with it stands under it while its row is open. */
export function RecordedNote({ note, withActs = true }: { note: NoteRecord; withActs?: boolean }) {
  const { params, timeZone, draft, setDraft, revision } = useLedger();
  const remove = useRemoveNote(params);
  if (draft?.act === 'change' && draft.noteId === note.id) {
    return <NoteForm finding={note.finding} change={note} />;
  }
  const earlier = note.revision === revision.number ? '' : `on revision ${note.revision}, `;
  return (
    <>
      <Note
        text={note.text}
        by={note.by}
        on={formatInstantShort(note.at, timeZone)}
        state={earlier + note.kind}
      >
        {withActs && note.abilities.reply ? (
          <Button
            kind="inline"
            onPress={() => setDraft({ act: 'reply', key: note.finding, answers: note.id })}
          >
            Reply
          </Button>
        ) : null}
        {withActs && note.abilities.change ? (
          <Button
            kind="inline"
            onPress={() => setDraft({ act: 'change', key: note.finding, noteId: note.id })}
          >
            Change
          </Button>
        ) : null}
        {withActs && note.abilities.remove ? (
          <Button kind="inline" isDisabled={remove.isPending} onPress={() => remove.mutate(note)}>
            Remove
          </Button>
        ) : null}
      </Note>
      {remove.isError ? <ProblemNotice problem={asProblem(remove.error)} /> : null}
      {draft?.act === 'reply' && draft.answers === note.id ? (
        <NoteForm finding={note.finding} answers={note} />
      ) : null}
    </>
  );
}
