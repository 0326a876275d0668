import { formatInstantShort } from '#shared/format/dates';
import { Button } from '../../../components/ui/button';
import { Kbd } from '../../../components/ui/kbd';
import { Note } from '../../../components/ui/note';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { asProblem } from '../../../lib/problem';
import { useRemoveWaiver } from '../api/waive';
import type { LedgerRow } from '../lib/ledger';
import { nameOfFinding } from '../lib/row-words';
import { whyNotWaived } from '../lib/waivable';
import { useLedger } from './ledger-context';
import { NoteForm } from './note-form';
import { RecordedNote } from './recorded-note';
import { WaiveForm } from './waive-form';

/** The row's margin: its waiver, its notes, and what is being written. Where each stands is placed afterwards. */
export function MarginNotes({ row, isOpen }: { row: LedgerRow; isOpen: boolean }) {
  const { draft, revision, setDraft } = useLedger();
  const writing = draft?.key === row.key ? draft : null;
  const mayWrite = revision.abilities.note || revision.abilities.reply;
  return (
    <>
      {row.waiver ? (
        <div className="margin-note">
          <WaiverNote row={row} isOpen={isOpen} />
        </div>
      ) : null}
      {row.notes.map((note) => (
        <div className="margin-note" key={note.id}>
          <RecordedNote note={note} withActs={isOpen} />
        </div>
      ))}
      {writing?.act === 'note' ? (
        <div className="margin-note">
          <NoteForm finding={row.key} about={nameOfFinding(row.finding)} />
        </div>
      ) : null}
      {writing?.act === 'waive' ? (
        <div className="margin-note">
          <WaiveForm row={row} />
        </div>
      ) : null}
      {isOpen && mayWrite && writing === null ? (
        <div className="margin-note">
          <button
            type="button"
            className="note-write"
            onClick={() => setDraft({ act: 'note', key: row.key })}
          >
            <span>Write a note on {nameOfFinding(row.finding)}</span>
            <Kbd hidden>N</Kbd>
          </button>
          {whyNotWaived(row, revision.abilities) === null ? (
            <button
              type="button"
              className="note-write"
              onClick={() => setDraft({ act: 'waive', key: row.key })}
            >
              <span>Waive with a reason</span>
              <Kbd hidden>W</Kbd>
            </button>
          ) : null}
        </div>
      ) : null}
    </>
  );
}

function WaiverNote({ row: { waiver }, isOpen }: { row: LedgerRow; isOpen: boolean }) {
  const { params, timeZone } = useLedger();
  const remove = useRemoveWaiver(params);
  if (!waiver) return null;
  return (
    <>
      <Note
        text={`Waived. ${waiver.reason}`}
        by={waiver.by}
        on={formatInstantShort(waiver.at, timeZone)}
        state={waiver.toBeReturned ? 'to be returned' : 'internal'}
      >
        {isOpen && waiver.abilities.remove ? (
          <Button kind="inline" isDisabled={remove.isPending} onPress={() => remove.mutate(waiver)}>
            Take the waiver back
          </Button>
        ) : null}
      </Note>
      {remove.isError ? (
        <ProblemNotice problem={asProblem(remove.error)} unaffected="The waiver still stands." />
      ) : null}
    </>
  );
}
