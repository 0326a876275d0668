import { getFindingsPdf } from '#shared/contracts/checks';
import { findingsDefinition } from '../../documents/findings-definition';
import { findingsFileName, loadFindingsInput } from '../../documents/load-findings-input';
import { pdfMediaType } from '../../documents/media-types';
import { renderPdf } from '../../documents/render-pdf';
import { route } from '../define-route';

export const getFindingsPdfRoute = route(getFindingsPdf, async ({ deps, actor, params }) => {
  const input = await loadFindingsInput(deps, actor, params);
  const bytes = await renderPdf(findingsDefinition(input));
  return { bytes, mediaType: pdfMediaType, fileName: findingsFileName(input, 'pdf') };
});
