import { addressOf, columnLetters } from '#rules/reading/cell-address';
import { type Cell, type CellGrid, cellGridSchema } from '#rules/reading/cell-grid';
import type { Conditions } from '#rules/record';
import { formatNumber } from '#server/workbook/number-format';

/** What a generated layout knows to be true of its own workbook. */
export interface Truth {
  readings: TrueReading[];
  attributes: Record<string, string | number>;
  documents: { type: string; date: string | null; validTo: string | null }[];
}

export interface TrueReading {
  quantity: string;
  value: number;
  unit: string;
  at: Conditions;
  qualifier?: '<' | '>';
}

export interface CellOptions {
  /** Number format code. */
  format?: string;
  formula?: string;
  kind?: Cell['kind'];
  comment?: string;
}

/** A workbook that is laid out by code; each value is written with what it means. */
export class Book {
  readonly truth: Truth = { readings: [], attributes: {}, documents: [] };
  private readonly sheets: SheetOf[] = [];

  sheet(name: string, options: { hidden?: boolean } = {}): SheetOf {
    const sheet = new SheetOf(name, options.hidden ?? false, this.truth);
    this.sheets.push(sheet);
    return sheet;
  }

  toGrid(): CellGrid {
    return cellGridSchema.parse({
      decoder: 'laid out by code',
      date1904: false,
      properties: {},
      sheets: this.sheets.map((sheet) => sheet.toGrid()),
    });
  }

  /** For a file: the cells as they were put. */
  contents(): SheetOf[] {
    return this.sheets;
  }
}

export class SheetOf {
  readonly cells = new Map<string, Cell>();
  readonly merges: string[] = [];
  readonly hiddenRows: number[] = [];
  readonly hiddenColumns: number[] = [];

  constructor(
    readonly name: string,
    readonly hidden: boolean,
    private readonly truth: Truth,
  ) {}

  /** Words or a figure that is no reading: a heading, a key, a limit, an average. */
  put(row: number, column: number, value: string | number | null, options: CellOptions = {}): this {
    if (value === null) return this;
    const address = addressOf(row, column);
    const isNumber = typeof value === 'number';
    const base = {
      address,
      row,
      column,
      format: options.format ?? null,
      formula: options.formula ?? null,
      cached: options.formula !== undefined,
      comment: options.comment ?? null,
      bold: false,
    };
    const text = isNumber ? formatNumber(String(value), options.format ?? 'General') : value;
    const kind = options.kind ?? (isNumber ? 'number' : 'text');
    this.cells.set(address, { ...base, kind, value: String(value), text });
    return this;
  }

  row(row: number, column: number, values: (string | number | null)[], options: CellOptions = {}): this {
    for (const [at, value] of values.entries()) this.put(row, column + at, value, options);
    return this;
  }

  /** A figure that is a reading; `as` is how it is written where that differs from its value. */
  read(
    row: number,
    column: number,
    reading: TrueReading,
    { as, ...options }: CellOptions & { as?: string | number } = {},
  ): this {
    this.truth.readings.push(reading);
    return this.put(row, column, as ?? reading.value, options);
  }

  know(name: string, value: string | number): this {
    this.truth.attributes[name] = value;
    return this;
  }

  merge(row: number, column: number, columns: number, rows = 1): this {
    if (columns > 1 || rows > 1) {
      this.merges.push(`${addressOf(row, column)}:${columnLetters(column + columns - 1)}${row + rows - 1}`);
    }
    return this;
  }

  toGrid(): CellGrid['sheets'][number] {
    const cells = [...this.cells.values()].sort((a, b) => a.row - b.row || a.column - b.column);
    return {
      name: this.name,
      hidden: this.hidden,
      rowCount: Math.max(0, ...cells.map(({ row }) => row)),
      columnCount: Math.max(0, ...cells.map(({ column }) => column)),
      cells,
      merges: this.merges,
      columnWidths: {},
      hiddenRows: this.hiddenRows,
      hiddenColumns: this.hiddenColumns,
    };
  }
}
