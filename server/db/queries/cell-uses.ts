import { and, eq } from 'drizzle-orm';
import type { CellUse } from '#rules/reading/reading-result';
import type { Database } from '../client';
import { mixRecords } from '../schema/submittals';
import { ofTenant, type Reader } from './reader';
import { findMixRecord } from './records';

type UsesBySheet = ReadonlyMap<string, ReadonlyMap<string, CellUse>>;

/**
 * What each cell of a sheet was taken for. A reading of a large workbook takes long to parse and is asked for block
 * by block, so the newest few are kept; a reading that was made again has another instant and is not found here.
 */
export async function usesOfSheet(
  db: Database,
  reader: Reader,
  { revisionId, sheet }: { revisionId: string; sheet: string },
): Promise<ReadonlyMap<string, CellUse>> {
  const [head] = await db
    .select({ readAt: mixRecords.readAt, recordHash: mixRecords.recordHash })
    .from(mixRecords)
    .where(and(eq(mixRecords.revisionId, revisionId), ofTenant(mixRecords, reader)));
  if (head === undefined) return noUses;
  const key = `${revisionId} ${head.readAt.toISOString()} ${head.recordHash}`;
  const known = kept.get(key) ?? loadUses(db, reader, revisionId);
  keep(key, known);
  // What could not be loaded is asked for anew the next time.
  known.catch(() => kept.delete(key));
  return (await known).get(sheet) ?? noUses;
}

const noUses: ReadonlyMap<string, CellUse> = new Map();
const mostKept = 4;
/** Several blocks are asked for at once; the first asks the database for all of them. */
const kept = new Map<string, Promise<UsesBySheet>>();

async function loadUses(db: Database, reader: Reader, revisionId: string): Promise<UsesBySheet> {
  const record = await findMixRecord(db, reader, revisionId);
  return indexUses(record?.reading.uses ?? []);
}

/** Asked for last, dropped last. */
function keep(key: string, uses: Promise<UsesBySheet>): void {
  kept.delete(key);
  kept.set(key, uses);
  for (const oldest of kept.keys()) {
    if (kept.size <= mostKept) return;
    kept.delete(oldest);
  }
}

function indexUses(uses: readonly CellUse[]): UsesBySheet {
  const sheets = new Map<string, Map<string, CellUse>>();
  for (const use of uses) {
    const cells = sheets.get(use.sheet) ?? new Map<string, CellUse>();
    sheets.set(use.sheet, cells);
    cells.set(use.cell, use);
  }
  return sheets;
}
