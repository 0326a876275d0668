import type { Cell, SheetGrid } from '#rules/reading/cell-grid';
import type { CellUse } from '#rules/reading/reading-result';
import type { Tie } from './ties';

const rowsShown = 6;
const mostColumns = 4;

/** How far above a cell the heads of its column are looked for. */
const headRows = 60;

/** The rows to ask for: those that may be shown around the cell, and where the head of its column may stand. */
export function rowsToAsk(tie: Tie): { from: number; to: number } {
  const row = rowOf(tie.cell);
  return { from: Math.max(1, row - headRows), to: row + rowsShown };
}

/** Six rows that hold the cell and as many of the other ties above it as fit; the head of its column on top. */
export function rowsAround(sheet: SheetGrid, tie: Tie, ties: readonly Tie[]): number[] {
  const row = rowOf(tie.cell);
  const others = ties.filter((each) => each.sheet === tie.sheet).map((each) => rowOf(each.cell));
  const held = (from: number) => others.filter((other) => other >= from && other < from + rowsShown).length;
  let best = Math.max(1, row - 2);
  for (let from = Math.max(1, row - rowsShown + 1); from <= row; from += 1) {
    if (held(from) > held(best)) best = from;
  }
  const rows = Array.from({ length: rowsShown }, (_, index) => best + index);
  const head = headRowOf(sheet, tie, best);
  const [first] = rows;
  return head === null || first === row || others.includes(first ?? 0) ? rows : [head, ...rows.slice(1)];
}

/** The top of the words that stand nearest above the shown rows in the cell's own column. */
function headRowOf(sheet: SheetGrid, tie: Tie, from: number): number | null {
  const column = columnOf(tie.cell);
  const words = new Set(
    sheet.cells
      .filter((cell) => cell.column === column && cell.kind === 'text' && cell.row < from)
      .map((cell) => cell.row),
  );
  if (words.size === 0) return null;
  let top = Math.max(...words);
  while (words.has(top - 1)) top -= 1;
  return top;
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
  rows: readonly number[];
}): Excerpt {
  const { sheet, tie, rows } = options;
  const cells = new Map(sheet.cells.map((cell) => [cell.address, cell]));
  const uses = new Map(options.uses.filter((use) => use.sheet === tie.sheet).map((use) => [use.cell, use]));
  const here = options.ties.filter((each) => each.sheet === tie.sheet);
  const columns = columnsAround(sheet, tie.cell, here, rows);
  return {
    columns,
    rows: rows.map((row) => ({
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
  rows: readonly number[],
): Excerpt['columns'] {
  const at = columnOf(cell);
  const inRows = sheet.cells.filter((each) => rows.includes(each.row));
  const label = inRows
    .filter((each) => each.kind === 'text' && each.column < at)
    .sort((one, other) => one.column - other.column)[0]?.column;
  const tied = ties.filter((tie) => rows.includes(rowOf(tie.cell))).map((tie) => columnOf(tie.cell));
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
