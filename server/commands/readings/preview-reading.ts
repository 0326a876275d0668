import { evaluate } from '#rules/engine/evaluate';
import type { ReadingPreview } from '#shared/contracts/corrections';
import type { Deps } from '../../deps';
import { presentPreview } from '../../presenters/present-preview';
import { wordsFor } from '../../presenters/words-for';
import { changeReading, type ReadingChange } from './change-reading';

/** Carries the preview out of a transaction that is to leave nothing behind. */
class Previewed extends Error {
  constructor(readonly preview: ReadingPreview) {
    super('The preview is made.');
  }
}

/** What a change would do, found out by doing it and undoing it: no second account of it can differ. */
export async function previewReading(deps: Deps, change: ReadingChange): Promise<ReadingPreview> {
  try {
    return await deps.db.transaction(async (tx): Promise<ReadingPreview> => {
      const { before, record, result, context, learning } = await changeReading({ ...deps, db: tx }, change);
      const preview = presentPreview({
        before: { record: before.record, result: evaluate(before.record, before.edition, context) },
        after: { record, result },
        words: wordsFor(before.edition),
        learning,
      });
      throw new Previewed(preview);
    });
  } catch (error) {
    if (error instanceof Previewed) return error.preview;
    throw error;
  }
}
