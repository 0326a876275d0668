import { useQueryClient } from '@tanstack/react-query';
import { type Note, writeNote } from '#shared/contracts/notes';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

/** A contractor's reply to a returned note. */
export function useWriteReply(params: RevisionParams) {
  const client = useQueryClient();
  const act = useActKey();
  return async (note: Pick<Note, 'id' | 'finding'>, text: string) => {
    const body = { finding: note.finding, kind: 'reply' as const, text, answers: note.id };
    await call(writeNote, { params, body, idempotencyKey: act.keyFor(body) });
    act.done();
    await client.invalidateQueries({ queryKey: revisionKey(params) });
  };
}
