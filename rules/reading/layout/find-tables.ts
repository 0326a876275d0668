import { sieveFromName } from '../../quantities/sieves';
import type { Cell, SheetGrid } from '../cell-grid';
import type { CellKinds } from './cell-kind';
import { isHeading, type LabelMeaning, type LabelReader } from './label-meaning';

/** Cells of one row, from the left. */
export interface TableRow {
  row: number;
  cells: Cell[];
}

/** A piece of a sheet that is read as one: titles over it, heading rows, then rows of data. */
export interface Table {
  titles: Cell[];
  headings: TableRow[];
  rows: TableRow[];
  firstColumn: number;
  lastColumn: number;
}

export interface Surroundings {
  kinds: CellKinds;
  labels: Pick<LabelReader, 'read'>;
}

/** Cuts a sheet at its blank bands and at its heading rows. */
export function findTables(sheet: SheetGrid, around: Surroundings): Table[] {
  const merges = mergeStarts(sheet);
  const regions = cutRows(sheet.cells).flatMap((band) => cutColumns(band, around));
  const tables: Table[] = [];
  let titles: Cell[] = [];
  for (const region of regions) {
    const found = tablesOf(region, around, merges);
    const [first] = found;
    if (first) first.titles = [...titles, ...first.titles];
    titles = found.length === 0 ? [...titles, ...region.flatMap(({ cells }) => cells)] : [];
    tables.push(...found);
  }
  const left = titles.map((cell) => ({ row: cell.row, cells: [cell] }));
  const last: Table[] =
    left.length === 0 ? [] : [{ titles: [], headings: [], rows: left, firstColumn: 1, lastColumn: 1 }];
  return [...joinContinued(tables, around), ...last];
}

function mergeStarts(sheet: SheetGrid): Map<string, number> {
  const columns = new Map<string, number>();
  for (const merge of sheet.merges) {
    const match = /^([A-Z]+\d+):([A-Z]+)\d+$/.exec(merge);
    if (match?.[1] && match[2]) columns.set(match[1], columnNumber(match[2]));
  }
  return columns;
}

function columnNumber(letters: string): number {
  let column = 0;
  for (const letter of letters) column = column * 26 + letter.charCodeAt(0) - 64;
  return column;
}

type Region = TableRow[];

/** Rows without a blank row between them; cells come by row, then column. */
function cutRows(cells: readonly Cell[]): Region[] {
  const regions: Region[] = [];
  let region: Region = [];
  for (const cell of cells) {
    const last = region.at(-1);
    if (last?.row === cell.row) last.cells.push(cell);
    else {
      if (last && cell.row > last.row + 1) {
        regions.push(region);
        region = [];
      }
      region.push({ row: cell.row, cells: [cell] });
    }
  }
  if (region.length > 0) regions.push(region);
  return regions;
}

/** Splits a band where a blank column parts two tables that each have their own keys or labels. */
function cutColumns(band: Region, around: Surroundings): Region[] {
  const occupied = new Set<number>();
  for (const { cells } of band) {
    if (cells.length > 1 || band.length === 1) for (const cell of cells) occupied.add(cell.column);
  }
  const columns = [...occupied].sort((a, b) => a - b);
  const groups: { from: number; to: number }[] = [];
  for (const column of columns) {
    const last = groups.at(-1);
    if (last && column === last.to + 1) last.to = column;
    else groups.push({ from: column, to: column });
  }
  const parts: { from: number; to: number }[] = [];
  for (const group of groups) {
    const last = parts.at(-1);
    if (last && !standsAlone(band, group, around)) last.to = group.to;
    else parts.push({ ...group });
  }
  if (parts.length <= 1) return [band];
  const shared = leadingTitles(band);
  return parts.flatMap(({ from }, at) => {
    const lowest = at === 0 ? 0 : from;
    const highest = (parts[at + 1]?.from ?? Number.POSITIVE_INFINITY) - 1;
    const [first, ...rest] = cutRows(
      band.flatMap((row) => row.cells.filter(({ column }) => column >= lowest && column <= highest)),
    );
    if (!first) return [];
    const over = at === 0 ? [] : shared.filter(({ row }) => row < (first[0]?.row ?? 0));
    return [[...over, ...first], ...rest];
  });
}

