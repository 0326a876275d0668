import type { CellGrid } from '#rules/reading/cell-grid';
import { recogniseTemplate } from '#rules/reading/template-stamp';
import type { ReadingProposal } from '#shared/contracts/corrections';
import { dateOfInstant } from '#shared/format/dates';
import type { Database } from '../../db/client';
import { loadGrid } from '../../db/queries/cell-grids';
import { listReadingActs, type ReadingAct } from '../../db/queries/reading-acts';
import { listAnswers } from '../../db/queries/records';
import { readingActs } from '../../db/schema/learning';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { Problem } from '../../problem';
import { correctionsInForce, typedInForce } from './acts-in-force';
import { changeDraft, type DraftChange, type KeptDraft } from './change-draft';
import { checkCorrections } from './check-corrections';
import { checkTyped } from './check-typed';
import { keepAnswers } from './keep-answers';
import { learnFromDraft } from './learn-from-draft';
import { readGrid } from './read-grid';
import { learnedMapping } from './recognise-layout';

export interface ReadingChange extends DraftChange {
  actor: RequestActor;
  proposal: ReadingProposal;
  requestId: string;
}

/**
 * What people say of how a workbook was read: acts taken back, answers, corrections and typed readings, in that order.
 * They are kept, the stored cells are read anew with all of them, and the laboratory's mapping learns what it can.
 */
export async function changeReading(deps: Deps, change: ReadingChange) {
  const { actor, row, proposal, requestId } = change;
  let learning: { learned: string[]; notLearned: string[] } = { learned: [], notLearned: [] };
  const changed = await changeDraft(deps, change, async (tx, kept) => {
    const grid = await loadGrid(tx, actor, kept.fileId);
    if (grid === null) throw new Error(`The cells of ${kept.fileId} are not stored.`);
    await keepActs(tx, deps, { ...change, kept, grid });
    const acts = await listReadingActs(tx, actor, row.revision.id);
    const corrections = correctionsInForce(acts, kept.fileId).map(({ correction }) => correction);
    const learned = await learnedMapping(tx, actor.organisationId, kept.mapping.learned);
    const reread = await readGrid(tx, {
      grid,
      edition: kept.edition,
      resolvedHash: kept.section.resolvedHash,
      agencyId: row.agency.id,
      answers: await listAnswers(tx, actor, row.revision.id),
      corrections,
      learned,
    });
    const isTemplate = recogniseTemplate(grid) !== null;
    const lesson = { grid, edition: kept.edition, corrections, read: reread.read, base: learned, isTemplate };
    learning = await learnFromDraft(tx, deps, { ...change, ...lesson });
    await writeAudit(tx, deps, {
      actor,
      act: 'reading changed',
      subject: { kind: 'revision', id: row.revision.id },
      detail: {
        takenBack: proposal.takeBack,
        answers: proposal.answers,
        corrections: proposal.corrections,
        typed: proposal.typed,
      },
      requestId,
    });
    return reread;
  });
  return { ...changed, learning };
}

interface KeepActs extends ReadingChange {
  kept: KeptDraft;
  grid: CellGrid;
}

/** Faults of every part are told at once, by their place in the proposal. */
async function keepActs(tx: Database, deps: Deps, { kept, grid, ...change }: KeepActs): Promise<void> {
  const { actor, row, proposal } = change;
  const before = await listReadingActs(tx, actor, row.revision.id);
  expectTakenBack(before, proposal.takeBack);
  const typedBefore = typedInForce(before).filter(({ id }) => !proposal.takeBack.includes(id));
  const typedOn = dateOfInstant(deps.now().toISOString(), row.agency.timeZone);
  const corrections = checkCorrections(proposal.corrections, { grid, edition: kept.edition });
  const typed = checkTyped(proposal.typed, {
    edition: kept.edition,
    workbook: kept.read.record,
    present: typedBefore.map(({ reading }) => reading),
    typed: { by: actor.person.name, on: typedOn },
  });
  const errors = [...corrections, ...typed.errors];
  if (errors.length > 0) throw new Problem('invalid-input', { detail: errors[0]?.detail ?? '', errors });
  await keepAnswers(tx, deps, { ...change, given: proposal.answers, doubts: kept.read.doubts });
  const by = {
    revisionId: row.revision.id,
    contractorId: row.revision.contractorId,
    personId: actor.personId,
    at: deps.now(),
  };
  const acts: Omit<typeof readingActs.$inferInsert, 'id' | keyof typeof by>[] = [
    ...proposal.takeBack.map((takesBackId) => ({ act: { kind: 'taken back' as const }, takesBackId })),
    ...proposal.corrections.map((correction) => ({
      act: { kind: 'correction' as const, correction },
      fileId: kept.fileId,
    })),
    ...typed.readings.map((reading) => ({ act: { kind: 'typed' as const, reading } })),
  ];
  for (const act of acts) await tx.insert(readingActs).values({ id: deps.newId(), ...by, ...act });
}

function expectTakenBack(acts: readonly ReadingAct[], takeBack: readonly string[]): void {
  for (const id of takeBack) {
    const found = acts.find((each) => each.id === id);
    if (found === undefined || found.act.kind === 'taken back') throw new Problem('not-found');
    if (found.takenBack !== null) {
      throw new Problem('wrong-state', { detail: `${found.takenBack.by} has taken it back already.` });
    }
  }
}
