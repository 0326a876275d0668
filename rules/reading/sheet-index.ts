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

  constructor(readonly sheet: SheetGrid) {
    for (const cell of sheet.cells) this.byPlace.set(placeKey(cell.row, cell.column), cell);
    for (const merge of sheet.merges) this.addMerge(merge);
  }

  cellAt(row: number, column: number): Cell | null {
    return this.byPlace.get(placeKey(row, column)) ?? null;
  }

  /** Rows and columns that a cell covers. */
  spanOf(cell: Cell): { rows: number; columns: number } {
    return this.spans.get(cell.address) ?? { rows: 1, columns: 1 };
  }

  isHidden(cell: Cell): boolean {
    const { hidden, hiddenRows, hiddenColumns } = this.sheet;
    return hidden || hiddenRows.includes(cell.row) || hiddenColumns.includes(cell.column);
  }

  /** All cells that carry the header's lowest text under its upper ones, in reading order. */
  findHeader(header: string[]): HeaderMatch[] {
    const lowest = header.at(-1) ?? '';
    return this.sheet.cells.flatMap((cell) => {
      if (cell.kind !== 'text') return [];
      const match = matchHeader(cell.text, lowest);
      if (!match || !this.standsUnder(cell, header.slice(0, -1))) return [];
      return [{ cell, ...match }];
    });
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
  const key = labelKey(text);
  const wanted = labelKey(name);
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