/** Titles over a whole band speak for every table in it. */
function leadingTitles(band: Region): Region {
  const end = band.findIndex(({ cells }) => cells.length > 1);
  return band.slice(0, Math.max(0, end));
}

const keysOfTables = new Set([
  'sieve',
  'specimen',
  'trial',
  'stockpile',
  'temperature',
  'time',
  'frequency',
  'quantity',
  'blend',
  'passes',
  'document',
]);

function standsAlone(
  band: Region,
  group: { from: number; to: number },
  { kinds, labels }: Surroundings,
): boolean {
  if (group.to === group.from) return false;
  const first: Cell[] = [];
  let beside = 0;
  for (const { cells } of band) {
    const at = cells.findIndex(({ column }) => column >= group.from);
    const cell = cells[at];
    if (!cell || cell.column !== group.from) continue;
    first.push(cell);
    if ((cells[at + 1]?.column ?? Number.POSITIVE_INFINITY) <= group.to) beside += 1;
    if (first.length > 60) break;
  }
  const texts = first.filter((cell) => kinds.of(cell) === 'text');
  const head = texts[0];
  if (!head) return false;
  const own = texts.slice(0, 3).map(({ text }) => labels.read(text));
  if (
    own.some(
      (meaning) =>
        meaning.quantities.length === 0 &&
        meaning.keys.some((key) => keysOfTables.has(key)) &&
        meaning.unknown.length === 0,
    )
  )
    return true;
  const labelled = texts.filter(({ text }) => saysWhat(labels.read(text)));
  return (
    texts.length >= first.length - 1 &&
    labelled.length * 2 >= texts.length &&
    beside * 2 >= texts.length &&
    beside > 1
  );
}

/** A label that a value stands beside: a quantity, an attribute, a fact of the cover. */
export function saysWhat(meaning: LabelMeaning): boolean {
  return (
    meaning.quantities.length > 0 ||
    meaning.attribute !== null ||
    meaning.document !== null ||
    meaning.furniture ||
    meaning.raw
  );
}

function tablesOf(region: Region, around: Surroundings, merges: Map<string, number>): Table[] {
  const tables: Table[] = [];
  let table: Table | null = null;
  let titles: Cell[] = [];
  const firstColumn = Math.min(...region.map(({ cells }) => cells[0]?.column ?? 1));
  for (const [at, row] of region.entries()) {
    const next = region[at + 1];
    if (isTitle(row, next, { around, merges, firstColumn })) {
      if (table && table.rows.length > 0 && !opensTable(region, at + 1, table, around)) table.rows.push(row);
      else {
        if (table) table = null;
        titles.push(...row.cells);
      }
      continue;
    }
    const opens: boolean =
      table === null ||
      (table.rows.length > 0 && isHeadingRow(row, next, around, table)) ||
      widens(table, row, next, around);
    if (opens) {
      table = { titles, headings: [], rows: [], firstColumn, lastColumn: firstColumn };
      titles = [];
      tables.push(table);
    }
    const current = table as Table;
    if (current.rows.length === 0 && belongsToHeading(row, next, current, around)) current.headings.push(row);
    else current.rows.push(row);
    current.lastColumn = Math.max(current.lastColumn, row.cells.at(-1)?.column ?? 1);
  }
  return tables;
}

/** Under lines of label and value a wider row of heads begins the table that they speak for. */
function widens(table: Table, row: TableRow, next: TableRow | undefined, around: Surroundings): boolean {
  const isList =
    table.headings.length === 0 &&
    table.rows.length > 0 &&
    table.rows.every(({ cells }) => cells.length <= 2);
  if (!isList || row.cells.length < 3 || !next || next.cells.length < 3) return false;
  const first = around.kinds.of(row.cells[0] as Cell);
  if (first !== 'text' || !next.cells.some((cell) => around.kinds.of(cell) === 'value')) return false;
  return belongsToHeading(row, next, { ...table, rows: [], headings: [] }, around);
}

