import { eq } from 'drizzle-orm';
import { z } from 'zod';
import { quantitySchema } from '#rules/quantities/quantity';
import { attributeSchema } from '#rules/rule-sets/attribute';
import { documentTypeSchema } from '#rules/rule-sets/document-types';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import { caseSchema, designPointSchema, ruleSchema } from '#rules/rule-sets/schema';
import { tableSchema } from '#rules/rule-sets/table';
import type { Database } from './client';
import { resolvedEditions } from './schema/rule-sets';

const provenanceSchema = z.strictObject({
  document: z.string(),
  displaced: z.array(z.strictObject({ document: z.string(), text: z.string() })),
});

export const resolvedEditionSchema: z.ZodType<ResolvedEdition> = z.strictObject({
  id: z.string(),
  title: z.string(),
  agency: z.string(),
  edition: z.string(),
  effective: z.strictObject({ from: z.string().nullable(), to: z.string().nullable() }),
  layers: z.array(z.strictObject({ id: z.string(), title: z.string(), edition: z.string() })),
  designPoint: designPointSchema,
  roomToMove: z.array(z.string()),
  reportedTolerance: z.record(z.string(), z.number()),
  attributes: z.array(attributeSchema.extend({ supplied: provenanceSchema })),
  quantities: z.array(quantitySchema),
  documents: z.array(documentTypeSchema),
  tables: z.array(
    tableSchema.extend({ supplied: provenanceSchema, rowsSupplied: z.array(provenanceSchema) }),
  ),
  rules: z.array(ruleSchema.extend({ supplied: provenanceSchema })),
  removed: z.array(
    z.strictObject({
      kind: z.enum(['rule', 'table', 'attribute']),
      id: z.string(),
      document: z.string(),
      text: z.string(),
    }),
  ),
  cases: z.array(caseSchema),
});

/** A resolved edition never changes, so the few that are in use are parsed once. */
const parsed = new Map<string, ResolvedEdition>();
const keptEditions = 32;

/** The edition of a section or of a stored check. Whoever names a hash has been shown it by a tenant's own row. */
export async function loadResolvedEdition(db: Database, hash: string): Promise<ResolvedEdition> {
  const edition = await findResolvedEdition(db, hash);
  if (edition === null) throw new Error(`The resolved edition ${hash} is not stored.`);
  return edition;
}

export async function findResolvedEdition(db: Database, hash: string): Promise<ResolvedEdition | null> {
  const kept = parsed.get(hash);
  if (kept !== undefined) return kept;
  const [row] = await db
    .select({ document: resolvedEditions.document })
    .from(resolvedEditions)
    .where(eq(resolvedEditions.hash, hash));
  if (row === undefined) return null;
  const edition = resolvedEditionSchema.parse(row.document);
  const [oldest] = parsed.keys();
  if (parsed.size >= keptEditions && oldest !== undefined) parsed.delete(oldest);
  parsed.set(hash, edition);
  return edition;
}
