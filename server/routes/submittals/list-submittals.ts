import { listSubmittals } from '#shared/contracts/submittals';
import { limits } from '#shared/limits';
import { readCursor, writeCursor } from '../../db/queries/cursor';
import { newestJobsOf } from '../../db/queries/jobs';
import { listSubmittals as querySubmittals } from '../../db/queries/list-submittals';
import { presentSubmittalItem } from '../../presenters/present-submittal-item';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const listSubmittalsRoute = route(listSubmittals, async ({ deps, query, actor }) => {
  const { cursor, q, ...filter } = query;
  const after = cursor === undefined ? undefined : (readCursor(cursor) ?? undefined);
  if (cursor !== undefined && after === undefined) {
    const detail = 'This is not a cursor of this list.';
    throw new Problem('invalid-input', { detail, errors: [{ pointer: '/query/cursor', detail }] });
  }
  const wanted = q?.trim() === '' ? undefined : q?.trim();
  const rows = await querySubmittals(deps.db, actor, {
    ...filter,
    q: wanted,
    after,
    rows: limits.pageRows + 1,
  });
  const page = rows.slice(0, limits.pageRows);
  const drafts = page.filter(({ revision }) => revision.state === 'draft').map(({ revision }) => revision.id);
  const jobs = await newestJobsOf(deps.db, actor.organisationId, 'revision', drafts);
  const last = page.at(-1);
  const more = rows.length > page.length && last !== undefined;
  return {
    items: page.map((row) =>
      presentSubmittalItem(row, { kind: actor.kind, job: jobs.get(row.revision.id) ?? null }),
    ),
    nextCursor: more ? writeCursor({ at: last.changedAt ?? last.revision.updatedAt, id: last.id }) : null,
  };
});
