import '../../../lib/zod-without-eval';
import type { DraftDocument } from '#rules/authoring/document-parts';
import type { Layer, RuleSet } from '#rules/rule-sets/schema';
import { checkDraft, remarksOn } from './checked-draft';

export interface RemarksAsked {
  number: number;
  document: DraftDocument;
  base: RuleSet | Layer | null;
}

/** Judges every case of a draft off the page: it takes longer than a keystroke. */
self.addEventListener('message', ({ data }: MessageEvent<RemarksAsked>) => {
  const remarks = remarksOn(checkDraft(data.document, data.base));
  self.postMessage({ number: data.number, remarks });
});
