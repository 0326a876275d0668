import type { Deps } from '../../deps';
import type { DocumentInput } from '../../documents/document-input';
import { returnInput } from '../../documents/return-input';
import { returnItems } from '../../presenters/return-items';
import type { LoadedReturn } from './load-return';

/** What letter, workbook and mail of a draft are made from; the signature is set when it is signed. */
export function previewInput(
  deps: Pick<Deps, 'now'>,
  { loaded, fields }: Pick<LoadedReturn, 'loaded' | 'fields'>,
  signedBy: DocumentInput['signedBy'] = null,
): DocumentInput {
  return returnInput(
    loaded.facts,
    {
      disposition: fields.disposition,
      reason: fields.reason,
      textAbove: fields.textAbove,
      textBelow: fields.textBelow,
      to: fields.to,
      copies: fields.copies,
      enclosesWorkbook: fields.findingsWorkbook,
      items: returnItems({ ...loaded.sources, included: new Set(fields.included) }),
      generalNotes: loaded.generalNotes,
      signedBy,
    },
    deps.now(),
  );
}
