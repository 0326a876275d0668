import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { ReadingView } from '#shared/contracts/readings';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';
import { readingQuery } from './get-reading';

/**
 * A change of how the workbook was read. The answer is the whole reading, so it is put in place at once; findings,
 * cell tints and the home page follow. After a refusal the present state is fetched, so that the page shows no wish.
 */
export function useReadingChange<Change>(
  params: RevisionParams,
  change: (given: Change, present: ReadingView) => Promise<ReadingView>,
  /** How the page shows the change at once, while the server reads and checks again. */
  foreseen: (given: Change, present: ReadingView) => ReadingView = (_, present) => present,
) {
  const client = useQueryClient();
  const options = readingQuery(params);
  return useMutation({
    mutationFn: async (given: Change) => change(given, await client.ensureQueryData(options)),
    // One after the other: each change sends the version that the one before it brought.
    scope: { id: JSON.stringify(options.queryKey) },
    onMutate: (given: Change) => {
      client.setQueryData(options.queryKey, (present) => present && foreseen(given, present));
    },
    onSuccess: (reading) => {
      client.setQueryData(options.queryKey, reading);
      void client.invalidateQueries({
        queryKey: revisionKey(params),
        predicate: (query) => query.queryKey.at(-1) !== 'reading',
      });
      void client.invalidateQueries({ queryKey: ['home'] });
    },
    onError: () => client.invalidateQueries({ queryKey: options.queryKey }),
  });
}
