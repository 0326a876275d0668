import { sectionWords } from '#shared/format/section-words';
import type { Database } from '../db/client';
import { newestCheckOf } from '../db/queries/checks';
import { listNotes, listWaivers } from '../db/queries/notes';
import type { Reader } from '../db/queries/reader';
import { findMixRecord } from '../db/queries/records';
import { isStartingPoint, letterheadOf, revisionBefore } from '../db/queries/returns';
import type { RevisionRow } from '../db/queries/revisions';
import { loadResolvedEdition } from '../db/resolved-edition';
import { explainCheck } from '../presenters/explain-check';
import { movedFindings } from '../presenters/moved-findings';
import type { ReturnSources } from '../presenters/return-items';
import { Problem } from '../problem';
import type { RevisionFacts } from './return-input';

export interface LoadedRevision {
  facts: RevisionFacts;
  sources: Omit<ReturnSources, 'included'>;
  /** Notes to be returned on the whole submittal. */
  generalNotes: string[];
  internalNotes: number;
  checkId: string;
  /** Keys of findings that are waived, whether the contractor hears of it or not. */
  waived: Set<string>;
}

/** Everything that a letter, a findings workbook or a mail of a revision is made from. */
export async function loadRevisionDocuments(
  db: Database,
  reader: Reader,
  row: RevisionRow,
): Promise<LoadedRevision> {
  const check = await newestCheckOf(db, reader, row.revision.id);
  if (check === null) throw new Problem('wrong-state', { detail: 'The workbook has not been checked yet.' });
  const [letterhead, startingPoint, notes, waivers, before, kept, edition] = await Promise.all([
    letterheadOf(db, row.agency.id),
    isStartingPoint(db, row.agency.id, row.revision.section.base),
    listNotes(db, reader, row.submittal.id),
    listWaivers(db, reader, row.revision.id),
    revisionBefore(db, reader, row.revision),
    findMixRecord(db, reader, row.revision.id),
    loadResolvedEdition(db, check.resolvedHash),
  ]);
  if (letterhead === null) throw new Problem('not-found');
  const previous = before === null ? null : await newestCheckOf(db, reader, before.id);
  const own = notes.filter(({ note }) => note.revisionId === row.revision.id && note.side === 'agency');
  const returned = own.filter(({ note }) => note.kind === 'to be returned').map(({ note }) => note);
  return {
    facts: {
      agency: { name: row.agency.name, letterhead, timeZone: row.agency.timeZone },
      contractor: row.contractor.name,
      project: { number: row.project.number, title: row.project.title },
      mixDesignation: row.submittal.mixDesignation,
      mixDescription: row.revision.description,
      revision: row.revision.number,
      receivedOn: row.revision.receivedOn,
      section: sectionWords(row.revision.section),
      startingPoint,
      check: { kind: check.kind, madeAt: check.madeAt, result: check.result },
      explanations: kept === null ? {} : explainCheck(check, kept.record, edition),
    },
    sources: {
      findings: check.result.findings,
      waivers: waivers.map(({ waiver }) => waiver),
      notes: returned.filter(({ finding }) => finding !== null),
      moved: previous === null ? [] : movedFindings(previous.result.findings, check.result.findings),
    },
    generalNotes: returned.filter(({ finding }) => finding === null).map(({ text }) => text),
    internalNotes: own.filter(({ note }) => note.kind === 'internal').length,
    checkId: check.id,
    waived: new Set(waivers.map(({ waiver }) => waiver.finding)),
  };
}
