import { z } from 'zod';

/** One non-empty cell as the workbook stores it. Nothing is interpreted here. */
export const cellSchema = z.strictObject({
  /** `G12` */
  address: z.string(),
  row: z.number().int().positive(),
  column: z.number().int().positive(),
  kind: z.enum(['number', 'text', 'boolean', 'date', 'error', 'formula-without-result']),
  /** The stored number in shortest decimal form, the text, `true`, an ISO date, `#DIV/0!`, or `""`. */
  value: z.string(),
  /** As displayed through the number format, as far as it can be known. */
  text: z.string(),
  format: z.string().nullable().default(null),
  formula: z.string().nullable().default(null),
  /** True where `value` is the cached result of `formula`. */
  cached: z.boolean().default(false),
  comment: z.string().nullable().default(null),
  bold: z.boolean().default(false),
});

export const sheetGridSchema = z.strictObject({
  name: z.string(),
  hidden: z.boolean(),
  rowCount: z.number().int().nonnegative(),
  columnCount: z.number().int().nonnegative(),
  /** Only non-empty cells, by row, then column. */
  cells: z.array(cellSchema),
  /** `A1:C1` */
  merges: z.array(z.string()),
  /** Width in characters by column number, where it is set. */
  columnWidths: z.record(z.string(), z.number()),
  hiddenRows: z.array(z.number().int()),
  hiddenColumns: z.array(z.number().int()),
});

export const cellGridSchema = z.strictObject({
  decoder: z.string(),
  /** Workbook date epoch. */
  date1904: z.boolean(),
  /** Custom document properties; the template's stamp is one of them. */
  properties: z.record(z.string(), z.string()),
  sheets: z.array(sheetGridSchema),
});

export type Cell = z.infer<typeof cellSchema>;
export type SheetGrid = z.infer<typeof sheetGridSchema>;
export type CellGrid = z.infer<typeof cellGridSchema>;
