import { type DraftDocument, headFields } from '#rules/authoring/document-parts';
import { Problem } from '../../problem';

/** What a draft is found by must be there at every moment, and which rule set it belongs to does not change. */
export function draftHead(document: DraftDocument, before: DraftDocument) {
  const head = headFields.safeParse(document);
  if (!head.success) {
    const errors = head.error.issues.map(({ path, message }) => ({
      pointer: `/${path.map(String).join('/')}`,
      detail: message,
    }));
    throw new Problem('invalid-input', {
      detail: 'A draft keeps its id, title, edition and effective dates.',
      errors,
    });
  }
  const kept = headFields.parse(before);
  const sameBase = JSON.stringify(head.data.layerOf) === JSON.stringify(kept.layerOf);
  if (head.data.id !== kept.id || !sameBase || document.agency !== before.agency) {
    throw new Problem('invalid-input', {
      detail: 'A draft stays in its rule set, under its agency and over its base edition.',
      fix: 'Begin another draft for another rule set.',
    });
  }
  return head.data;
}
