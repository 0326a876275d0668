import { and, eq } from 'drizzle-orm';
import { z } from 'zod';
import type { CellGrid } from '#rules/reading/cell-grid';
import { correctionsInForce } from '../commands/readings/acts-in-force';
import { keepReading } from '../commands/readings/keep-reading';
import { readGrid } from '../commands/readings/read-grid';
import { recogniseLayout } from '../commands/readings/recognise-layout';
import { loadGrid, storeGrid } from '../db/queries/cell-grids';
import { type Reader, revisionsOf } from '../db/queries/reader';
import { listReadingActs } from '../db/queries/reading-acts';
import { listAnswers, loadFile } from '../db/queries/records';
import { findRevision, lockRevision, type RevisionRow } from '../db/queries/revisions';
import { snapshotOfSection } from '../db/queries/section-snapshot';
import { loadResolvedEdition } from '../db/resolved-edition';
import { revisions } from '../db/schema/submittals';
import { Problem } from '../problem';
import type { JobContext } from './job-handlers';
import { JobInterrupted } from './job-leases';

const payloadSchema = z.object({ revisionId: z.string(), fileId: z.string() });

/**
 * Guards and decodes an uploaded workbook, keeps its cells, reads them and runs the pre-check. The cells are kept
 * first, so that a run that was cut off goes on from them; what follows is one transaction.
 */
export async function readWorkbookJob(context: JobContext): Promise<void> {
  const { deps, job } = context;
  const { revisionId, fileId } = payloadSchema.parse(job.payload);
  const reader = readerOf(job);
  const row = await draftOf(context, revisionId, fileId);
  const grid = (await loadGrid(deps.db, reader, fileId)) ?? (await decodeAndKeep(context, fileId));
  const { submittal } = row;
  const section = await snapshotOfSection(deps.db, reader, submittal);
  if (section === null) {
    throw new Problem('wrong-state', {
      detail: 'The section of the project is not confirmed.',
      fix: 'Ask the agency to confirm it, then upload the workbook again.',
    });
  }
  await context.report({ text: `${row.workbook.fileName}: taking readings and checking them.` });
  const edition = await loadResolvedEdition(deps.db, section.resolvedHash);
  const acts = await listReadingActs(deps.db, reader, revisionId);
  const { read, mapping } = await readGrid(deps.db, {
    grid,
    edition,
    resolvedHash: section.resolvedHash,
    agencyId: row.agency.id,
    answers: await listAnswers(deps.db, reader, revisionId),
    corrections: correctionsInForce(acts, fileId).map(({ correction }) => correction),
    learned: await recogniseLayout(deps.db, {
      grid,
      edition,
      organisationId: reader.organisationId,
      laboratoryId: row.revision.laboratoryId,
    }),
  });
  await deps.db.transaction(async (tx) => {
    const locked = await lockRevision(tx, reader, revisionId);
    if (locked?.state !== 'draft' || locked.workbookFileId !== fileId) throw new JobInterrupted();
    await keepReading(tx, deps, { reader, row, section, edition, read, mapping, madeById: job.createdById });
    // Whoever has the page open saw a draft without a reading: their next write must not pass for informed.
    await tx
      .update(revisions)
      .set({ version: locked.version + 1 })
      .where(eq(revisions.id, revisionId));
    await context.complete(tx, `${row.workbook.fileName} is read.`);
  });
}

/** A workbook is read for the contractor whose job it is. */
function readerOf({ organisationId }: JobContext['job']): Reader {
  return { organisationId, kind: 'contractor' };
}

/** The revision while it is a draft with this very workbook; a job that was overtaken has nothing to do. */
async function draftOf({ deps, job }: JobContext, revisionId: string, fileId: string): Promise<RevisionRow> {
  const reader = readerOf(job);
  const [place] = await deps.db
    .select({ submittalId: revisions.submittalId, number: revisions.number })
    .from(revisions)
    .where(and(eq(revisions.id, revisionId), revisionsOf(reader)));
  const row = place === undefined ? null : await findRevision(deps.db, reader, place);
  if (row === null || row.revision.state !== 'draft' || row.workbook.id !== fileId) {
    throw new Problem('wrong-state', {
      detail: 'Another workbook has taken the place of this one.',
      fix: 'Look at the newer one.',
    });
  }
  return row;
}

async function decodeAndKeep(context: JobContext, fileId: string): Promise<CellGrid> {
  const { deps, job, signal } = context;
  const reader = readerOf(job);
  const file = await loadFile(deps.db, reader, fileId);
  if (file === null) throw new Error(`The file ${fileId} is not stored.`);
  const { bytes, fileName } = file;
  const progress = createProgress(context);
  await progress.tell(0, 0);
  const decoded = await deps.pool.decode({ bytes, fileName, signal, onProgress: progress.note });
  await progress.settled();
  if (!decoded.ok) {
    const { slug, detail, fix } = decoded.problem;
    throw new Problem(slug, { detail, fix });
  }
  await deps.db.transaction((tx) =>
    storeGrid(tx, { reader, fileId, grid: decoded.grid, now: deps.now(), newId: deps.newId }),
  );
  return decoded.grid;
}

/** Sheets are told one report at a time; while one is being written the newest count waits. */
function createProgress({ report }: JobContext) {
  let writing: Promise<void> | null = null;
  let next: [number, number] | null = null;
  const tell = (done: number, total: number) =>
    report({
      text: total === 0 ? 'Opening the workbook.' : `Reading ${total} sheets, ${done} done.`,
      done,
      total,
    });
  const write = (): void => {
    if (writing !== null || next === null) return;
    const [done, total] = next;
    next = null;
    // A job that was taken away ends at its next report on the main path; here it only stops telling.
    writing = tell(done, total)
      .catch(() => undefined)
      .finally(() => {
        writing = null;
        write();
      });
  };
  return {
    tell,
    note(done: number, total: number): void {
      next = [done, total];
      write();
    },
    async settled(): Promise<void> {
      while (writing !== null) await writing;
    },
  };
}
