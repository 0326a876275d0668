import { boolean, index, int, mysqlTable, uniqueIndex, varchar } from 'drizzle-orm/mysql-core';
import { z } from 'zod';
import { cellSchema, sheetGridSchema } from '#rules/reading/cell-grid';
import { choice, id, instant, json, longBlob, reference, sha256 } from '../columns';
import { organisations, people } from './people';

/** Bytes as they came or went; never changed. */
export const files = mysqlTable(
  'files',
  {
    id: id('id').primaryKey(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    kind: choice('kind', ['workbook', 'document', 'letter', 'findings workbook']).notNull(),
    fileName: varchar('file_name', { length: 255 }).notNull(),
    mediaType: varchar('media_type', { length: 120 }).notNull(),
    sizeBytes: int('size_bytes').notNull(),
    sha256: sha256('sha256').notNull(),
    bytes: longBlob('bytes').notNull(),
    createdById: id('created_by_id').notNull(),
    createdAt: instant('created_at').notNull(),
  },
  (table) => [
    index('files_contractor').on(table.contractorId, table.createdAt),
    index('files_sha256').on(table.sha256),
    reference('files_agency_fk', table.agencyId, organisations.id),
    reference('files_contractor_fk', table.contractorId, organisations.id),
    reference('files_created_by_fk', table.createdById, people.id),
  ],
);

/** A workbook as cells, by decoder version; the cells themselves are in `cell_blocks`. */
export const cellGrids = mysqlTable(
  'cell_grids',
  {
    id: id('id').primaryKey(),
    fileId: id('file_id').notNull(),
    decoder: varchar('decoder', { length: 60 }).notNull(),
    date1904: boolean('date_1904').notNull(),
    properties: json('properties', z.record(z.string(), z.string())).notNull(),
    /** Every sheet without its cells. */
    sheets: json('sheets', z.array(sheetGridSchema.omit({ cells: true }))).notNull(),
    createdAt: instant('created_at').notNull(),
  },
  (table) => [
    uniqueIndex('cell_grids_decoder').on(table.fileId, table.decoder),
    reference('cell_grids_file_fk', table.fileId, files.id),
  ],
);

export const cellBlocks = mysqlTable(
  'cell_blocks',
  {
    id: id('id').primaryKey(),
    gridId: id('grid_id').notNull(),
    sheet: int('sheet').notNull(),
    /** First and last row of the block, both included. */
    fromRow: int('from_row').notNull(),
    toRow: int('to_row').notNull(),
    cells: json('cells', z.array(cellSchema)).notNull(),
  },
  (table) => [
    uniqueIndex('cell_blocks_rows').on(table.gridId, table.sheet, table.fromRow),
    reference('cell_blocks_grid_fk', table.gridId, cellGrids.id).onDelete('cascade'),
  ],
);
