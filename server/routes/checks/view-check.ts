import { summarise } from '#rules/engine/disposition';
import type { CheckView } from '#shared/contracts/checks';
import { dateOfInstant } from '#shared/format/dates';
import { type CheckRow, newestCheckOf } from '../../db/queries/checks';
import { listNotes, listWaivers } from '../../db/queries/notes';
import { findMixRecord } from '../../db/queries/records';
import { isStartingPoint, revisionBefore } from '../../db/queries/returns';
import type { RevisionRow } from '../../db/queries/revisions';
import { loadResolvedEdition } from '../../db/resolved-edition';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { checkStale } from '../../presenters/check-stale';
import { clauseTitles } from '../../presenters/clause-titles';
import { declarationOf } from '../../presenters/declaration-of';
import { explainCheck } from '../../presenters/explain-check';
import { gradationView } from '../../presenters/gradation-view';
import { movedFindings } from '../../presenters/moved-findings';
import { recommendationText } from '../../presenters/recommendation-text';
import { visibleNotes, visibleWaivers } from '../../presenters/visible-notes';
import { Problem } from '../../problem';
import { viewRevision } from '../submittals/load-revision';

/** The newest check of a revision with what the reader may see beside it. */
export async function viewCheck(deps: Deps, actor: RequestActor, row: RevisionRow): Promise<CheckView> {
  const check = await newestCheckOf(deps.db, actor, row.revision.id);
  const kept = await findMixRecord(deps.db, actor, row.revision.id);
  if (check === null || kept === null) throw unchecked(row);
  const { abilities } = await viewRevision(deps, actor, row);
  const [edition, allNotes, allWaivers, before, startingPoint] = await Promise.all([
    loadResolvedEdition(deps.db, check.resolvedHash),
    listNotes(deps.db, actor, row.submittal.id),
    listWaivers(deps.db, actor, row.revision.id),
    previousCheck(deps, actor, row),
    isStartingPoint(deps.db, row.agency.id, row.revision.section.base),
  ]);
  const notes = visibleNotes(allNotes, actor, abilities);
  const waivers = visibleWaivers(allWaivers, actor, abilities);
  const { findings, seal } = check.result;
  const waived = new Set(waivers.map(({ finding }) => finding));
  const { base, layers } = row.revision.section;
  return {
    kind: check.kind,
    madeAt: check.madeAt.toISOString(),
    submittedOn: check.submittedOn,
    seal,
    section: {
      base,
      layers,
      state: check.kind === 'pre-check' ? 'checked before submitting' : 'check of record',
    },
    summary: summarise(findings, waived),
    findings,
    explanations: explainCheck(check, kept.record, edition),
    hasRoom: check.result.analysis.roomToMove !== null,
    notes: notes.filter((note) => concerns(note, row.revision.number)),
    waivers,
    moved: before === null ? [] : movedFindings(before.result.findings, findings),
    stale: staleness(deps, row, check),
    recommendation: recommendationText(findings, waived),
    startingPoint,
    clauseTitles: clauseTitles(edition.rules),
    gradation: gradationView(kept.record, findings),
    hasCreep: check.result.analysis.creep.length > 0,
    declaration:
      row.revision.state === 'draft'
        ? declarationOf({ row, section: row.revision.section, findings, doubts: kept.record.doubts })
        : null,
  };
}

/** This revision's notes, and what passed between both sides about the one before. */
function concerns(note: { revision: number; kind: string }, number: number): boolean {
  return note.revision === number || (note.revision === number - 1 && note.kind !== 'internal');
}

async function previousCheck(
  deps: Deps,
  actor: RequestActor,
  { revision }: RevisionRow,
): Promise<CheckRow | null> {
  const before = await revisionBefore(deps.db, actor, revision);
  return before === null ? null : newestCheckOf(deps.db, actor, before.id);
}

function staleness(
  deps: Deps,
  { revision, section, agency, project }: RevisionRow,
  check: CheckRow,
): string | null {
  return checkStale({
    kind: check.kind,
    state: revision.state,
    submittedOn: check.submittedOn,
    today: dateOfInstant(deps.now().toISOString(), agency.timeZone),
    resolvedHash: check.resolvedHash,
    sectionHash: section.resolvedHash,
    judgedWith: check.context,
    project,
    stored: check.stale,
  });
}

export function unchecked({ revision }: RevisionRow): Problem {
  return new Problem('wrong-state', {
    detail: `Revision ${revision.number} has no check yet: its workbook has not been read.`,
    fix: 'Look at the reading; it says how far it is, or what is wrong with the workbook.',
  });
}
