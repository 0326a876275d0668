import { getReplacedWorkbook } from '#shared/contracts/submittals';
import { listReplacedWorkbooks, loadFile } from '../../db/queries/records';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { expectRevision } from './load-revision';

/** The agency, which may see the revision, is answered as if there were none. */
export const getReplacedWorkbookRoute = route(getReplacedWorkbook, async ({ deps, params, actor }) => {
  const { revision } = await expectRevision(deps, actor, params);
  const replaced = await listReplacedWorkbooks(deps.db, actor.organisationId, revision.id);
  const found = replaced.find(({ id }) => id === params.replacedId);
  const file = found === undefined ? null : await loadFile(deps.db, actor, found.fileId);
  if (file === null) throw new Problem('not-found');
  return file;
});
