import { getWorkbook } from '#shared/contracts/submittals';
import { loadFile } from '../../db/queries/records';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { expectRevision } from './load-revision';

export const getWorkbookRoute = route(getWorkbook, async ({ deps, params, actor }) => {
  const row = await expectRevision(deps, actor, params);
  const file = await loadFile(deps.db, actor, row.workbook.id);
  if (file === null) throw new Problem('not-found');
  return file;
});
