import { type QueryClient, useMutation, useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import type { CheckView } from '#shared/contracts/checks';
import type { ReadingView } from '#shared/contracts/readings';
import { announce } from '../../../lib/announce';
import { changedOutcomes } from '../../../lib/changed-outcomes';
import { checkQuery } from '../../../lib/queries/check-query';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';
import { readingQuery } from './get-reading';

/**
 * A change of how the workbook was read. The answer is the whole reading, so it is put in place at once; findings,
 * cell tints and the home page follow, and which outcomes are no longer what they were is said. After a refusal the
 * present state is fetched, so that the page shows no wish.
 */
export function useReadingChange<Change>(
  params: RevisionParams,
  change: (given: Change, present: ReadingView) => Promise<ReadingView>,
  /** How the page shows the change at once, while the server reads and checks again. */
  foreseen: (given: Change, present: ReadingView) => ReadingView = (_, present) => present,
) {
  const client = useQueryClient();
  const options = readingQuery(params);
  const waiting = useRef<Change[]>([]);
  const [refusal, setRefusal] = useState<unknown>(null);
  const settle = (given: Change) => {
    waiting.current = waiting.current.filter((each) => each !== given);
  };
  const mutation = useMutation({
    mutationFn: async (given: Change) => change(given, await client.ensureQueryData(options)),
    // One after the other: each change sends the version that the one before it brought.
    scope: { id: JSON.stringify(options.queryKey) },
    onMutate: async (given: Change) => {
      waiting.current.push(given);
      setRefusal(null);
      // A reading that was asked for before this change would put the old version back.
      await client.cancelQueries({ queryKey: options.queryKey });
      client.setQueryData(options.queryKey, (present) => present && foreseen(given, present));
    },
    onSuccess: (reading, given) => {
      const before = client.getQueryData(checkQuery(params).queryKey);
      settle(given);
      const shown = waiting.current.reduce((present, each) => foreseen(each, present), reading);
      client.setQueryData(options.queryKey, shown);
      void client.invalidateQueries({
        queryKey: revisionKey(params),
        predicate: (query) => query.queryKey.at(-1) !== 'reading',
      });
      void client.invalidateQueries({ queryKey: ['home'] });
      void sayChanges(client, params, before);
    },
    onError: (error, given) => {
      settle(given);
      setRefusal(error);
      return client.invalidateQueries({ queryKey: options.queryKey });
    },
  });
  // Of several changes in a row the mutation remembers the last alone; a refusal of an earlier one must not go unseen.
  return { ...mutation, error: refusal };
}

/** Only against a check that was known before: a draft that could not be checked yet has none. */
async function sayChanges(
  client: QueryClient,
  params: RevisionParams,
  before: CheckView | undefined,
): Promise<void> {
  if (!before) return;
  const after = await client.fetchQuery({ ...checkQuery(params), staleTime: 0 }).catch(() => null);
  if (after) announce(changedOutcomes(before.findings, after.findings));
}
