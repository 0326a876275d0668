import type { CellGrid } from '#rules/reading/cell-grid';
import type { ReadingEdition } from '#rules/reading/edition-contents';
import { closestLayout, fingerprintOf } from '#rules/reading/fingerprint';
import type { Database } from '../../db/client';
import { findMappingVersion, layoutsInUse } from '../../db/queries/mappings';
import type { LearnedMapping, MappingUsed } from './read-grid';

interface Recognise {
  grid: CellGrid;
  edition: ReadingEdition;
  organisationId: string;
  laboratoryId: string;
}

/** The newest version of the laboratory's mapping whose layout a workbook has. */
export async function recogniseLayout(
  db: Database,
  { grid, edition, organisationId, laboratoryId }: Recognise,
): Promise<LearnedMapping | null> {
  const known = await layoutsInUse(db, organisationId, laboratoryId);
  if (known.length === 0) return null;
  const found = closestLayout(fingerprintOf(grid, edition), known);
  return found === null ? null : learnedMapping(db, organisationId, found);
}

/** A version of a mapping with its document. */
export async function learnedMapping(
  db: Database,
  organisationId: string,
  used: MappingUsed['learned'],
): Promise<LearnedMapping | null> {
  if (used === null) return null;
  const found = await findMappingVersion(db, organisationId, { mappingId: used.id, number: used.number });
  return found && { id: found.id, name: found.name, number: used.number, document: found.version.document };
}
