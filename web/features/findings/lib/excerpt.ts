import type { Cell, SheetGrid } from '#rules/reading/cell-grid';
import type { CellUse } from '#rules/reading/reading-result';
import type { Tie } from './ties';

const rowsShown = 6;
const mostColumns = 4;

/** The rows to ask for: six that hold the cell and as many of the other ties above it as fit. */
export function rowsAround(tie: Tie, ties: readonly Tie[]): { from: number; to: number } {
  const row = rowOf(tie.cell);
  const others = ties.filter((each) => each.sheet === tie.sheet).map((each) => rowOf(each.cell));
  let best = { from: Math.max(1, row - 2), held: 0 };
  for (let from = Math.max(1, row - rowsShown + 1); from <= row; from += 1) {
    const held = others.filter((other) => other >= from && other < from + rowsShown).length;
    if (held > best.held) best = { from, held };
  }
  return { from: best.from, to: best.from + rowsShown - 1 };
}

export interface ExcerptCell {
  address: string;
  text: string;
  isNumber: boolean;
  use: CellUse['use'] | null;
  taken: string | null;
  letters: string[];
  isHit: boolean;
}

export interface Excerpt {
  columns: { number: number; name: string; isLabel: boolean }[];
  rows: { number: number; cells: ExcerptCell[] }[];
  hit: Cell | null;
}

export function excerptOf(options: {
  sheet: SheetGrid;
  uses: readonly CellUse[];
  tie: Tie;
  ties: readonly Tie[];
  rows: { from: number; to: number };
}): Excerpt {
  const { sheet, tie, rows } = options;
  const cells = new Map(sheet.cells.map((cell) => [cell.address, cell]));
  const uses = new Map(options.uses.filter((use) => use.sheet === tie.sheet).map((use) => [use.cell, use]));
  const here = options.ties.filter((each) => each.sheet === tie.sheet);
  const columns = columnsAround(sheet, tie.cell, here, rows);
  const numbers = Array.from({ length: rows.to - rows.from + 1 }, (_, index) => rows.from + index);
  return {
    columns,
    rows: numbers.map((row) => ({
      number: row,
      cells: columns.map(({ name }) => {
        const address = `${name}${row}`;
        const cell = cells.get(address);
        const use = uses.get(address);
        return {
          address,
          text: cell?.text ?? '',
          isNumber: cell?.kind === 'number',
          use: use?.use ?? null,
          taken: use?.taken ?? null,
          letters: here.filter((each) => each.cell === address).map((each) => each.letter),
          isHit: address === tie.cell,
        };
      }),
    })),
    hit: cells.get(tie.cell) ?? null,
  };
}

/** The row's own label, then the cell with its neighbours and tied columns, in the sheet's order. */
function columnsAround(
  sheet: SheetGrid,
  cell: string,
  ties: readonly Tie[],
  rows: { from: number; to: number },
): Excerpt['columns'] {
  const at = columnOf(cell);
  const inRows = sheet.cells.filter((each) => each.row >= rows.from && each.row <= rows.to);
  const label = inRows
    .filter((each) => each.kind === 'text' && each.column < at)
    .sort((one, other) => one.column - other.column)[0]?.column;
  const tied = ties
    .filter((tie) => rowOf(tie.cell) >= rows.from && rowOf(tie.cell) <= rows.to)
    .map((tie) => columnOf(tie.cell));
  const wanted = [at, ...(label === undefined ? [] : [label]), ...tied, at - 1, at + 1];
  const chosen = new Set<number>();
  for (const column of wanted) {
    const exists = column >= 1 && column <= Math.max(sheet.columnCount, at);
    if (exists && chosen.size < mostColumns) chosen.add(column);
  }
  return [...chosen]
    .sort((one, other) => one - other)
    .map((number) => ({ number, name: columnName(number), isLabel: number === label }));
}

export function rowOf(address: string): number {
  return Number(/\d+$/.exec(address)?.[0] ?? 1);
}

export function columnOf(address: string): number {
  const letters = /^[A-Z]+/i.exec(address)?.[0]?.toUpperCase() ?? 'A';
  return [...letters].reduce((sum, letter) => sum * 26 + (letter.charCodeAt(0) - 64), 0);
}

export function columnName(column: number): string {
  let name = '';
  for (let rest = column; rest > 0; rest = Math.floor((rest - 1) / 26)) {
    name = String.fromCharCode(65 + ((rest - 1) % 26)) + name;
  }
  return name;
}
