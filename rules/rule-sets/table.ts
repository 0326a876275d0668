import { z } from 'zod';

/** Where a limit or a table comes from. */
export const sourceSchema = z.strictObject({
  title: z.string().nullable().optional(),
  number: z.string().nullable().optional(),
  edition: z.string().nullable().optional(),
  section: z.string().nullable().optional(),
  origin: z.enum(['read', 'derived', 'memory', 'agency']).default('agency'),
});

/** `from` inclusive, `below` exclusive; either may be left out. */
export const keyRangeSchema = z.strictObject({
  from: z.number().optional(),
  below: z.number().optional(),
});

const cellSchema = z.union([
  z.number(),
  z.string(),
  z.boolean(),
  keyRangeSchema,
  /** An empty cell: the table sets no limit there. */
  z.null(),
  z.array(z.string()),
]);

export const tableSchema = z.strictObject({
  id: z.string().min(1),
  title: z.string().optional(),
  /** Attribute names, and `sieve`. */
  keys: z.array(z.string()).min(1),
  columns: z.array(z.strictObject({ name: z.string().min(1), unit: z.string().optional() })).min(1),
  rows: z.array(z.record(z.string(), cellSchema)),
  source: sourceSchema.optional(),
});

export type KeyRange = z.infer<typeof keyRangeSchema>;
export type TableCell = z.infer<typeof cellSchema>;
export type LimitTable = z.infer<typeof tableSchema>;
export type RuleSource = z.infer<typeof sourceSchema>;

export function isKeyRange(cell: TableCell | undefined): cell is KeyRange {
  return typeof cell === 'object' && cell !== null && !Array.isArray(cell);
}