/** One text alone in its row; over columns to the right of the first it heads them instead. */
function isTitle(
  { cells }: TableRow,
  next: TableRow | undefined,
  { around, merges, firstColumn }: { around: Surroundings; merges: Map<string, number>; firstColumn: number },
): boolean {
  const [cell] = cells;
  if (cells.length !== 1 || !cell || around.kinds.of(cell) !== 'text') return false;
  if (cell.column > firstColumn && next && next.cells.length > 1) {
    const last = merges.get(cell.address) ?? cell.column;
    return !(last > cell.column || next.cells.some(({ column }) => column > cell.column));
  }
  return true;
}

function opensTable(region: Region, from: number, table: Table, around: Surroundings): boolean {
  for (let at = from; at < region.length; at += 1) {
    const row = region[at] as TableRow;
    const isAlone = row.cells.length === 1 && around.kinds.of(row.cells[0] as Cell) === 'text';
    if (!isAlone) return isHeadingRow(row, region[at + 1], around, table);
  }
  return false;
}

/** Words only, most of them headings, over a row with values or units: here another table begins. */
function isHeadingRow(
  row: TableRow,
  next: TableRow | undefined,
  { kinds, labels }: Surroundings,
  table: Table,
): boolean {
  if (row.cells.length < 2 || !next) return false;
  if (row.cells.some((cell) => kinds.of(cell) === 'value')) return false;
  const texts = row.cells.filter((cell) => kinds.of(cell) === 'text');
  if (texts.length < 2) return false;
  const meanings = texts.map(({ text }) => labels.read(text));
  const headings = meanings.filter((meaning) => isHeading(meaning) && meaning.unknown.length === 0);
  if (headings.length * 3 < texts.length * 2) return false;
  const hasDocuments = table.headings.some(({ cells }) =>
    cells.some(({ text }) => labels.read(text).keys.includes('document')),
  );
  if (hasDocuments) return meanings.every((meaning) => meaning.document === null);
  if (isPair(row, { kinds, labels })) return false;
  return next.cells.some((cell) => kinds.of(cell) !== 'text') || next.cells.length >= 2;
}

/** "Contractor | Brightwater Paving": a label with its words beside it, not two headings. */
export function isPair(row: TableRow, { kinds, labels }: Surroundings, next?: TableRow): boolean {
  const texts = row.cells.filter((cell) => kinds.of(cell) === 'text');
  const [first, second] = texts;
  if (!first || !second) return false;
  const label = labels.read(first.text);
  const answer = labels.read(second.text);
  const asks =
    label.attribute !== null ||
    label.document !== null ||
    label.furniture ||
    label.at.laboratory !== undefined ||
    /:\s*$/.test(first.text) ||
    label.quantities.length > 0 ||
    label.keys.length > 0;
  if (!asks) return false;
  const isDated =
    texts.length === 2 &&
    row.cells.length === 2 &&
    label.keys.some(
      (key) =>
        key === 'date' || key === 'testedOn' || key === 'validTo' || key === 'issuer' || key === 'reference',
    );
  const isFact =
    isDated ||
    label.attribute !== null ||
    label.document !== null ||
    label.furniture ||
    /:\s*$/.test(first.text);
  // Over a row of words that ask nothing, two questions side by side are headings.
  const below = next?.cells[0];
  const isHeads =
    answer.attribute !== null &&
    answer.unknown.length === 0 &&
    below !== undefined &&
    next?.cells.length === row.cells.length &&
    !saysWhat(labels.read(below.text));
  if (isHeads) return false;
  const answers = !isHeading(answer) || answer.unknown.length > 0;
  if (isFact)
    return (
      answers ||
      (texts.length === 2 &&
        label.keys.length === 0 &&
        answer.keys.length === 0 &&
        answer.quantities.length === 0 &&
        answer.role === null)
    );
  return answers && label.at.laboratory !== undefined;
}

