import { normaliseUnit } from '../../quantities/units';
import type { Cell } from '../cell-grid';
import { labelKey, plainText } from '../plain-text';
import type { SheetIndex } from '../sheet-index';
import { findTables } from './find-tables';
import type { Surroundings, Table, TableRow } from './table';
import type { TableColumn } from './table-column';
import { tableColumns } from './table-columns';

/** Values that one heading or label speaks for, and how it is found again whatever the values are. */
export interface LayoutLine {
  index: SheetIndex;
  axis: 'down' | 'right';
  /** From the top row to the lowest, without units. */
  header: string[];
  /** Heads over each value of a line to the right, by column. */
  headOf: Map<number, string>;
  titles: string[];
  unit: string | null;
  between: [string | null, string | null];
  anchor: Cell;
  cells: Cell[];
  /** False where the text before the values only names whose they are: trial B, specimen 3. */
  isLabel: boolean;
}

/** Every heading and label of a sheet that values stand under or beside. */
export function layoutLines(index: SheetIndex, around: Surroundings): LayoutLine[] {
  return findTables(index.sheet, around).flatMap((table) => {
    const columns = tableColumns(table, index, around);
    const down = downLines(table, columns, index, around);
    return [...down, ...rightLines(table, columns, index, around)];
  });
}

function downLines(
  table: Table,
  columns: Map<number, TableColumn>,
  index: SheetIndex,
  around: Surroundings,
): LayoutLine[] {
  const headed = [...columns.values()].flatMap((column) => {
    const texts = column.heads.filter((cell) => around.kinds.of(cell) === 'text');
    const lowest = texts.at(-1);
    return lowest ? [{ column, texts, lowest }] : [];
  });
  return headed.map(({ column, texts, lowest }, at): LayoutLine => {
    const uppers = texts.slice(0, -1).filter((cell) => !namesOnly(cell, around));
    return {
      index,
      axis: 'down',
      header: [...uppers, lowest].map(({ text }) => headingText(text)),
      headOf: new Map(),
      titles: titlesOf(table, around),
      unit: column.unit,
      between: [nameOf(headed[at - 1]?.lowest), nameOf(headed[at + 1]?.lowest)],
      anchor: lowest,
      cells: table.rows.flatMap(({ cells }) =>
        cells.filter((cell) => cell.column === column.column && mayBeValue(cell, around)),
      ),
      isLabel: true,
    };
  });
}

function rightLines(
  table: Table,
  columns: Map<number, TableColumn>,
  index: SheetIndex,
  around: Surroundings,
): LayoutLine[] {
  const isHeaded = table.headings.length > 0;
  const titles = titlesOf(table, around);
  const found = table.rows.flatMap((row, at) =>
    labelledRuns(row, around).map((run) => ({ ...run, isApart: standsApart(row, table.rows[at - 1]) })),
  );
  const heads = new Map(
    [...columns.values()].flatMap((column) => {
      const head = column.heads.findLast((cell) => around.kinds.of(cell) === 'text');
      return head ? [[column.column, headingText(head.text)] as const] : [];
    }),
  );
  return found.map(({ label, cells, isApart }, at): LayoutLine => {
    const beside = (other: (typeof found)[number] | undefined) =>
      other && other.label.column === label.column ? nameOf(other.label) : null;
    return {
      index,
      axis: 'right',
      header: [headingText(label.text)],
      headOf: heads,
      titles,
      unit: around.labels.read(label.text).unit,
      between: [beside(found[at - 1]), beside(found[at + 1])],
      anchor: label,
      cells,
      isLabel: !isHeaded || isApart || columns.get(label.column)?.kind === 'label',
    };
  });
}

/** A label and its value under a blank row are no row of the table over it. */
function standsApart({ row, cells }: TableRow, before: TableRow | undefined): boolean {
  return cells.length === 2 && before !== undefined && row > before.row + 1;
}

/** The texts of a row, each with the values that follow it up to the next text. */
function labelledRuns({ cells }: TableRow, around: Surroundings): { label: Cell; cells: Cell[] }[] {
  const runs: { label: Cell; cells: Cell[] }[] = [];
  for (const cell of cells) {
    if (around.kinds.of(cell) === 'text') runs.push({ label: cell, cells: [] });
    else if (mayBeValue(cell, around)) runs.at(-1)?.cells.push(cell);
  }
  // What answers a label in words is a value and no label: "Course | wearing".
  const answers = new Set<Cell>();
  for (const [at, run] of runs.entries()) {
    const next = runs[at + 1];
    if (run.cells.length > 0 || answers.has(run.label) || !next || next.cells.length > 0) continue;
    run.cells.push(next.label);
    answers.add(next.label);
  }
  return runs.filter((run) => run.cells.length > 0 && !answers.has(run.label));
}

function titlesOf(table: Table, { kinds }: Surroundings): string[] {
  return table.titles.filter((cell) => kinds.of(cell) === 'text').map(({ text }) => headingText(text));
}

function mayBeValue(cell: Cell, { kinds }: Surroundings): boolean {
  const kind = kinds.of(cell);
  return kind === 'value' || kind === 'none';
}

/** "Trial A" over "Gmb" and "Gmm" comes and goes with the mix. */
function namesOnly(cell: Cell, { labels }: Surroundings): boolean {
  const meaning = labels.read(cell.text);
  return Object.keys(meaning.at).length > 0 && meaning.quantities.length === 0;
}

function nameOf(cell: Cell | undefined): string | null {
  return cell ? headingText(cell.text) : null;
}

/** A heading without the unit behind it, as a mapping keeps it. */
export function headingText(text: string): string {
  const plain = plainText(text).replace(/\s*:$/, '');
  const tail = /(?:,\s*([^,()[\]]+)|\s*[([]\s*([^()[\]]+)\s*[)\]])$/.exec(plain);
  const stated = tail?.[1] ?? tail?.[2];
  if (tail === null || stated === undefined || normaliseUnit(stated) === null) return plain;
  const name = plain.slice(0, tail.index).trim();
  return name === '' ? plain : name;
}

export function sameHeading(one: string | null, other: string | null): boolean {
  return one === other || (one !== null && other !== null && labelKey(one) === labelKey(other));
}
