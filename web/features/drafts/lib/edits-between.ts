import { type DraftDocument, partHash, partsOf } from '#rules/authoring/document-parts';
import type { Edit } from './working-copy';

/** What turns one document into another, part by part, so that a whole text changes no more than it says. */
export function editsBetween(before: DraftDocument, after: DraftDocument): Edit[] {
  const old = partsOf(before);
  const now = partsOf(after);
  const gone = [...old.keys()].filter((part) => !now.has(part) && !part.startsWith('order/'));
  const changed = [...now].filter(([part, value]) => partHash(old.get(part)) !== partHash(value));
  const isOrder = ([part]: [string, unknown]) => part.startsWith('order/');
  return [
    ...gone.map((part) => ({ part, after: null })),
    ...changed.filter((each) => !isOrder(each)).map(([part, value]) => ({ part, after: value })),
    // An order names what is there only once everything is.
    ...changed.filter(isOrder).map(([part, value]) => ({ part, after: value })),
  ];
}
