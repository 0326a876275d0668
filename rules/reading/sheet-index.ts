import { normaliseUnit } from '../quantities/units';
import { parseAddress } from './cell-address';
import type { Cell, SheetGrid } from './cell-grid';
import { labelKey, plainText } from './plain-text';

export interface HeaderMatch {
  cell: Cell;
  /** Unit that the header itself states behind the name, in the registry's writing. */
  unit: string | null;
  /** What stands in the unit's place and is not a known unit. */
  unknownUnit: string | null;
}

/** Look-ups over one sheet, with merged cells answering for all the places that they cover. */
export class SheetIndex {
  private readonly byPlace = new Map<number, Cell>();
  private readonly spans = new Map<string, { rows: number; columns: number }>();
  private readonly byColumn = new Map<number, Cell[]>();
  /** Text cells with the form in which labels are compared, made once: every rule asks for it. */
  private readonly texts: { cell: Cell; key: string }[] = [];
  private readonly headers = new Map<string, HeaderMatch[]>();
  private readonly hiddenRows: Set<number>;
  private readonly hiddenColumns: Set<number>;

  constructor(readonly sheet: SheetGrid) {
    for (const cell of sheet.cells) {
      this.byPlace.set(placeKey(cell.row, cell.column), cell);
      const column = this.byColumn.get(cell.column);
      if (column) column.push(cell);
      else this.byColumn.set(cell.column, [cell]);
      if (cell.kind === 'text') this.texts.push({ cell, key: labelKey(cell.text) });
    }
    for (const merge of sheet.merges) this.addMerge(merge);
    this.hiddenRows = new Set(sheet.hiddenRows);
    this.hiddenColumns = new Set(sheet.hiddenColumns);
  }

  /** The filled cells of a column, from the top. */
  columnCells(column: number): Cell[] {
    return this.byColumn.get(column) ?? [];
  }

  cellAt(row: number, column: number): Cell | null {
    return this.byPlace.get(placeKey(row, column)) ?? null;
  }

  /** Rows and columns that a cell covers. */
  spanOf(cell: Cell): { rows: number; columns: number } {
    return this.spans.get(cell.address) ?? { rows: 1, columns: 1 };
  }

  isHidden(cell: Cell): boolean {
    return this.sheet.hidden || this.hiddenRows.has(cell.row) || this.hiddenColumns.has(cell.column);
  }

  /** All cells that carry the header's lowest text under its upper ones, in reading order. */
  findHeader(header: string[]): HeaderMatch[] {
    const asked = header.join('\u0000');
    const known = this.headers.get(asked);
    if (known) return known;
    const wanted = labelKey(header.at(-1) ?? '');
    const found = this.texts.flatMap(({ cell, key }) => {
      if (!key.startsWith(wanted)) return [];
      const match = matchKeys(cell.text, key, wanted);
      return match && this.standsUnder(cell, header.slice(0, -1)) ? [{ cell, ...match }] : [];
    });
    this.headers.set(asked, found);
    return found;
  }

  private standsUnder(cell: Cell, upper: string[]): boolean {
    let row = cell.row - 1;
    for (const text of upper.toReversed()) {
      let found = false;
      for (; row >= Math.max(1, cell.row - 4) && !found; row -= 1) {
        const above = this.cellAt(row, cell.column);
        found = above !== null && matchHeader(above.text, text) !== null;
      }
      if (!found) return false;
    }
    return true;
  }

  private addMerge(merge: string): void {
    const [start = '', end = start] = merge.split(':');
    const first = parseAddress(start);
    const last = parseAddress(end);
    const cell = first && this.cellAt(first.row, first.column);
    if (!first || !last || !cell) return;
    this.spans.set(cell.address, { rows: last.row - first.row + 1, columns: last.column - first.column + 1 });
    // A merge over whole columns would fill memory; no header or key is that tall.
    const lastRow = Math.min(last.row, first.row + 500);
    const lastColumn = Math.min(last.column, first.column + 200);
    for (let row = first.row; row <= lastRow; row += 1) {
      for (let column = first.column; column <= lastColumn; column += 1) {
        if (!this.byPlace.has(placeKey(row, column))) this.byPlace.set(placeKey(row, column), cell);
      }
    }
  }
}

/** Whether a header cell carries a name, alone or followed by a unit: `Dry mass`, `Dry mass, g`, `Dry mass (g)`. */
export function matchHeader(
  text: string,
  name: string,
): { unit: string | null; unknownUnit: string | null } | null {
  return matchKeys(text, labelKey(text), labelKey(name));
}

function matchKeys(
  text: string,
  key: string,
  wanted: string,
): { unit: string | null; unknownUnit: string | null } | null {
  if (key === wanted) return { unit: null, unknownUnit: null };
  if (!key.startsWith(wanted)) return null;
  const plain = plainText(text).replace(/\s*:$/, '');
  const tail = /(?:,\s*([^,()[\]]+)|[([]\s*([^()[\]]+)\s*[)\]])$/.exec(plain);
  const stated = tail?.[1] ?? tail?.[2];
  if (stated === undefined || labelKey(plain.slice(0, tail?.index)) !== wanted) return null;
  const unit = normaliseUnit(stated);
  return unit === null ? { unit: null, unknownUnit: stated.trim() } : { unit, unknownUnit: null };
}

function placeKey(row: number, column: number): number {
  return row * 20_000 + column;
}
