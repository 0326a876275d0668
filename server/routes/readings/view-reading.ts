import { withStandardDocuments } from '#rules/rule-sets/document-types';
import type { ReadingView } from '#shared/contracts/readings';
import { correctionsInForce, typedInForce } from '../../commands/readings/acts-in-force';
import { learnedOf } from '../../commands/readings/change-draft';
import { learnedMapping } from '../../commands/readings/recognise-layout';
import { gridOf } from '../../db/queries/cell-grids';
import { lastLearnedFrom } from '../../db/queries/mappings';
import { listReadingActs } from '../../db/queries/reading-acts';
import { findMixRecord, listAnswers, listDocuments, listTypedAttributes } from '../../db/queries/records';
import type { RevisionRow } from '../../db/queries/revisions';
import { loadResolvedEdition } from '../../db/resolved-edition';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { presentReading } from '../../presenters/present-reading';
import { wordsFor } from '../../presenters/words-for';
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
  const [grid, answers, typed, documents, edition, acts, mapping, learned] = await Promise.all([
    gridOf(deps.db, actor, row.workbook.id),
    listAnswers(deps.db, actor, revision.id),
    listTypedAttributes(deps.db, actor, revision.id),
    listDocuments(deps.db, actor, revision.id),
    loadResolvedEdition(deps.db, revision.section.resolvedHash),
    listReadingActs(deps.db, actor, revision.id),
    learnedMapping(deps.db, actor.organisationId, learnedOf(revision)),
    lastLearnedFrom(deps.db, actor.organisationId, revision.id),
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
    mapping: mapping && { id: mapping.id, name: mapping.name, number: mapping.number },
    learned: learned && {
      id: learned.mapping.id,
      name: learned.mapping.name,
      number: learned.version.number,
      rules: learned.version.learned.length,
    },
    corrections: correctionsInForce(acts, row.workbook.id),
    typedReadings: typedInForce(acts),
    words: wordsFor(edition),
    mayAnswer: abilities.answer,
  });
}
