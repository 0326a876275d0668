import { getLetter } from '#shared/contracts/returns';
import { loadReturn } from '../../commands/returns/load-return';
import { previewInput } from '../../commands/returns/preview-input';
import { storedFile } from '../../db/queries/returns';
import { letterDefinition } from '../../documents/letter-definition';
import { renderPdf } from '../../documents/render-pdf';
import { Problem } from '../../problem';
import { route } from '../define-route';

/** Once sent, the stored bytes; before, a preview of the draft. */
export const getLetterRoute = route(getLetter, async ({ deps, actor, params }) => {
  const found = await loadReturn(deps, actor, params);
  const { kept } = found;
  if (kept?.state === 'sent') {
    const file = kept.letterFileId === null ? null : await storedFile(deps.db, actor, kept.letterFileId);
    if (file === null) throw new Problem('not-found');
    return { bytes: file.bytes, mediaType: file.mediaType, fileName: file.fileName, inline: true };
  }
  const bytes = await renderPdf(letterDefinition(previewInput(deps, found)));
  return { bytes, mediaType: 'application/pdf', fileName: 'letter preview.pdf', inline: true };
});
