import { formatTime } from '#shared/format/dates';
import { Button } from '../../../components/ui/button';
import { useSession } from '../../../lib/queries/session-query';
import type { DraftEditing } from '../hooks/use-working-copy';

/** Quietly: saved, or why not yet. What is not saved is kept in this browser. */
export function SavedLine({ editing }: { editing: DraftEditing }) {
  const { timeZone } = useSession();
  const { problem, unsaved, savedAt, undo, redo, draft } = editing;
  if (!draft.abilities.change) return null;
  return (
    <div className="saved-line small mute">
      {undo ? (
        <Button kind="inline" onPress={undo}>
          Undo
        </Button>
      ) : null}
      {redo ? (
        <Button kind="inline" onPress={redo}>
          Redo
        </Button>
      ) : null}
      <span role={problem ? 'alert' : undefined}>
        {problem
          ? `Not saved: ${problem.detail} It is kept in this browser and tried again.`
          : unsaved
            ? 'saving'
            : `saved ${formatTime(savedAt, timeZone)}`}
      </span>
    </div>
  );
}
