import { useMutation, useQueryClient } from '@tanstack/react-query';
import { changeNote, type Note, type NoteKind, removeNote } from '#shared/contracts/notes';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function useChangeNote(params: RevisionParams) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ note, kind, text }: { note: Note; kind: NoteKind; text: string }) =>
      call(changeNote, { params: { noteId: note.id }, body: { kind, text }, version: note.version }),
    onSettled: () => client.invalidateQueries({ queryKey: revisionKey(params) }),
  });
}

export function useRemoveNote(params: RevisionParams) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (note: Note) => call(removeNote, { params: { noteId: note.id }, version: note.version }),
    onSettled: () => client.invalidateQueries({ queryKey: revisionKey(params) }),
  });
}
