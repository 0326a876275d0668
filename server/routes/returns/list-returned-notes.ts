import { listReturnedNotes } from '#shared/contracts/returns';
import { dateOfInstant } from '#shared/format/dates';
import { loadReturn } from '../../commands/returns/load-return';
import { listNotes } from '../../db/queries/notes';
import { visibleNotes } from '../../presenters/visible-notes';
import { route } from '../define-route';

/** The agency's notes that came with the return, each with the replies that the reader may see. */
export const listReturnedNotesRoute = route(listReturnedNotes, async ({ deps, actor, params }) => {
  const { row, loaded, abilities, kept } = await loadReturn(deps, actor, params);
  const all = await listNotes(deps.db, actor, row.submittal.id);
  const notes = visibleNotes(all, actor, abilities);
  const titles = new Map(
    loaded.sources.findings.map((finding) => [`${finding.rule}~${finding.subject}`, finding]),
  );
  const returned = notes.filter(
    ({ side, kind, revision }) =>
      side === 'agency' && kind === 'to be returned' && revision === params.number,
  );
  return {
    notes: returned.map((note) => {
      const finding = note.finding === null ? undefined : titles.get(note.finding);
      return {
        note,
        findingTitle: finding?.title ?? null,
        clause: finding?.clause ?? null,
        replies: notes.filter(({ answers }) => answers === note.id),
      };
    }),
    sentOn: kept?.sentAt ? dateOfInstant(kept.sentAt.toISOString(), row.agency.timeZone) : null,
  };
});
