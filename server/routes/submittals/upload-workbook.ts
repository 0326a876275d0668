import { replaceWorkbook, startRevision, uploadSubmittal } from '#shared/contracts/submittals';
import { replaceWorkbook as replace } from '../../commands/submittals/replace-workbook';
import { startRevision as start } from '../../commands/submittals/start-revision';
import { expectWorkbook } from '../../commands/submittals/store-workbook';
import { uploadSubmittal as upload } from '../../commands/submittals/upload-submittal';
import { latestVisibleNumber } from '../../db/queries/revisions';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { expectAbility } from './expect-ability';
import { expectRevision, expectSeen, viewRevision, viewRevisionAt } from './load-revision';

export const uploadSubmittalRoute = route(
  uploadSubmittal,
  async ({ deps, body, files, actor, requestId }) => {
    const workbook = expectWorkbook(files);
    const place = await upload(deps, { actor, requestId, ...body, workbook });
    return viewRevisionAt(deps, actor, place);
  },
);

export const startRevisionRoute = route(
  startRevision,
  async ({ deps, params: { submittalId }, body, files, actor, requestId }) => {
    if ((await latestVisibleNumber(deps.db, actor, submittalId)) === null) throw new Problem('not-found');
    if (actor.kind === 'agency') throw new Problem('not-allowed');
    const number = await start(deps, {
      actor,
      requestId,
      submittalId,
      laboratoryId: body.laboratoryId,
      reason: body.reason ?? '',
      workbook: expectWorkbook(files),
    });
    return viewRevisionAt(deps, actor, { submittalId, number });
  },
);

export const replaceWorkbookRoute = route(
  replaceWorkbook,
  async ({ deps, params, files, version, actor, requestId }) => {
    const row = await expectRevision(deps, actor, params);
    expectAbility(await viewRevision(deps, actor, row), {
      ability: 'replaceWorkbook',
      states: ['draft'],
      done: 'given another workbook',
    });
    await expectSeen(deps, actor, row, version);
    await replace(deps, { actor, requestId, row, version, workbook: expectWorkbook(files) });
    return viewRevisionAt(deps, actor, params);
  },
);
