import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { writeNote } from '#shared/contracts/notes';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export type NoteInput = z.input<NonNullable<typeof writeNote.body>>;

export function useWriteNote(params: RevisionParams) {
  const client = useQueryClient();
  const act = useActKey();
  return useMutation({
    mutationFn: (body: NoteInput) => call(writeNote, { params, body, idempotencyKey: act.keyFor(body) }),
    onSuccess: () => {
      act.done();
      return client.invalidateQueries({ queryKey: revisionKey(params) });
    },
  });
}
