import { getReturnWorkbook } from '#shared/contracts/returns';
import { loadReturn } from '../../commands/returns/load-return';
import { previewInput } from '../../commands/returns/preview-input';
import { storedFile } from '../../db/queries/returns';
import { renderFindingsWorkbook } from '../../documents/findings-workbook';
import { spreadsheetMediaType } from '../../documents/media-types';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const getReturnWorkbookRoute = route(getReturnWorkbook, async ({ deps, actor, params }) => {
  const found = await loadReturn(deps, actor, params);
  const { kept } = found;
  if (kept?.state === 'sent') {
    const file = kept.workbookFileId === null ? null : await storedFile(deps.db, actor, kept.workbookFileId);
    if (file === null) throw new Problem('not-found');
    return { bytes: file.bytes, mediaType: file.mediaType, fileName: file.fileName };
  }
  const bytes = await renderFindingsWorkbook(previewInput(deps, found));
  return { bytes, mediaType: spreadsheetMediaType, fileName: 'findings preview.xlsx' };
});
