import { useDeferredValue, useMemo } from 'react';
import { Outlet, useOutletContext, useParams } from 'react-router-dom';
import { headFields } from '#rules/authoring/document-parts';
import type { LintRemark } from '#rules/authoring/lint/remark';
import { useEditionDocument } from '../../../lib/queries/edition-document-query';
import { useRemarks } from '../hooks/use-remarks';
import { type DraftEditing, useWorkingCopy } from '../hooks/use-working-copy';
import { type CheckedDraft, checkDraft } from '../lib/checked-draft';
import { type DraftRule, draftRules } from '../lib/draft-rules';

/** What every page of a draft works on: one copy, so that undo reaches over all of them. */
export interface DraftInHand {
  editing: DraftEditing;
  /** In clause order, with what went. */
  rules: DraftRule[];
  /** The edition that the draft started from, where it can be read. */
  basedOn: Record<string, unknown> | null;
  checked: CheckedDraft;
  /** Null while they are looked for. */
  remarks: LintRemark[] | null;
}

export function DraftLayout() {
  const { draftId = '' } = useParams();
  return <DraftOf key={draftId} draftId={draftId} />;
}

function DraftOf({ draftId }: { draftId: string }) {
  const editing = useWorkingCopy(draftId);
  const { draft, document } = editing;
  const { layerOf } = headFields.parse(draft.document);
  const basedOn = useEditionDocument(draft.basedOn)?.written ?? null;
  const base =
    useEditionDocument(layerOf && { ruleSet: layerOf.id, edition: layerOf.edition })?.parsed ?? null;
  const settled = useDeferredValue(document);
  const checked = useMemo(() => checkDraft(settled, base), [settled, base]);
  const remarks = useRemarks(settled, base);
  const rules = useMemo(() => draftRules(document, basedOn), [document, basedOn]);
  return <Outlet context={{ editing, rules, basedOn, checked, remarks } satisfies DraftInHand} />;
}

export function useDraftInHand(): DraftInHand {
  return useOutletContext<DraftInHand>();
}