function belongsToHeading(
  row: TableRow,
  next: TableRow | undefined,
  table: Table,
  around: Surroundings,
): boolean {
  const { kinds, labels } = around;
  if (!next && table.headings.length === 0) return table.rows.length === 0 && isHeadsOnly(row, around);
  const figures =
    table.rows.length === 0 && next !== undefined && next.cells.length > 1 ? headFigures(row, around) : [];
  const values = row.cells.filter((cell) => kinds.of(cell) === 'value' && !figures.includes(cell));
  const texts = row.cells.filter(
    (cell) => kinds.of(cell) === 'text' || (kinds.of(cell) === 'value' && !values.includes(cell)),
  );
  if (values.length === 0) {
    if (isPair(row, around, next)) return false;
    if (texts.length === 0) return row.cells.some((cell) => kinds.of(cell) === 'unit');
    if (isAnsweredByWords(row, around)) return false;
    if (row.cells.length === 1) return true;
    const meanings = texts.map(({ text }) => labels.read(text));
    const [label, ...answers] = meanings;
    const isAnswered =
      label &&
      label.quantities.length > 0 &&
      answers.length > 0 &&
      answers.every((meaning) => !isHeading(meaning) && /\d/.test(meaning.text));
    if (isAnswered) return false;
    if (meanings.some((meaning) => isHeading(meaning))) return true;
    // Names of stockpiles or specimens over columns of values.
    return next?.cells.some((cell) => kinds.of(cell) === 'value' || kinds.of(cell) === 'unit') ?? false;
  }
  return isNumberedHeading(row, values, table, around) || isKeyedHeading(row, next, table, around);
}

/** Figures that head columns: sieves in a run, and texts like "-20 °C" or "19 mm"; one alone is a value. */
function headFigures(row: TableRow, around: Surroundings): Cell[] {
  const said = row.cells.filter(
    (cell) =>
      saysCondition(cell, around) ||
      (cell.kind === 'text' && around.kinds.of(cell) === 'value' && sieveFromName(cell.text) !== null),
  );
  if (said.length > 1) return said;
  const numbers = row.cells.filter(({ kind }) => kind === 'number');
  const openings = numbers.map(({ value }) => sieveFromName(value));
  const falls = openings.every(
    (opening, at) => opening !== null && (at === 0 || opening < (openings[at - 1] as number)),
  );
  const first = row.cells[0];
  const isNamed =
    first !== undefined &&
    around.kinds.of(first) === 'text' &&
    around.labels.read(first.text).quantities.length === 0;
  return falls && isNamed && numbers.length > 3 ? numbers : [];
}

/** "Sand equivalent | N/A | %": a property whose result is a word. */
function isAnsweredByWords(row: TableRow, { kinds, labels }: Surroundings): boolean {
  const [first, ...others] = row.cells;
  if (!first || kinds.of(first) !== 'text' || labels.read(first.text).quantities.length === 0) return false;
  return (
    others.some((cell) => kinds.of(cell) === 'none' && !/^[-–—]+$/.test(cell.text.trim())) &&
    others.every((cell) => kinds.of(cell) !== 'text')
  );
}

/** A row of headings that stands alone, with a blank row under it. */
function isHeadsOnly(row: TableRow, { kinds, labels }: Surroundings): boolean {
  const texts = row.cells.filter((cell) => kinds.of(cell) === 'text');
  const heads = texts.filter(
    ({ text }) => isHeading(labels.read(text)) && labels.read(text).unknown.length === 0,
  );
  return texts.length > 2 && texts.length === row.cells.length && heads.length * 3 >= texts.length * 2;
}

/** "-20 °C" and "10 Hz" are figures that head what stands under them. */
export function saysCondition(cell: Cell, { labels }: Surroundings): boolean {
  return cell.kind === 'text' && Object.keys(labels.read(cell.text).at).length > 0;
}

/** "Sieve, mm | 25 | 19 | 12.5 …" at the top of a table: keys over the columns. */
function isKeyedHeading(
  row: TableRow,
  next: TableRow | undefined,
  table: Table,
  { kinds, labels }: Surroundings,
): boolean {
  const [first, ...others] = row.cells;
  if (!first || !next || table.rows.length > 0 || kinds.of(first) !== 'text' || others.length < 2)
    return false;
  const meaning = labels.read(first.text);
  const isProperty = meaning.keys.includes('quantity') && table.headings.length > 0;
  const isHead = meaning.keys.some((key) => keysOfHeads.has(key)) || isProperty;
  if (meaning.quantities.length > 0 || meaning.unknown.length > 0 || !isHead) return false;
  const heads = others.filter((cell) => kinds.of(cell) === 'value');
  const below = next.cells.find(({ column }) => column >= first.column);
  return heads.length >= 2 && below !== undefined && next.cells.length > 2;
}

