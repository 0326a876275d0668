import { canonicalText } from '#rules/engine/canonical-text';
import type { CellGrid } from '#rules/reading/cell-grid';
import type { Correction } from '#rules/reading/correction';
import { closestLayout } from '#rules/reading/fingerprint';
import { learnMapping } from '#rules/reading/learn-mapping';
import { type Mapping, mappingFormat, mappingSchema } from '#rules/reading/mapping';
import { mappingSentence } from '#rules/reading/mapping-sentence';
import { mergeMapping } from '#rules/reading/merge-mapping';
import type { ReadingResult } from '#rules/reading/reading-result';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import { limits } from '#shared/limits';
import type { Database } from '../../db/client';
import { findMappingVersion, lastLearnedFrom, layoutsInUse, lockMapping } from '../../db/queries/mappings';
import type { Deps } from '../../deps';
import { wordsFor } from '../../presenters/words-for';
import { addMapping, addMappingVersion } from '../mappings/add-mapping-version';
import type { DraftChange } from './change-draft';
import type { LearnedMapping } from './read-grid';

interface Lesson extends DraftChange {
  grid: CellGrid;
  edition: ResolvedEdition;
  corrections: readonly Correction[];
  read: ReadingResult;
  /** What the workbook was read with. */
  base: LearnedMapping | null;
  isTemplate: boolean;
  requestId: string;
}

/** Makes what was said of a draft's workbook a further version of its laboratory's mapping. */
export async function learnFromDraft(
  tx: Database,
  deps: Deps,
  { actor, row, grid, edition, corrections, read, base, isTemplate, requestId }: Lesson,
): Promise<{ learned: string[]; notLearned: string[] }> {
  if (isTemplate) {
    const notLearned =
      corrections.length > 0 ? ['The layout of the template is fixed, so this holds here only.'] : [];
    return { learned: [], notLearned };
  }
  const lesson = learnMapping({ grid, edition, corrections, read, base: base?.document ?? null });
  const words = wordsFor(edition);
  const told = {
    learned: lesson.rules.map((rule) => mappingSentence(rule, words)),
    notLearned: lesson.notLearned,
  };
  const organisationId = row.revision.contractorId;
  const before = await lastLearnedFrom(tx, organisationId, row.revision.id);
  const target = await targetOf(tx, { row, base, before, fingerprint: lesson.fingerprint });
  if (target === null && lesson.rules.length === 0) return told;
  const newest =
    target && (await findMappingVersion(tx, organisationId, { mappingId: target.id, number: target.number }));
  const rules = mergeMapping({
    newest: newest?.version.document.rules ?? [],
    base: base?.document.rules ?? [],
    before: before !== null && before.mapping.id === target?.id ? before.version.learned : [],
    now: lesson.rules,
    dropped: lesson.dropped,
  });
  if (newest && canonicalText(rules) === canonicalText(newest.version.document.rules)) return told;
  const document: Mapping = mappingSchema.parse({
    format: mappingFormat,
    laboratory: row.laboratory.name,
    fingerprint: lesson.fingerprint,
    version: (target?.number ?? 0) + 1,
    rest: 'headings',
    rules,
  });
  const version = {
    document,
    origin: `Learned from ${row.workbook.fileName}`.slice(0, 300),
    revisionId: row.revision.id,
    learned: lesson.rules.map(({ id }) => id),
  };
  const by = { actor, requestId, organisationId };
  if (target !== null) await addMappingVersion(tx, deps, { ...by, mapping: target, version });
  else {
    const { laboratoryId } = row.revision;
    await addMapping(tx, deps, { ...by, laboratoryId, name: nameOf(row.workbook.fileName), version });
  }
  return told;
}

interface Target {
  row: DraftChange['row'];
  base: LearnedMapping | null;
  before: Awaited<ReturnType<typeof lastLearnedFrom>>;
  fingerprint: string;
}

/** The mapping that this workbook taught before, else that it was read with, else one of the same layout. */
async function targetOf(tx: Database, { row, base, before, fingerprint }: Target) {
  const { contractorId, laboratoryId } = row.revision;
  const known = await layoutsInUse(tx, contractorId, laboratoryId);
  const mine = (id: string | undefined) => known.find((each) => each.id === id);
  const found = mine(before?.mapping.id) ?? mine(base?.id) ?? closestLayout(fingerprint, known);
  return found ? lockMapping(tx, contractorId, found.id) : null;
}

/** "BW-125-S4 r1.xlsx" → "Layout of BW-125-S4 r1" */
function nameOf(fileName: string): string {
  return `Layout of ${fileName.replace(/\.[^.]+$/, '')}`.slice(0, limits.nameCharacters);
}
