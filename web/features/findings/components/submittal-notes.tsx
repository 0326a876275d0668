import { Button } from '../../../components/ui/button';
import { useLedger } from './ledger-context';
import { NoteForm } from './note-form';
import { RecordedNote } from './recorded-note';

/** Notes on the submittal as a whole stand above the ledger, where everybody looks first. */
export function SubmittalNotes() {
  const { check, revision, draft, setDraft } = useLedger();
  const notes = check.notes.filter((note) => note.finding === null);
  const mayWrite = revision.abilities.note || revision.abilities.reply;
  return (
    <>
      {notes.map((note) => (
        <RecordedNote key={note.id} note={note} />
      ))}
      {draft?.act === 'note' && draft.key === null ? <NoteForm finding={null} /> : null}
      {mayWrite && draft === null ? (
        <Button kind="text" onPress={() => setDraft({ act: 'note', key: null })}>
          Write a note on the whole submittal
        </Button>
      ) : null}
    </>
  );
}