const keysOfHeads = new Set([
  'sieve',
  'specimen',
  'trial',
  'temperature',
  'time',
  'frequency',
  'blend',
  'passes',
  'gyrations',
  'stress',
]);

/** "| 1 | 2 | 3 |" under a heading, with nothing to its left: the heads of columns, not results. */
function isNumberedHeading(
  row: TableRow,
  values: Cell[],
  table: Table,
  { kinds, labels }: Surroundings,
): boolean {
  const above = table.headings.at(-1);
  const first = row.cells[0];
  if (!first || table.headings.length === 0 || !above) return false;
  const leftmost = above.cells[0]?.column ?? first.column;
  if (kinds.of(first) !== 'value' || first.column <= leftmost) {
    const isNamed = kinds.of(first) === 'text' && row.cells.length > values.length;
    return isNamed && first.column > leftmost && values.length > 0 && countsUp(values);
  }
  const spansMore = above.cells.filter(({ column }) => column >= first.column).length < row.cells.length;
  const heads = above.cells
    .filter(({ column }) => column >= first.column - 1)
    .map(({ text }) => labels.read(text));
  const names =
    heads.some((head) => head.keys.length > 0 && head.quantities.length === 0) ||
    heads.some((head) => head.quantities.includes('binder-content'));
  return (
    (spansMore && (countsUp(values) || names)) ||
    (spansMore && heads.every((head) => head.quantities.length === 0))
  );
}

/** 1, 2, 3 and again 1, 2, 3. */
function countsUp(values: Cell[]): boolean {
  let expected = 1;
  for (const { value } of values) {
    const number = Number(value);
    if (number === 1) expected = 1;
    if (number !== expected) return false;
    expected += 1;
  }
  return values.length > 1;
}

/** A table goes on behind a blank row where what follows has no heading of its own and stands in its columns. */
function joinContinued(tables: Table[], around: Surroundings): Table[] {
  const joined: Table[] = [];
  for (const table of tables) {
    const previous = joined.findLast(
      (each) => each.firstColumn <= table.lastColumn && each.lastColumn >= table.firstColumn,
    );
    if (previous && continues(previous, table, around)) {
      previous.rows.push(...table.rows);
      previous.lastColumn = Math.max(previous.lastColumn, table.lastColumn);
    } else joined.push(table);
  }
  return joined;
}

function continues(previous: Table, table: Table, { kinds, labels }: Surroundings): boolean {
  if (table.titles.length > 0 || previous.headings.length === 0) return false;
  if (previous.rows.length === 0 && table.headings.length > 0) {
    // A heading, a blank row, then more of the heading.
    const units = table.headings.every(({ cells }) => cells.every((cell) => kinds.of(cell) !== 'text'));
    if (!units) return false;
    previous.headings.push(...table.headings);
    return true;
  }
  if (table.headings.length > 0) return false;
  const first = table.rows[0];
  if (!first || table.firstColumn < previous.firstColumn || table.lastColumn > previous.lastColumn)
    return false;
  if (previous.rows.length === 0) return first.cells.some((cell) => kinds.of(cell) === 'value');
  // A row that says itself what it holds is a list of its own, unless the rows before did so too.
  const own = rowsThatSay(table, { kinds, labels });
  const before = rowsThatSay(previous, { kinds, labels });
  if (own > table.rows.length / 2 && before <= previous.rows.length / 2) return false;
  const width = (rows: TableRow[]) => Math.max(...rows.map(({ cells }) => cells.length));
  // Under a table of several columns, lines of label and one value are a list of their own.
  if (own > 0 && width(table.rows) <= 2 && width(previous.rows) > 2) return false;
  return width(table.rows) >= 2 && width(table.rows) <= width([...previous.headings, ...previous.rows]);
}

function rowsThatSay(table: Table, { kinds, labels }: Surroundings): number {
  return table.rows.slice(0, 60).filter(({ cells }) => {
    const first = cells.find((cell) => kinds.of(cell) === 'text');
    return first !== undefined && saysWhat(labels.read(first.text)) && labels.read(first.text).role === null;
  }).length;
}
