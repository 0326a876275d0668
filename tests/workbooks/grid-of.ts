import { parseAddress } from '#rules/reading/cell-address';
import { type Cell, type CellGrid, cellGridSchema } from '#rules/reading/cell-grid';

/** A number, a text, or a cell with its own fields. */
export type GridCell = number | string | Partial<Omit<Cell, 'address' | 'row' | 'column'>>;

export interface GridSheet {
  cells: Record<string, GridCell>;
  merges?: string[];
  hidden?: boolean;
  hiddenRows?: number[];
}

/** A decoded workbook written by hand: sheet name to address to value. */
export function gridOf(sheets: Record<string, GridSheet>, options: Partial<CellGrid> = {}): CellGrid {
  return cellGridSchema.parse({
    decoder: 'by hand',
    date1904: false,
    properties: {},
    ...options,
    sheets: Object.entries(sheets).map(([name, sheet]) => {
      const cells = Object.entries(sheet.cells).map(([address, value]) => cellOf(address, value));
      cells.sort((a, b) => a.row - b.row || a.column - b.column);
      return {
        name,
        hidden: sheet.hidden ?? false,
        rowCount: Math.max(0, ...cells.map(({ row }) => row)),
        columnCount: Math.max(0, ...cells.map(({ column }) => column)),
        cells,
        merges: sheet.merges ?? [],
        columnWidths: {},
        hiddenRows: sheet.hiddenRows ?? [],
        hiddenColumns: [],
      };
    }),
  });
}

export function cellOf(address: string, value: GridCell): Cell {
  const place = parseAddress(address);
  if (!place) throw new Error(`${address} is no address`);
  const base = { address, ...place, format: null, formula: null, cached: false, comment: null, bold: false };
  if (typeof value === 'number')
    return { ...base, kind: 'number', value: String(value), text: String(value) };
  if (typeof value === 'string') return { ...base, kind: 'text', value, text: value };
  return { ...base, kind: 'number', value: value.text ?? '', text: value.value ?? '', ...value };
}
