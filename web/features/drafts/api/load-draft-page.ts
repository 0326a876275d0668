import { headFields } from '#rules/authoring/document-parts';
import { queryClient } from '../../../lib/client';
import { editionDocumentQuery } from '../../../lib/queries/edition-document-query';
import { draftCommentsQuery, draftQuery } from './get-draft';

/** A draft, its comments, the edition that it started from and, for a layer, the one that it sits over. */
export async function loadDraftPage(draftId: string): Promise<void> {
  const [draft] = await Promise.all([
    queryClient.ensureQueryData(draftQuery(draftId)),
    queryClient.ensureQueryData(draftCommentsQuery(draftId)),
  ]);
  const { layerOf } = headFields.parse(draft.document);
  const others = [
    ...(draft.basedOn === null ? [] : [draft.basedOn]),
    ...(layerOf === null ? [] : [{ ruleSet: layerOf.id, edition: layerOf.edition }]),
  ];
  await Promise.all(others.map((each) => queryClient.ensureQueryData(editionDocumentQuery(each))));
}
