import { getFindingsWorkbook } from '#shared/contracts/checks';
import { renderFindingsWorkbook } from '../../documents/findings-workbook';
import { findingsFileName, loadFindingsInput } from '../../documents/load-findings-input';
import { spreadsheetMediaType } from '../../documents/media-types';
import { route } from '../define-route';

export const getFindingsWorkbookRoute = route(getFindingsWorkbook, async ({ deps, actor, params }) => {
  const input = await loadFindingsInput(deps, actor, params);
  const bytes = await renderFindingsWorkbook(input);
  return { bytes, mediaType: spreadsheetMediaType, fileName: findingsFileName(input, 'xlsx') };
});
