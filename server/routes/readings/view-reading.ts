import { withStandardDocuments } from '#rules/rule-sets/document-types';
import type { ReadingView } from '#shared/contracts/readings';
import { gridOf } from '../../db/queries/cell-grids';
import { findMixRecord, listAnswers, listDocuments, listTypedAttributes } from '../../db/queries/records';
import type { RevisionRow } from '../../db/queries/revisions';
import { loadResolvedEdition } from '../../db/resolved-edition';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { presentReading } from '../../presenters/present-reading';
import { Problem } from '../../problem';
import { viewRevision } from '../submittals/load-revision';

/** How the workbook of a revision was read, with what the reader may answer. */
export async function viewReading(deps: Deps, actor: RequestActor, row: RevisionRow): Promise<ReadingView> {
  const { revision } = row;
  const kept = await findMixRecord(deps.db, actor, revision.id);
  if (kept === null) {
    throw new Problem('wrong-state', {
      detail: `The workbook of revision ${revision.number} has not been read.`,
      fix: 'Wait until it is read, or upload one that can be read.',
    });
  }
  const { abilities } = await viewRevision(deps, actor, row);
  const [grid, answers, typed, documents, edition] = await Promise.all([
    gridOf(deps.db, actor, row.workbook.id),
    listAnswers(deps.db, actor, revision.id),
    listTypedAttributes(deps.db, actor, revision.id),
    listDocuments(deps.db, actor, revision.id),
    loadResolvedEdition(deps.db, revision.section.resolvedHash),
  ]);
  return presentReading({
    version: revision.version,
    workbook: row.workbook,
    mappingName: kept.mappingName,
    sheets: grid?.sheets ?? [],
    reading: kept.reading,
    record: kept.record,
    answers,
    typed: Object.fromEntries(typed.map(({ name, value }) => [name, value])),
    facts: row.project.facts,
    edition,
    documents,
    documentTypes: withStandardDocuments(edition.documents),
    mayAnswer: abilities.answer,
  });
}
